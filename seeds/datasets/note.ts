/** What the `note` column of a row says: facts by key, and remarks that have none. */
export interface Note {
  facts: Map<string, string>
  remarks: string[]
}

const factPattern = /^(?<key>[A-Za-z0-9_% ]*[A-Za-z_])=(?<value>.+)$/

/** Takes a semicolon list of "key=value" facts and free remarks apart. */
export function parseNote(note: string): Note {
  const facts = new Map<string, string>()
  const remarks: string[] = []
  for (const part of note.split('; ')) {
    const groups = factPattern.exec(part)?.groups
    if (groups?.key && groups.value) facts.set(groups.key, groups.value)
    else if (part !== '') remarks.push(part)
  }
  return { facts, remarks }
}

/** A spread in °C under one of the note's keys; null when it is not given, or not as one plain number. */
export function findSpreadC({ facts }: Note, key: 'sd' | 'se'): number | null {
  const printed = facts.get(key)
  return printed !== undefined && /^\d+(?:\.\d+)?$/.test(printed) ? Number(printed) : null
}

/** Facts in the words a page shows them under, with their unit; keys that are not listed keep the dataset's own. */
const factWords: Record<string, string> = {
  acclimation_temp_C: 'acclimation temperature (°C)',
  acclimation_days: 'acclimation time (days)',
  acclimation_time: 'acclimation time, unit as in the dataset',
  ramp_C_per_min: 'rate of change (°C/min)',
  ramp: 'rate of change, unit as in the dataset',
  photoperiod_h: 'photoperiod (h)',
  rh_pct: 'relative humidity (%)',
  gradient_low_C: 'low end of the gradient (°C)',
  gradient_high_C: 'high end of the gradient (°C)',
  lat: 'latitude (°)',
  lon: 'longitude (°)',
  elev_m: 'elevation (m)',
  medium: 'temperature measured in',
  endpoint: 'endpoint',
  origin: 'origin of the animals',
  peer_reviewed: 'review of the study',
  sex: 'sex',
  ci: 'half width of the confidence interval (°C)',
  compiler_note: 'note of the compiler',
  compiler_sources: 'sources as the compiler lists them',
  source_url: 'address of the study',
}

/** Keys that say again what the record itself says. */
const spokenFor = new Set(['level', 'sd', 'se', 'metric', 'ref_key'])

/** The remaining facts of a note, for a record to carry. */
export function toFacts({ facts, remarks }: Note): Record<string, string> {
  const entries = [...facts]
    .filter(([key]) => !spokenFor.has(key))
    .map(([key, value]): [string, string] => [factWords[key] ?? key, value])
  if (remarks.length > 0) entries.push(['remark', remarks.join('; ')])
  return Object.fromEntries(entries)
}
