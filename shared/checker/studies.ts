import { toShortCitation } from '../citation.js'
import type { Quantity } from '../physiology.js'
import type { AskedLifeStage, CheckPage, NamedStudy } from './check.js'
import { STAGES_ANY_NEVER_COVERS } from './selection.js'

type EndOfSpan = 'lowC' | 'highC'

interface Line {
  meanC: number | null
  lowC: number | null
  highC: number | null
  isSummary: boolean
}

/**
 * A line's study mean. A compiler's summary spans study means, so the end asked for is one. Where a study gives a span but
 * no mean, the end that makes for more caution stands in for it.
 */
function findStudyMean(line: Line, endOfMeans: EndOfSpan, cautiousEnd: EndOfSpan) {
  if (line.isSummary && line[endOfMeans] !== null) {
    return { valueC: line[endOfMeans], basis: 'span-of-means' as const }
  }
  if (line.meanC !== null) return { valueC: line.meanC, basis: 'mean' as const }
  const valueC = line[cautiousEnd] ?? line[cautiousEnd === 'lowC' ? 'highC' : 'lowC']
  return valueC === null ? null : { valueC, basis: 'span-without-mean' as const }
}

/** Whether a record speaks for the asked stage: that stage itself, stage not stated, or any (never of egg or larva). */
export function speaksForStage(stage: NamedStudy['lifeStage'], asked: AskedLifeStage): boolean {
  if (stage === asked || stage === 'unspecified') return true
  return stage === 'any' && !STAGES_ANY_NEVER_COVERS.includes(asked)
}

/** Every study mean of one quantity a page holds, from its datasets and from its own citations. */
export function listStudyMeans(
  page: Pick<CheckPage, 'physiology' | 'sources'>,
  quantity: Quantity,
  endOfMeans: EndOfSpan,
  cautiousEnd: EndOfSpan,
): NamedStudy[] {
  const studies: NamedStudy[] = []
  for (const { itemId, row, studies: lines } of page.physiology) {
    for (const line of lines) {
      if (line.quantity !== quantity) continue
      const found = findStudyMean({ ...line, isSummary: line.level === 'summary' }, endOfMeans, cautiousEnd)
      if (found === null) continue
      const source = line.sourceId === null ? undefined : page.sources[line.sourceId]
      const name = source === undefined ? line.sourceAsPrinted : toShortCitation(source)
      const { sourceId, lifeStage, animals } = line
      studies.push({ itemId, name, sourceId, lifeStage, n: animals, ...found })
    }
    if (row.form !== 'cited' || row.quantity !== quantity) continue
    const found = findStudyMean({ ...row, isSummary: false }, endOfMeans, cautiousEnd)
    if (found === null) continue
    const source = page.sources[row.sourceId]
    const name = source === undefined ? 'a source of this page' : toShortCitation(source)
    studies.push({ itemId, name, sourceId: row.sourceId, lifeStage: row.lifeStage, n: row.n, ...found })
  }
  return studies
}

/** The study with the highest value; null of none. */
export function findHighest(studies: readonly NamedStudy[]): NamedStudy | null {
  return studies.reduce<NamedStudy | null>(
    (best, study) => (best === null || study.valueC > best.valueC ? study : best),
    null,
  )
}

/** The study with the lowest value; null of none. */
export function findLowest(studies: readonly NamedStudy[]): NamedStudy | null {
  return studies.reduce<NamedStudy | null>(
    (best, study) => (best === null || study.valueC < best.valueC ? study : best),
    null,
  )
}
