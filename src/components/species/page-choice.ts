import type { AskedLifeStage, AskedSeason } from '../../../shared/checker/check.js'
import type { CitedRange } from '../../../shared/species.js'

/** The question a species page is showing the answer to: whose enclosure, in which season, lights on or off. */
export interface PageChoice {
  lifeStage: AskedLifeStage
  season: AskedSeason
  period: 'day' | 'night'
}

/** What a page lets its reader choose from: only what it has rows for, each in the order of a life or a year. */
export interface PageOptions {
  lifeStages: AskedLifeStage[]
  seasons: AskedSeason[]
  periods: PageChoice['period'][]
}

type Query = Record<string, unknown>

const LIFE_STAGES: readonly AskedLifeStage[] = [
  'egg',
  'larva',
  'metamorph',
  'hatchling',
  'juvenile',
  'adult',
  'gravid',
]
const SEASONS: readonly AskedSeason[] = ['active', 'brumation', 'aestivation']

/**
 * The life stages, seasons and periods a page speaks of. A row for any stage speaks of the adult, one for any season of
 * the active one: there is no asking about any (`askedLifeStageSchema`). A page without rows is about the active adult.
 */
export function listOptions(ranges: readonly CitedRange[]): PageOptions {
  const stages = new Set(ranges.map(({ row }) => (row.lifeStage === 'any' ? 'adult' : row.lifeStage)))
  const seasons = new Set(ranges.map(({ row }) => (row.season === 'any' ? 'active' : row.season)))
  const lifeStages = LIFE_STAGES.filter((stage) => stages.has(stage))
  const chosenSeasons = SEASONS.filter((season) => seasons.has(season))
  const hasPeriods = ranges.some(({ row }) => row.period !== 'any')
  return {
    lifeStages: lifeStages.length > 0 ? lifeStages : ['adult'],
    seasons: chosenSeasons.length > 0 ? chosenSeasons : ['active'],
    periods: hasPeriods ? ['day', 'night'] : ['day'],
  }
}

function defaultChoice(options: PageOptions): PageChoice {
  const { lifeStages, seasons } = options
  return {
    lifeStage: lifeStages.includes('adult') ? 'adult' : (lifeStages.at(-1) ?? 'adult'),
    season: seasons.includes('active') ? 'active' : (seasons[0] ?? 'active'),
    period: 'day',
  }
}

/** Reads the choice from the address; what the page does not have falls back to the adult, the active season, lights on. */
export function readChoice(query: Query, options: PageOptions): PageChoice {
  const usual = defaultChoice(options)
  return {
    lifeStage: options.lifeStages.find((stage) => stage === query.stage) ?? usual.lifeStage,
    season: options.seasons.find((season) => season === query.season) ?? usual.season,
    period: query.lights === 'off' && options.periods.includes('night') ? 'night' : usual.period,
  }
}

/** The query of an address that shows this choice; what is shown anyway is left out. */
export function writeChoice(choice: PageChoice, options: PageOptions): Record<string, string> {
  const usual = defaultChoice(options)
  const query: Record<string, string> = {}
  if (choice.lifeStage !== usual.lifeStage) query.stage = choice.lifeStage
  if (choice.season !== usual.season) query.season = choice.season
  if (choice.period !== usual.period) query.lights = 'off'
  return query
}
