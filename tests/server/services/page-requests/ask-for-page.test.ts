import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { createDataSource } from '../../../../server/data-source.js'
import { InvalidInput } from '../../../../server/errors.js'
import { askForPage } from '../../../../server/services/page-requests/ask-for-page.js'
import { createTestDatabase, type TestDatabase } from '../../../helpers/database.js'

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

const MONDAY = new Date('2026-03-02T08:00:00Z')
const FRIDAY = new Date('2026-03-06T08:00:00Z')

test('wishes for one page are counted together, whatever the case, accents and spaces', async () => {
  const first = await askForPage(dataSource.manager, ' Phelsuma  Grandis ', MONDAY)
  const second = await askForPage(dataSource.manager, 'phelsuma gràndis', FRIDAY)
  expect(first).toEqual({ name: 'Phelsuma  Grandis', times: 1 })
  expect(second).toEqual({ name: 'Phelsuma  Grandis', times: 2 })
  const rows = await dataSource.query(
    'select normalised_name, times, first_asked_at, last_asked_at from page_request',
  )
  expect(rows).toEqual([
    { normalised_name: 'phelsuma grandis', times: 2, first_asked_at: MONDAY, last_asked_at: FRIDAY },
  ])
})

test('wishes at the same moment are all counted', async () => {
  const asked = Array.from({ length: 8 }, () => askForPage(dataSource.manager, 'Boa nulla', MONDAY))
  const times = (await Promise.all(asked)).map((request) => request.times)
  expect(times.sort()).toEqual([1, 2, 3, 4, 5, 6, 7, 8])
})

test.each(['', '   ', '12345', 'a\0b', 'x'.repeat(201)])('what is no name is refused: %j', async (name) => {
  await expect(askForPage(dataSource.manager, name, MONDAY)).rejects.toThrow(InvalidInput)
})
