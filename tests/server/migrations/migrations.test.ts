import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { createDataSource } from '../../../server/data-source.js'
import { migrate } from '../../../server/migrate.js'
import { findSpeciesPage } from '../../../server/queries/species.js'
import { createTestDatabase, type TestDatabase } from '../../helpers/database.js'
import {
  addSource,
  makeClassificationItem,
  makeEvidenceItem,
  makeNameItem,
  makeProseItem,
  makeRangeItem,
  publish,
} from '../../helpers/page-items.js'

let database: TestDatabase
let owner: DataSource
let application: DataSource
let slug: string

beforeAll(async () => {
  database = await createTestDatabase()
  owner = await createDataSource(database.ownerUrl).initialize()
  application = await createDataSource(database.url).initialize()
  const sourceId = await addSource(application)
  const range = makeRangeItem()
  const items = [
    makeNameItem(),
    makeClassificationItem(),
    range,
    makeEvidenceItem(range.itemId, sourceId),
    makeProseItem('Text.'),
  ]
  slug = (await publish(application, items)).slug
})

afterAll(async () => {
  await application.destroy()
  await owner.destroy()
  await database.drop()
})

describe('migrations', () => {
  test('make exactly the tables that the entities describe', async () => {
    const { upQueries } = await owner.driver.createSchemaBuilder().log()
    expect(upQueries.map(({ query }) => query)).toEqual([])
  })

  test('run again on a database with data change nothing', async () => {
    const before = await findSpeciesPage(application.manager, slug, null)
    await migrate(database.ownerUrl)
    expect(await findSpeciesPage(application.manager, slug, null)).toEqual(before)
    expect(before).not.toBeNull()
  })

  test('index every foreign key', async () => {
    const bare = await owner.query(`
      select conrelid::regclass::text || '.' || attname as column
      from pg_constraint
      join pg_attribute on attrelid = conrelid and attnum = conkey[1]
      where contype = 'f' and not exists (
        select from pg_index where indrelid = conrelid and indkey[0] = conkey[1]
      )
      order by 1`)
    expect(bare).toEqual([])
  })
})

describe('what is published', () => {
  const tables = [
    'revision',
    'revision_item',
    'range_row',
    'evidence_row',
    'name_row',
    'classification_row',
    'prose_row',
    'source_revision',
  ]

  test.each(tables)('is not changed or deleted in %s, not even by the owner', async (table) => {
    const [{ column }] = await owner.query(
      `select column_name as column from information_schema.columns where table_name = $1 order by ordinal_position limit 1`,
      [table],
    )
    await expect(owner.query(`update ${table} set ${column} = ${column}`)).rejects.toThrow(
      'never changed or deleted',
    )
    await expect(owner.query(`delete from ${table}`)).rejects.toThrow('never changed or deleted')
  })

  test('gives the application no right to change or delete it, or to change the schema', async () => {
    const allowed: { table: string }[] = await owner.query(
      `select table_name || ' ' || privilege_type as table from information_schema.role_table_grants
       where grantee = 'mossgauge_app' and table_name = any($1) and privilege_type not in ('SELECT', 'INSERT')`,
      [[...tables, 'physiology_row', 'image_row', 'record_set', 'physiology_record', 'species_slug']],
    )
    expect(allowed).toEqual([])
    await expect(application.query('update range_row set low = 0')).rejects.toThrow('permission denied')
    await expect(application.query('truncate range_row')).rejects.toThrow('permission denied')
    await expect(application.query('create table mine (id int)')).rejects.toThrow('permission denied')
    await expect(application.query('delete from species')).rejects.toThrow('permission denied')
  })
})
