import type { EntityManager } from 'typeorm'
import { InvalidInput } from '../../server/errors.js'
import { saveSources, type SaveSourceInput } from '../../server/services/sources/save-source.js'
import { readKnownSources } from '../citations/known-sources.js'
import { parseReference } from '../citations/parse-reference.js'
import type { Citation, DatasetDefinition, OwnSource } from '../datasets/definition.js'

/** The source behind each citation of a file. */
export interface ResolvedCitations {
  /** The stable id, or null for an author-year key that no one source answers to. */
  findSourceId(citation: Citation): string | null
  ownSourceId: string | null
  /** Author-year keys in the file, and how many of them were resolved. */
  keys: number
  keysResolved: number
}

type Origin = Pick<SaveSourceInput, 'broughtBy' | 'publishedAt'>

/**
 * Turns every citation of a file into a source: full references and the dataset's own source are saved (the same DOI or the
 * same words are the same source), author-year keys are looked up among the sources that datasets brought before.
 */
export async function resolveCitations(
  db: EntityManager,
  definition: DatasetDefinition,
  citations: readonly Citation[],
  origin: Origin,
): Promise<ResolvedCitations> {
  const references = new Map<string, { asPrinted: string; doi: string | null }>()
  const keys = new Set<string>()
  for (const citation of citations) {
    if (citation.form === 'reference') references.set(toReferenceText(citation), citation)
    else if (citation.form === 'key') keys.add(citation.asPrinted)
  }
  const clearReferences = dropSharedDois([...references.values()])
  const own = definition.ownSource === null ? [] : [toOwnInput(definition.ownSource, origin)]
  const saved = await saveSources(db, [
    ...own,
    ...clearReferences.map((reference) => toReferenceInput(reference, origin)),
  ])
  const ownSourceId = definition.ownSource === null ? null : (saved[0]?.id ?? null)
  const idOfReference = new Map(
    [...references.keys()].map((text, index) => [text, saved[own.length + index]?.id ?? null]),
  )
  const known = keys.size > 0 ? await readKnownSources(db) : null
  const idOfKey = new Map([...keys].map((key) => [key, known?.findByKey(key) ?? null]))

  return {
    ownSourceId,
    keys: keys.size,
    keysResolved: [...idOfKey.values()].filter((id) => id !== null).length,
    findSourceId: (citation) => {
      switch (citation.form) {
        case 'own':
          if (ownSourceId === null) throw new InvalidInput(`${definition.title} has no source of its own.`)
          return ownSourceId
        case 'reference':
          return idOfReference.get(toReferenceText(citation)) ?? null
        case 'key':
          return idOfKey.get(citation.asPrinted) ?? null
      }
    },
  }
}

function toReferenceText({ asPrinted, doi }: { asPrinted: string; doi: string | null }): string {
  return `${doi ?? ''} ${asPrinted}`
}

/**
 * A DOI that one file prints beside several different references is wrong for all but one of them, and the file does not say
 * which; it identifies none of them then.
 */
function dropSharedDois(
  references: { asPrinted: string; doi: string | null }[],
): { asPrinted: string; doi: string | null }[] {
  const printedOf = new Map<string, Set<string>>()
  for (const { asPrinted, doi } of references) {
    if (doi === null) continue
    const doiKey = doi.toLowerCase()
    printedOf.set(doiKey, (printedOf.get(doiKey) ?? new Set()).add(asPrinted))
  }
  return references.map(({ asPrinted, doi }) => ({
    asPrinted,
    doi: doi !== null && printedOf.get(doi.toLowerCase())?.size === 1 ? doi : null,
  }))
}

function toOwnInput({ kind, doi, csl }: OwnSource, origin: Origin): SaveSourceInput {
  return {
    doi,
    kind,
    terms: null,
    csl: { ...csl, ...(doi !== null && { DOI: doi }) },
    reference: [csl['container-title'], csl.title, csl.volume, csl.page].filter(Boolean).join(' '),
    asPrinted: null,
    isInvented: false,
    ...origin,
  }
}

function toReferenceInput(
  { asPrinted, doi }: { asPrinted: string; doi: string | null },
  origin: Origin,
): SaveSourceInput {
  const parsed = parseReference(asPrinted)
  return {
    doi,
    kind: parsed.kind,
    terms: null,
    csl: { ...parsed.csl, ...(doi !== null && { DOI: doi }) },
    reference: asPrinted,
    asPrinted: parsed.asPrinted,
    isInvented: false,
    ...origin,
  }
}
