import { In, type EntityManager } from 'typeorm'
import { Species } from '../../server/entities/Species.js'
import { publishRevision } from '../../server/services/revisions/publish-revision.js'
import { saveSources } from '../../server/services/sources/save-source.js'
import { toSlug } from '../../shared/slugs.js'
import type { DemonstrationSpecies } from './content.js'
import { DEMONSTRATION_SPECIES } from './scenario.js'
import { SOURCES, toReference } from './sources.js'
import type { SourceKey } from './sources.js'
import { toItems, type SourceIds } from './to-items.js'

const BROUGHT_BY = { form: 'demonstration' } as const
/** When the invented sources were written into the scenario: before its first page. */
const SOURCES_PUBLISHED_AT = new Date('2026-02-02T09:00:00Z')

/** Where a page of the scenario stands in the database. */
interface Standing {
  id: string
  currentRevisionId: string | null
  revisionNumber: number
}

function findSlug({ revisions: [first] }: DemonstrationSpecies): string {
  const scientific = first.content.names.find(({ kind }) => kind === 'scientific')
  return toSlug(scientific?.name ?? '')
}

async function findStandings(
  db: EntityManager,
  scenario: readonly DemonstrationSpecies[],
): Promise<Map<string, Standing>> {
  const slugs = scenario.map(findSlug)
  const pages = await db.find(Species, {
    select: { id: true, slug: true, currentRevisionId: true, revisionNumber: true },
    where: { slug: In(slugs), isInvented: true },
  })
  return new Map(pages.map((page) => [page.slug, page]))
}

async function saveInventedSources(db: EntityManager): Promise<SourceIds> {
  const keys = Object.keys(SOURCES) as SourceKey[]
  const saved = await saveSources(
    db,
    keys.map((key) => ({
      doi: null,
      kind: SOURCES[key].kind,
      terms: null,
      csl: SOURCES[key].csl,
      reference: toReference(key),
      asPrinted: null,
      isInvented: true,
      broughtBy: BROUGHT_BY,
      publishedAt: SOURCES_PUBLISHED_AT,
    })),
  )
  return new Map(keys.map((key, index) => [key, saved[index]?.id ?? '']))
}

async function publishMissing(
  db: EntityManager,
  species: DemonstrationSpecies,
  standing: Standing | undefined,
  sourceIds: SourceIds,
): Promise<number> {
  const missing = species.revisions.slice(standing?.revisionNumber ?? 0)
  let page: { id: string } | { isInvented: boolean } =
    standing === undefined ? { isInvented: true } : { id: standing.id }
  let baseRevisionId = standing?.currentRevisionId ?? null
  // Each revision builds on the one before, so they cannot be published in one go.
  for (const { publishedAt, summary, content } of missing) {
    const published = await publishRevision(db, {
      species: page,
      baseRevisionId,
      items: toItems(species.key, content, sourceIds),
      recordSets: [],
      summary,
      broughtBy: BROUGHT_BY,
      publishedAt: new Date(publishedAt),
    })
    page = { id: published.speciesId }
    baseRevisionId = published.revisionId
  }
  return missing.length
}

/**
 * Publishes the invented species with their sources and every revision, in one transaction, and gives how many revisions that
 * were. What is there already stays as it is: a second run publishes nothing, and a longer scenario adds what is missing.
 * Throws Conflict where a real page has the name of an invented one.
 */
export async function loadDemonstration(
  db: EntityManager,
  scenario: readonly DemonstrationSpecies[] = DEMONSTRATION_SPECIES,
): Promise<{ published: number }> {
  return db.transaction(async (transaction) => {
    const standings = await findStandings(transaction, scenario)
    const isComplete = scenario.every((species) => {
      const standing = standings.get(findSlug(species))
      return standing !== undefined && standing.revisionNumber >= species.revisions.length
    })
    if (isComplete) return { published: 0 }
    const sourceIds = await saveInventedSources(transaction)
    let published = 0
    for (const species of scenario) {
      published += await publishMissing(transaction, species, standings.get(findSlug(species)), sourceIds)
    }
    return { published }
  })
}
