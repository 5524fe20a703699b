import pg from 'pg'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { createTestDatabase, type TestDatabase } from '../../helpers/database.js'

describe('the rights of the two roles', () => {
  let database: TestDatabase
  beforeAll(async () => {
    database = await createTestDatabase()
  })
  afterAll(() => database.drop())

  async function ask(url: string, statement: string) {
    const client = new pg.Client({ connectionString: url })
    await client.connect()
    try {
      return await client.query(statement)
    } finally {
      await client.end()
    }
  }

  test('lets the application read and write rows of a table the owner makes', async () => {
    await ask(database.ownerUrl, 'create table pebble (id int generated always as identity, name text)')
    await ask(database.url, "insert into pebble (name) values ('flint'), ('chert')")
    await ask(database.url, "update pebble set name = 'opal' where name = 'flint'")
    await ask(database.url, "delete from pebble where name = 'chert'")
    const { rows } = await ask(database.url, 'select name from pebble')
    expect(rows).toEqual([{ name: 'opal' }])
  })

  test('refuses the application a change of the schema', async () => {
    await expect(ask(database.url, 'create table gravel (id int)')).rejects.toMatchObject({ code: '42501' })
    await expect(ask(database.url, 'create temporary table gravel (id int)')).rejects.toMatchObject({
      code: '42501',
    })
    await expect(ask(database.url, 'drop table species')).rejects.toMatchObject({ code: '42501' })
  })

  test('refuses a wrong password', async () => {
    const url = new URL(database.url)
    url.password = 'wrong'
    await expect(ask(url.href, 'select 1')).rejects.toMatchObject({ code: '28P01' })
  })

  test('has the extensions that search and overlap need', async () => {
    const { rows } = await ask(database.url, 'select extname from pg_extension')
    expect(rows.map((row) => row.extname)).toEqual(
      expect.arrayContaining(['pg_trgm', 'unaccent', 'btree_gist']),
    )
  })
})
