import { uvZoneSchema } from './ranges.js'
import type { UvZone } from './ranges.js'

/** What one exposure zone says: a class of animals by the UV index they seek in the wild. UV index, dimensionless. */
export interface ZoneDescription {
  zone: UvZone
  /** The way of life the zone stands for. */
  lives: string
  /** Average voluntary exposure. */
  average: { low: number; high: number }
  /** Maximum exposure recorded. Zones overlap on purpose: average and maximum are different quantities. */
  maximum: { low: number; high: number }
}

/** Where the zones come from. */
export const ZONE_SOURCES = [
  'Ferguson et al. 2010, Zoo Biology 29: 317–334, doi:10.1002/zoo.20255',
  'Baines et al. 2016, Journal of Zoo and Aquarium Research 4(1)',
] as const
/** To be shown wherever the numbers are. */
export const ZONE_NOTE = 'Entered from memory, to be confirmed against the paper.'

/** The four published zones (Ferguson et al. 2010; Baines et al. 2016), entered from memory, to be confirmed against the paper. */
export const UV_ZONES: readonly ZoneDescription[] = [
  {
    zone: 1,
    lives: 'Active at dusk or in shade; takes on the temperature around it',
    average: { low: 0, high: 0.7 },
    maximum: { low: 0.6, high: 1.4 },
  },
  {
    zone: 2,
    lives: 'Partial sun, basks now and then',
    average: { low: 0.7, high: 1 },
    maximum: { low: 1.1, high: 3 },
  },
  {
    zone: 3,
    lives: 'Basks in open or partial sun',
    average: { low: 1, high: 2.6 },
    maximum: { low: 2.9, high: 7.4 },
  },
  {
    zone: 4,
    lives: 'Basks in the midday sun',
    average: { low: 2.6, high: 3.5 },
    maximum: { low: 4.5, high: 9.5 },
  },
]

export type ParsedZone = { ok: true; zone: UvZone } | { ok: false; message: string }

/**
 * An exposure zone from what was typed or sent. Anything but 1, 2, 3 or 4 is refused with the reason, since a number
 * outside them is most likely a UV index.
 */
export function parseZone(input: string | number): ParsedZone {
  const isDigit = typeof input === 'number' || /^\s*[1-4]\s*$/.test(input)
  const parsed = uvZoneSchema.safeParse(isDigit ? Number(input) : Number.NaN)
  if (parsed.success) return { ok: true, zone: parsed.data }
  return {
    ok: false,
    message:
      'There are four exposure zones, 1 to 4: classes of animals by the UV index they seek. What a meter shows is a UV index and belongs in the UV index field.',
  }
}

/** The table's row of a zone. */
export function describeZone(zone: UvZone): ZoneDescription {
  const described = UV_ZONES.find((row) => row.zone === zone)
  if (described === undefined) throw new Error(`There is no exposure zone ${String(zone)}.`)
  return described
}
