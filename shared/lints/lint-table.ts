import type { Lint, LintId, LintLevel } from './lint.js'

/** Every lint, worst level first, with its level and the sentence that tells what to do. */
export const LINTS: Readonly<Record<LintId, { level: LintLevel; sentence: string }>> = {
  'low-over-high': {
    level: 'blocks',
    sentence:
      'A low bound is over its high bound, or a lower limit over its upper limit. Swap them, or correct the one that is wrong.',
  },
  'limit-inside-range': {
    level: 'blocks',
    sentence:
      'A limit lies inside this range or on its bound, so that a reading could be right and harmful at once. Move the limit outwards or narrow the range.',
  },
  'duplicate-key': {
    level: 'blocks',
    sentence:
      'These ranges answer the same question: same parameter, position, period, season and life stage. Keep one and move the evidence of the others under it.',
  },
  'zone-outside-1-to-4': {
    level: 'blocks',
    sentence:
      'There are four exposure zones, 1 to 4. Choose one of them, or leave the zone empty: what a meter shows is a UV index and belongs in the bounds.',
  },
  'physically-impossible': {
    level: 'blocks',
    sentence: 'No such value exists in nature. Correct the number, its unit or its parameter.',
  },
  'no-evidence': {
    level: 'warns',
    sentence:
      'No source supports this range. Add one that speaks of enclosures or of field sites, or take the range off; what is known of the body supports no range.',
  },
  'outside-envelope': {
    level: 'warns',
    sentence:
      'The range reaches past everything its sources state. Narrow it, or add the source that goes so far.',
  },
  'looks-like-other-unit': {
    level: 'warns',
    sentence: 'This value looks like one in another unit. Compare it with the source and correct the unit.',
  },
  'cool-end-warmer': {
    level: 'warns',
    sentence:
      'The cool end is warmer than the warm end, so the animal has nowhere to cool down. Check both ranges; they may be swapped.',
  },
  'trapped-in-cautions': {
    level: 'warns',
    sentence:
      'An animal cannot get away from this place, and part of the range lies where its own physiology calls for caution. Bring the range back, or name the source that shows it is borne for hours.',
  },
  'limit-past-cautions': {
    level: 'warns',
    sentence:
      'This limit rests on a critical temperature, which is borne for minutes only, and lies past the temperature from which physiology calls for caution. Move it inwards.',
  },
  'humidity-one-air-cannot-do': {
    level: 'warns',
    sentence:
      'No single air gives these humidities at these temperatures. Say in the note which place is to be kept wet or ventilated by itself, or correct the ranges.',
  },
  'needs-joining-row': {
    level: 'warns',
    sentence:
      'Two ranges both answer one question and neither is the closer answer. Add the range that joins their keys; until then the worse verdict stands.',
  },
  'locator-missing': {
    level: 'warns',
    sentence:
      'Evidence without a page, table or figure is hard to look up. Add where in the source it stands.',
  },
  'one-study-only': {
    level: 'informs',
    sentence:
      'A single study stands behind this range. A second, independent source would show how far they agree.',
  },
  'keepers-reports-only': {
    level: 'informs',
    sentence:
      'Only keepers’ reports stand behind this range. A guideline or a field measurement would carry it further.',
  },
  'night-warmer-than-day': {
    level: 'informs',
    sentence: 'This place is warmer by night than by day. Check that the periods are not swapped.',
  },
  'hide-warmer-than-basking': {
    level: 'informs',
    sentence: 'A hide is warmer than the basking place. Check that the positions are not swapped.',
  },
  'evidence-over-30-years': {
    level: 'informs',
    sentence: 'This evidence is more than 30 years old. Look whether a newer source says the same.',
  },
}

/** A finding of one lint about some items, each item named once. */
export function makeLint(id: LintId, itemIds: readonly string[]): Lint {
  return { id, ...LINTS[id], itemIds: [...new Set(itemIds)] }
}
