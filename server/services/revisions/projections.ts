import type { EntityManager } from 'typeorm'
import {
  COOL_SEASONS,
  STAGES_ANY_NEVER_COVERS,
  WHOLE_ENCLOSURE_SERVES,
} from '../../../shared/checker/selection.js'
import { toPageJson } from '../../entities/page-json.js'
import { queryPrepared, type Prepared } from '../../prepared.js'
import { requireTransaction } from '../../transactions.js'

function quoteAll(words: readonly string[]): string {
  return words.map((word) => `'${word}'`).join(', ')
}

const SERVED_BY_WHOLE = WHOLE_ENCLOSURE_SERVES.map((position) => `('${position}')`).join(', ')

/** The kind of evidence that a physiological quantity is; an optimum is none of them. */
const KIND_OF_QUANTITY = `case quantity
  when 'field-body-temperature' then 'field-body-temperature'
  when 'selected-body-temperature' then 'selected-in-gradient'
  when 'critical-thermal-minimum' then 'tolerance-limit'
  when 'critical-thermal-maximum' then 'tolerance-limit'
  when 'lethal-minimum' then 'tolerance-limit'
  when 'lethal-maximum' then 'tolerance-limit'
  when 'supercooling-point' then 'tolerance-limit'
end`

/** The statements that write the projections anew, for one page (`$1`) or, word for word the same, for all. */
function projectionStatements(scope: 'page' | 'all'): Prepared[] {
  const where = (column: string) => (scope === 'page' ? `${column} = $1` : 'true')
  const current = (kind: string, table: string) => `
    species join revision_item item on item.revision_id = species.current_revision_id and item.kind = '${kind}'
      and ${where('species.id')}
    join ${table} stored on stored.hash = item.row_hash`

  const clear = `
    with names as (delete from species_name where ${where('species_id')}),
      citations as (delete from current_citation where ${where('species_id')}),
      contents as (delete from current_page where ${where('species_id')})
    delete from current_range where ${where('species_id')}`

  const names = `
    insert into species_name (species_id, item_id, kind, name, normalised_name, language, ordinal)
    select species.id, item.item_id, stored.kind, stored.name, normalise_name(stored.name), stored.language, item.ordinal
    from ${current('name', 'name_row')}`

  const ranges = `
    with stated as (
      select species.id as species_id, item.item_id, stored.* from ${current('range', 'range_row')}
    ), lit as (
      -- A range for any period answers for day and for night, unless one that names the period has all its other keys.
      select stated.*, asked.period as asked_period
      from stated cross join (values ('day'), ('night')) asked (period)
      where stated.period in (asked.period, 'any') and not exists (
        select from stated finer
        where stated.period = 'any' and finer.period = asked.period
          and finer.species_id = stated.species_id and finer.parameter = stated.parameter
          and finer.position = stated.position and finer.season = stated.season
          and finer.life_stage = stated.life_stage and finer.uv_meaning is not distinct from stated.uv_meaning
      )
    ), answering as (
      select lit.*, lit.position as asked_position from lit
      union all
      -- The whole enclosure answers at air and hide positions, unless a range of the position matches whenever it does.
      select lit.*, served.position
      from lit cross join (values ${SERVED_BY_WHOLE}) served (position)
      where lit.position = 'whole-enclosure' and not exists (
        select from stated own
        where own.species_id = lit.species_id and own.parameter = lit.parameter and own.position = served.position
          and own.period in (lit.asked_period, 'any') and own.uv_meaning is not distinct from lit.uv_meaning
          and (own.season = lit.season
            or own.season = 'any' and lit.season not in (${quoteAll(COOL_SEASONS)}))
          and (own.life_stage = lit.life_stage
            or own.life_stage = 'any' and lit.life_stage not in (${quoteAll(STAGES_ANY_NEVER_COVERS)}))
      )
    ), answers as (
      select asked_period as question_period, answering.* from answering
      union all
      select 'any', whichever.* from (
        select distinct on (species_id, item_id, asked_position) answering.* from answering
        order by species_id, item_id, asked_position
      ) whichever
    )
    insert into current_range (species_id, item_id, position, period, parameter, stated_position, stated_period, season,
      life_stage, uv_meaning, low, high, lower_limit, upper_limit, span)
    select species_id, item_id, asked_position, question_period, parameter, answers.position, period, season,
      life_stage, uv_meaning, low, high, lower_limit, upper_limit,
      -- By way of text, because the direct cast keeps 15 digits only and touching ends would part.
      case when low is not null or high is not null then numrange(low::text::numeric, high::text::numeric, '[]') end
    from answers`

  const page = `
    with named as (
      select species_id,
        max(name) filter (where kind = 'scientific') as scientific_name,
        coalesce(array_agg(name order by ordinal) filter (where kind = 'common'), '{}') as common_names,
        string_agg(normalised_name, e'\\n' order by ordinal) as search
      from species_name where ${where('species_id')} group by species_id
    ), classified as (
      select species.id as species_id, stored.class, stored."order", stored.family, stored.conservation
      from ${current('classification', 'classification_row')}
    ), ranged as (
      select species.id as species_id, count(*)::int as range_count,
        (array_agg(stored.uv_zone order by item.ordinal) filter (where stored.uv_zone is not null))[1] as uv_zone
      from ${current('range', 'range_row')} group by species.id
    ), physiological as (
      select species.id as species_id, coalesce(record_set.record_count, 1) as records,
        coalesce(record_set.quantities, array[stored.quantity]) as quantities
      from ${current('physiology', 'physiology_row')}
      left join record_set on record_set.hash = stored.record_set_hash
    ), known as (
      select species_id, sum(records)::int as physiology_count from physiological group by species_id
    ), evidenced as (
      select species_id, array_agg(distinct kind order by kind) as evidence_kinds from (
        select species.id as species_id, stored.kind from ${current('evidence', 'evidence_row')}
        union all
        select species_id, ${KIND_OF_QUANTITY} from physiological cross join unnest(quantities) quantity
      ) kinds where kind is not null group by species_id
    )
    update species set
      scientific_name = named.scientific_name,
      common_names = named.common_names,
      search = named.search,
      class = coalesce(classified.class, ''),
      "order" = classified."order",
      family = classified.family,
      conservation = classified.conservation,
      range_count = coalesce(ranged.range_count, 0),
      uv_zone = ranged.uv_zone,
      physiology_count = coalesce(known.physiology_count, 0),
      evidence_kinds = coalesce(evidenced.evidence_kinds, '{}')
    from named
      left join classified using (species_id)
      left join ranged using (species_id)
      left join known using (species_id)
      left join evidenced using (species_id)
    where species.id = named.species_id`

  const pageJson = Object.entries(toPageJson('species.current_revision_id'))
  const content = `
    insert into current_page (species_id, revision_id, ${pageJson.map(([column]) => column).join(', ')})
    select species.id, species.current_revision_id, ${pageJson.map(([, json]) => json).join(', ')}
    from species where ${where('species.id')} and species.current_revision_id is not null`

  const citations = `
    insert into current_citation (source_id, species_id, scientific_name, ranges, physiology)
    select source_id, species.id, species.scientific_name, sum(ranges)::int, sum(physiology)::int from (
      select species.id as species_id, stored.source_id, count(distinct item.parent_item_id) as ranges, 0 as physiology
      from ${current('evidence', 'evidence_row')} group by species.id, stored.source_id
      union all
      select species.id, stored.source_id, 0, 1 from ${current('physiology', 'physiology_row')} where stored.form = 'cited'
      union all
      select species.id, (line ->> 'sourceId')::uuid, 0, (line ->> 'records')::int
      from ${current('physiology', 'physiology_row')}
      join record_set on record_set.hash = stored.record_set_hash
      cross join json_array_elements(record_set.studies) line
      where line ->> 'sourceId' is not null
      union all
      select species.id, cited.source_id, 0, 0 from ${current('prose', 'prose_row')}
      cross join unnest(stored.source_ids) cited (source_id)
    ) cited join species on species.id = cited.species_id and ${where('species.id')}
    group by source_id, species.id, species.scientific_name`

  return Object.entries({ clear, names, ranges, page, content, citations }).map(([name, text]) => ({
    name: `project-${scope}-${name}`,
    text,
  }))
}

const PAGE_STATEMENTS = projectionStatements('page')
const ALL_STATEMENTS = projectionStatements('all')

/** Writes one page's projections anew from its current revision; part of publishing, in its transaction. */
export async function refreshProjections(db: EntityManager, speciesId: string): Promise<void> {
  for (const statement of PAGE_STATEMENTS) await queryPrepared(db, statement, [speciesId])
}

/** Writes every page's projections anew from the current revisions, by the statements that publishing uses. Needs a transaction. */
export async function rebuildProjections(db: EntityManager): Promise<void> {
  requireTransaction(db, 'rebuildProjections')
  // Publishing waits, which locks its page's row; readers do not.
  await db.query('lock table species in exclusive mode')
  for (const statement of ALL_STATEMENTS) await queryPrepared(db, statement, [])
}
