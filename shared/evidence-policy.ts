import type { EvidenceKind } from './evidence.js'

/**
 * How much one study's vote weighs, by the kind of its evidence. Our policy, no source: what a guideline recommends and
 * what was measured in the field count whole; a keepers' report and a compilation of others' work count half. What is
 * known of the animal's body supports no range, since body temperature is not enclosure temperature.
 */
export const EVIDENCE_WEIGHTS: Readonly<Record<EvidenceKind, number>> = {
  guideline: 1,
  'field-site': 1,
  review: 0.5,
  'keepers-report': 0.5,
  'field-body-temperature': 0,
  'selected-in-gradient': 0,
  'tolerance-limit': 0,
}

/** Support has to be over this share of the weight for a value to belong to the core. Our policy. */
export const CORE_SUPPORT = 0.5

/** Whether evidence of this kind can support an enclosure range at all. */
export function canSupportRange(kind: EvidenceKind): boolean {
  return EVIDENCE_WEIGHTS[kind] > 0
}
