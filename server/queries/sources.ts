import type { EntityManager } from 'typeorm'
import { z } from 'zod'
import { toDoiKey } from '../../shared/doi.js'
import type { SourceList, SourcePage } from '../../shared/home.js'
import type { SourceBrief } from '../../shared/sources.js'
import { queryPrepared, type Prepared } from '../prepared.js'
import { toPageRef, toSourceBrief } from './json-fragments.js'
import { readPlaceCursor, writePlaceCursor } from './place-cursor.js'
import { toSearchWords } from './search-words.js'

const SOURCES_PAGE_SIZE = 50
const CITED_BY_PAGE_SIZE = 50

const placeSchema = z.tuple([z.string().max(700), z.uuid()])

interface Matching {
  /** Tells one form of the condition from another. */
  name: string
  condition: string
  values: string[]
}

/** A DOI names one source; other text is words that a listing must all hold. `first` is the number of the first free parameter. */
function toMatching(text: string, first: number): Matching {
  const doi = toDoiKey(text)
  if (doi !== null) return { name: 'doi', condition: `source.doi = $${first}`, values: [doi] }
  const words = toSearchWords(text)
  const conditions = words.map((_, index) => `source.listing like $${first + index}`)
  return {
    name: `words-${words.length}`,
    condition: ['source.merged_into_id is null', ...conditions].join(' and '),
    values: words.map((word) => `%${word}%`),
  }
}

function findSourcesStatement({ name, condition }: Matching): Prepared {
  return {
    name: `find-sources-${name}`,
    text: `
      with matching as (
        select source.* from source where ${condition}
      ), shown as materialized (
        select * from matching where (listing, id) > ($1, $2::uuid)
        order by listing, id limit ${SOURCES_PAGE_SIZE + 1}
      )
      select
        (select count(*)::int from matching) as total,
        coalesce((
          select json_agg(json_build_object(
            'listing', shown.listing,
            'source', ${toSourceBrief('shown', 'source_revision')},
            'pages', (
              select count(distinct current_citation.species_id) from current_citation
              where current_citation.source_id in (
                select shown.id union all select merged.id from source merged where merged.merged_into_id = shown.id
              )
            )
          ) order by shown.listing, shown.id)
          from shown join source_revision on source_revision.id = shown.current_source_revision_id
        ), '[]') as found`,
  }
}

const FIRST_ID = '00000000-0000-0000-0000-000000000000'

interface FoundSources {
  total: number
  found: { listing: string; source: SourceBrief; pages: number }[]
}

/**
 * The sources that stand for themselves, in order of their short citation, fifty at a time; with a text, those that hold every
 * word of it in authors, year or title, or that have the DOI it is. Throws InvalidInput for a cursor of another list.
 */
export async function findSources(
  db: EntityManager,
  text: string,
  cursor: string | null,
): Promise<SourceList> {
  const [listing, id] = cursor === null ? ['', FIRST_ID] : readPlaceCursor(placeSchema, cursor)
  const matching = toMatching(text, 3)
  const values = [listing, id, ...matching.values]
  const [answer] = await queryPrepared<FoundSources>(db, findSourcesStatement(matching), values)
  if (answer === undefined) throw new Error('The list of sources gave no answer')
  const shown = answer.found.slice(0, SOURCES_PAGE_SIZE)
  const last = shown.at(-1)
  const hasMore = answer.found.length > shown.length && last !== undefined
  return {
    items: shown.map(({ source, pages }) => ({ source, pages })),
    total: answer.total,
    nextCursor: hasMore ? writePlaceCursor([last.listing, last.source.id]) : null,
  }
}

const FIND_SOURCE_PAGE = {
  name: 'find-source-page',
  text: `
    with heir as materialized (
      select heir.* from source asked join source heir on heir.id = coalesce(asked.merged_into_id, asked.id)
      where asked.id = $1
    ), cited as (
      select current_citation.* from current_citation
      where source_id in (select id from heir union all select source.id from heir join source on source.merged_into_id = heir.id)
    ), shown as materialized (
      select scientific_name, species_id, sum(ranges)::int as ranges, sum(physiology)::int as physiology from cited
      where (scientific_name, species_id) > ($2, $3::uuid)
      group by scientific_name, species_id order by scientific_name, species_id limit ${CITED_BY_PAGE_SIZE + 1}
    )
    select
      ${toSourceBrief('heir', 'source_revision')} as source,
      (select count(distinct species_id)::int from cited) as total,
      coalesce((
        select json_agg(json_build_object(
          'id', shown.species_id,
          'page', json_build_object(${toPageRef('species')}, 'ranges', shown.ranges, 'physiology', shown.physiology)
        ) order by shown.scientific_name, shown.species_id)
        from shown join species on species.id = shown.species_id
      ), '[]') as found
    from heir join source_revision on source_revision.id = heir.current_source_revision_id`,
}

interface FoundSourcePage {
  source: SourceBrief
  total: number
  found: { id: string; page: SourcePage['citedBy'][number] }[]
}

/**
 * A source with the pages whose current revision cites it, by name, fifty at a time; null where there is none. The id of a
 * merged source gives its heir, with what cites either. Throws InvalidInput for a cursor of another list.
 */
export async function findSourcePage(
  db: EntityManager,
  id: string,
  cursor: string | null,
): Promise<SourcePage | null> {
  const [name, speciesId] = cursor === null ? ['', FIRST_ID] : readPlaceCursor(placeSchema, cursor)
  const [answer] = await queryPrepared<FoundSourcePage>(db, FIND_SOURCE_PAGE, [id, name, speciesId])
  if (answer === undefined) return null
  const shown = answer.found.slice(0, CITED_BY_PAGE_SIZE)
  const last = shown.at(-1)
  const hasMore = answer.found.length > shown.length && last !== undefined
  return {
    source: answer.source,
    citedBy: shown.map(({ page }) => page),
    citedByTotal: answer.total,
    nextCursor: hasMore ? writePlaceCursor([last.page.scientificName, last.id]) : null,
  }
}
