import pg from 'pg'
import { generateSpecies, type GeneratedSpecies } from './generated-species.js'

const BATCH = 2000

// Straight into the projections that a search reads: publishing a hundred thousand pages would take hours and give the same.
const INSERT = `
  with given as (
    select * from jsonb_to_recordset($1::jsonb) as given (
      id uuid, slug text, "scientificName" text, synonyms jsonb, "commonNames" jsonb, class text, "order" text, family text,
      conservation text, "uvZone" smallint, "physiologyCount" int, "evidenceKinds" jsonb, ranges jsonb
    )
  ), name as (
    select id, 'scientific' as kind, "scientificName" as name, 0 as ordinal from given
    union all
    select id, 'synonym', value, ordinality::int from given, jsonb_array_elements_text(synonyms) with ordinality
    union all
    select id, 'common', value, 10 + ordinality::int from given, jsonb_array_elements_text("commonNames") with ordinality
  ), page as (
    insert into species (id, slug, is_invented, revision_number, updated_at, scientific_name, common_names, class, "order",
      family, conservation, range_count, physiology_count, uv_zone, evidence_kinds, search)
    select id, slug, true, 1, timestamptz '2026-03-01' + id_number * interval '1 second', "scientificName",
      array(select jsonb_array_elements_text("commonNames")), class, "order", family, conservation,
      jsonb_array_length(ranges), "physiologyCount", "uvZone", array(select jsonb_array_elements_text("evidenceKinds")),
      (select string_agg(normalise_name(name.name), e'\\n' order by ordinal) from name where name.id = given.id)
    from given cross join lateral (select ('x' || right(id::text, 8))::bit(32)::int as id_number) numbered
  ), slug as (
    insert into species_slug (slug, species_id) select slug, id from given
  ), named as (
    insert into species_name (species_id, item_id, kind, name, normalised_name, language, ordinal)
    select id, gen_random_uuid(), kind, name, normalise_name(name), case kind when 'common' then 'en' end, ordinal from name
  )
  insert into current_range (species_id, item_id, position, period, parameter, stated_position, stated_period, season,
    life_stage, low, high, span)
  select given.id, stated.item_id, stated.position, asked.period, stated.parameter, stated.position, stated.period, 'any',
    'any', stated.low, stated.high, numrange(stated.low::text::numeric, stated.high::text::numeric, '[]')
  from given
  cross join lateral (
    select gen_random_uuid() as item_id, range.* from jsonb_to_recordset(ranges) as range (
      parameter text, position text, period text, low double precision, high double precision
    )
  ) stated
  cross join lateral (values (stated.period), ('any')) asked (period)`

const FIND_INDEXES = `
  select indexrelid::regclass::text as name, pg_get_indexdef(indexrelid) as definition
  from pg_index
  where indrelid in ('species'::regclass, 'species_slug'::regclass, 'species_name'::regclass, 'current_range'::regclass)
    and not indisunique`

/**
 * Fills an empty database with so many invented species. As the superuser: rows that are right by the way they are made need
 * not be looked up one by one, and indexes are quicker made at the end than kept while rows come in.
 */
export async function fillWithSpecies(superuserUrl: string, count: number): Promise<void> {
  const client = new pg.Client({ connectionString: superuserUrl })
  await client.connect()
  let batch: GeneratedSpecies[] = []
  const insert = async () => {
    await client.query({ name: 'insert-species', text: INSERT, values: [JSON.stringify(batch)] })
    batch = []
  }
  try {
    await client.query("set session_replication_role = replica; set maintenance_work_mem = '256MB'")
    const indexes = (await client.query<{ name: string; definition: string }>(FIND_INDEXES)).rows
    for (const { name } of indexes) await client.query(`drop index ${name}`)
    for (const species of generateSpecies(count)) {
      batch.push(species)
      if (batch.length === BATCH) await insert()
    }
    if (batch.length > 0) await insert()
    for (const { definition } of indexes) await client.query(definition)
    await client.query('vacuum analyze')
  } finally {
    await client.end()
  }
}
