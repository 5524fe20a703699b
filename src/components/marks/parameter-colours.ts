import type { Parameter } from '../../../shared/ranges.js'

/** The colour a parameter is drawn in, and its wash, as references to our tokens. Never the only thing that tells it. */
export const PARAMETER_COLOURS: Record<Parameter, { line: string; wash: string }> = {
  temperature: { line: 'var(--ember)', wash: 'var(--ember-wash)' },
  'relative-humidity': { line: 'var(--lagoon)', wash: 'var(--lagoon-wash)' },
  'uv-index': { line: 'var(--iris)', wash: 'var(--iris-wash)' },
  photoperiod: { line: 'var(--straw)', wash: 'var(--straw-wash)' },
  'basking-heat-hours': { line: 'var(--straw)', wash: 'var(--straw-wash)' },
}
