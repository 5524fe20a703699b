import type { EntityManager } from 'typeorm'
import { z } from 'zod'
import type { PhysiologyRecord, Quantity } from '../../shared/physiology.js'
import type { RecordList } from '../../shared/physiology-records.js'
import type { RecordLifeStage } from '../../shared/ranges.js'
import { RECORD_MAPPING } from '../entities/row-mappings.js'
import { queryPrepared } from '../prepared.js'
import { toSourcesById } from './json-fragments.js'
import { readPlaceCursor, writePlaceCursor } from './place-cursor.js'

const RECORDS_PAGE_SIZE = 50

const placeSchema = z.tuple([z.int().nonnegative()])

/** Which of a dataset's records are asked for, as a study line tells them apart; null or left out leaves a field open. */
export interface RecordFilter {
  quantity?: Quantity | null
  lethalPercent?: PhysiologyRecord['lethalPercent'] | undefined
  lifeStage?: RecordLifeStage | null
  level?: PhysiologyRecord['level'] | null
  /** The id of the source, or what is printed in place of one that could not be resolved. */
  source?: string | null
}

const FIND_RECORDS = {
  name: 'find-records',
  text: `
    with named as (
      select physiology_row.record_set_hash
      from species_slug
      join revision on revision.species_id = species_slug.species_id
      join species on species.id = species_slug.species_id
      join revision_item on revision_item.revision_id = revision.id and revision_item.item_id = $2
      join physiology_row on physiology_row.hash = revision_item.row_hash
      where species_slug.slug = $1 and revision.number = coalesce($3, species.revision_number)
        and physiology_row.form = 'dataset'
    ), matching as (
      select physiology_record.* from named join physiology_record on set_hash = named.record_set_hash
      where ($4::text is null or quantity = $4)
        and ($5::text is null or life_stage = $5)
        and ($6::text is null or level = $6)
        and ($7::smallint is null or lethal_percent = $7)
        and ($8::text is null or source_id::text = $8 or source_id is null and source_as_printed = $8)
    ), shown as materialized (
      select * from matching where ordinal > $9 order by ordinal limit ${RECORDS_PAGE_SIZE + 1}
    )
    select
      (select count(*)::int from matching) as total,
      coalesce((
        select json_agg(json_build_object('ordinal', ordinal, 'record', ${RECORD_MAPPING.toJson('shown')}) order by ordinal)
        from shown
      ), '[]') as found,
      ${toSourcesById('array(select distinct source_id from shown where source_id is not null)')} as sources
    from named`,
}

interface FoundRecords {
  total: number
  found: { ordinal: number; record: PhysiologyRecord }[]
  sources: RecordList['sources']
}

/**
 * The records behind a dataset's item of a page, in the order of the dataset, fifty at a time; null where the page has no such
 * item at that revision (the current one without a number). Throws InvalidInput for a cursor of another list.
 */
export async function findPhysiologyRecords(
  db: EntityManager,
  slug: string,
  itemId: string,
  filter: RecordFilter,
  cursor: string | null,
  revisionNumber: number | null = null,
): Promise<RecordList | null> {
  const [answer] = await queryPrepared<FoundRecords>(db, FIND_RECORDS, [
    slug,
    itemId,
    revisionNumber,
    filter.quantity ?? null,
    filter.lifeStage ?? null,
    filter.level ?? null,
    filter.lethalPercent ?? null,
    filter.source ?? null,
    cursor === null ? -1 : readPlaceCursor(placeSchema, cursor)[0],
  ])
  if (answer === undefined) return null
  const shown = answer.found.slice(0, RECORDS_PAGE_SIZE)
  const last = shown.at(-1)
  const hasMore = answer.found.length > shown.length && last !== undefined
  return {
    items: shown.map(({ record }) => record),
    sources: answer.sources,
    total: answer.total,
    nextCursor: hasMore ? writePlaceCursor([last.ordinal]) : null,
  }
}
