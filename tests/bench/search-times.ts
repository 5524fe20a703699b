import { writeSearchString, EMPTY_SEARCH } from '../../shared/search-query.js'
import type { OverlapFilter } from '../../shared/search.js'
import { generateSpecies, makeNumbers } from './generated-species.js'

const WARM_UPS = 20

export interface Times {
  /** Milliseconds until the whole answer was read, at the first asking of each. */
  first: number[]
  /** The same at the second asking, when the counts of the search are still known. */
  again: number[]
}

async function timeOnce(url: string): Promise<number> {
  const startedAt = performance.now()
  const response = await fetch(url)
  await response.text()
  if (!response.ok) throw new Error(`${url} answered ${response.status}.`)
  return performance.now() - startedAt
}

/** Asks two servers the same searches by turns, each search twice. The first few are not counted. */
export async function compareSearches(
  smallAddress: string,
  largeAddress: string,
  searches: readonly string[],
): Promise<{ small: Times; large: Times }> {
  const small: Times = { first: [], again: [] }
  const large: Times = { first: [], again: [] }
  for (const [index, search] of searches.entries()) {
    for (const [address, times] of [
      [smallAddress, small],
      [largeAddress, large],
    ] as const) {
      const url = `${address}/api/v1/species${search}`
      const first = await timeOnce(url)
      const again = await timeOnce(url)
      if (index < WARM_UPS) continue
      times.first.push(first)
      times.again.push(again)
    }
  }
  return { small, large }
}

/** Swaps two letters in the middle of a word. */
function misspell(word: string): string {
  const at = Math.floor(word.length / 2)
  return word.slice(0, at) + word.charAt(at + 1) + word.charAt(at) + word.slice(at + 2)
}

/** What keepers type, over names that a thousand species hold as well as a hundred thousand do; each search once. */
export function listNameSearches(count: number): string[] {
  const known = [...generateSpecies(1000)]
  const next = makeNumbers(7)
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)] as T
  const commonNames = known.flatMap((species) => species.commonNames)
  const kinds: (() => string)[] = [
    () => pick(known).scientificName,
    () => pick(known).scientificName.slice(0, 5),
    () => misspell(pick(known).scientificName),
    () => pick(commonNames),
    () => pick(commonNames).split(' ').slice(1).join(' '),
    () => misspell(pick(commonNames)),
    () => pick(commonNames).split(' ').at(-1) ?? '',
  ]
  const searches = new Set<string>()
  for (let turn = 0; searches.size < count; turn += 1) {
    const q = kinds[turn % kinds.length]?.() ?? ''
    searches.add(writeSearchString({ ...EMPTY_SEARCH, q }))
  }
  return [...searches]
}

/** Questions about ranges, two degrees wide, at places and times for which pages have some. */
export function listOverlapSearches(count: number): string[] {
  const next = makeNumbers(11)
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)] as T
  const searches = new Set<string>()
  while (searches.size < count) {
    const low = 16 + Math.round(next() * 280) / 10
    const overlap: OverlapFilter = {
      parameter: 'temperature',
      position: pick(['basking-surface', 'warm-end-air', 'cool-end-air'] as const),
      period: pick(['day', 'any'] as const),
      low,
      high: low + 2,
    }
    searches.add(writeSearchString({ ...EMPTY_SEARCH, overlaps: [overlap] }))
  }
  return [...searches]
}
