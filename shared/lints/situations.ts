import { selectRanges } from '../checker/selection.js'
import type { Asked } from '../checker/selection.js'
import type { CitedRange, SpeciesPage } from '../species.js'
import type { Lint } from './lint.js'

/** A time and an animal for which a page can be asked what each place should read. */
export type Situation = Pick<Asked, 'period' | 'season' | 'lifeStage'>

/**
 * The situations that a page can answer differently: day and night, the seasons and life stages that it names, and always an
 * adult in the active season, which stands for everything left at `any`.
 */
export function listSituations(page: Pick<SpeciesPage, 'ranges' | 'physiology'>): Situation[] {
  const seasons = new Set<Situation['season']>(['active'])
  const lifeStages = new Set<Situation['lifeStage']>(['adult'])
  for (const { row } of page.ranges) {
    if (row.season !== 'any') seasons.add(row.season)
    if (row.lifeStage !== 'any') lifeStages.add(row.lifeStage)
  }
  for (const { row, studies } of page.physiology) {
    const stages = row.form === 'cited' ? [row.lifeStage] : studies.map((study) => study.lifeStage)
    for (const stage of stages) if (stage !== 'any' && stage !== 'unspecified') lifeStages.add(stage)
  }
  const periods = ['day', 'night'] as const
  return periods.flatMap((period) =>
    [...seasons].flatMap((season) => [...lifeStages].map((lifeStage) => ({ period, season, lifeStage }))),
  )
}

/** The one row that answers a question of temperature or humidity; null where there is none, or several that need joining. */
export function findAnswer(
  ranges: readonly CitedRange[],
  situation: Situation,
  parameter: 'temperature' | 'relative-humidity',
  position: Asked['position'],
): CitedRange | null {
  const { judged } = selectRanges(ranges, { ...situation, parameter, position, uvMeaning: null })
  return judged.length === 1 ? (judged[0] ?? null) : null
}

/** The findings with each said once, however many situations show it. */
export function dropRepeated(lints: readonly Lint[]): Lint[] {
  const byContent = new Map(lints.map((lint) => [`${lint.id} ${[...lint.itemIds].sort().join(' ')}`, lint]))
  return [...byContent.values()]
}
