import {
  EVIDENCE_KIND_LABELS,
  PARAMETER_LABELS,
  PERIOD_LABELS,
  POSITION_LABELS,
} from '../../shared/labels.js'
import type { OverlapFilter, SearchQuery } from '../../shared/search.js'
import { writeOverlap } from '../../shared/search-query.js'
import type { TemperatureUnit } from '../../shared/units.js'
import { describeOverlapBounds } from './overlap-fields.js'

/** "Basking surface, lights on: 35 – 40 °C", with the parameter named where it is not temperature. */
export function describeOverlap(filter: OverlapFilter, temperatureUnit: TemperatureUnit): string {
  const what = filter.parameter === 'temperature' ? '' : `${PARAMETER_LABELS[filter.parameter]}, `
  const where = POSITION_LABELS[filter.position]
  const place = what ? what + where.toLowerCase() : where
  const when = PERIOD_LABELS[filter.period].toLowerCase()
  return `${place}, ${when}: ${describeOverlapBounds(filter, temperatureUnit)}`
}

/** One filter that is on, with the search as it would be without it. */
export interface ActiveFilter {
  key: string
  words: string
  without: Partial<SearchQuery>
}

/** The filters of a search, each in words. */
export function listActiveFilters(query: SearchQuery, temperatureUnit: TemperatureUnit): ActiveFilter[] {
  const lists = (['class', 'order', 'family', 'conservation'] as const).flatMap((name) =>
    query[name].map((value) => ({
      key: `${name}:${value}`,
      words: value,
      without: { [name]: query[name].filter((held) => held !== value) },
    })),
  )
  const zones = query.uvZone.map((zone) => ({
    key: `zone:${zone}`,
    words: `UV zone ${zone}`,
    without: { uvZone: query.uvZone.filter((held) => held !== zone) },
  }))
  const kinds = query.evidenceKind.map((kind) => ({
    key: `kind:${kind}`,
    words: EVIDENCE_KIND_LABELS[kind],
    without: { evidenceKind: query.evidenceKind.filter((held) => held !== kind) },
  }))
  const overlaps = query.overlaps.map((overlap) => ({
    key: writeOverlap(overlap),
    words: describeOverlap(overlap, temperatureUnit),
    without: { overlaps: query.overlaps.filter((held) => held !== overlap) },
  }))
  const flags: ActiveFilter[] = []
  if (query.hasRanges !== null) {
    const words = query.hasRanges ? 'With cited ranges' : 'No cited range yet'
    flags.push({ key: 'hasRanges', words, without: { hasRanges: null } })
  }
  if (query.invented !== null) {
    const words = query.invented ? 'Invented species' : 'Real species'
    flags.push({ key: 'invented', words, without: { invented: null } })
  }
  return [...flags, ...lists, ...zones, ...kinds, ...overlaps]
}
