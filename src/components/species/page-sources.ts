import type { SpeciesPage } from '../../../shared/species.js'

/** Citations in prose, as `shared/markdown.ts` reads them. */
const CITATION = /\[@([0-9a-z][0-9a-z-]*)/gi

/**
 * The number of each source on a page, counted from 1 in the order it is first cited: ranges, then physiology, then
 * prose. A source the page carries but cites nowhere comes last.
 */
export function numberSources(
  page: Pick<SpeciesPage, 'ranges' | 'physiology' | 'prose' | 'sources'>,
): Map<string, number> {
  const cited = [
    ...page.ranges.flatMap(({ evidence }) => evidence.map(({ row }) => row.sourceId)),
    ...page.physiology.flatMap(({ row, studies }) => [
      ...(row.form === 'cited' ? [row.sourceId] : []),
      ...studies.flatMap(({ sourceId }) => (sourceId === null ? [] : [sourceId])),
    ]),
    ...page.prose.flatMap(({ row }) => [...row.markdown.matchAll(CITATION)].flatMap(([, id]) => id ?? [])),
    ...Object.keys(page.sources),
  ]
  const numbers = new Map<string, number>()
  for (const id of cited) {
    if (page.sources[id] !== undefined && !numbers.has(id)) numbers.set(id, numbers.size + 1)
  }
  return numbers
}

/** The address of a source's entry in the page's list. */
export function toSourceAddress(number: number): string {
  return `#source-${number}`
}
