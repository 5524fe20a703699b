import { toSlug } from '../../shared/slugs.js'

/** Numbers in [0, 1) that are the same at each run (a linear congruential generator, Numerical Recipes' constants). */
export function makeNumbers(seed: number): () => number {
  let state = seed
  return () => {
    state = (state * 1_664_525 + 1_013_904_223) % 2 ** 32
    return state / 2 ** 32
  }
}

export interface GeneratedRange {
  parameter: 'temperature' | 'relative-humidity'
  position: string
  period: 'day' | 'night'
  low: number
  high: number
}

/** An invented species of the measurements: names and ranges as a listing holds them, and no living animal. */
export interface GeneratedSpecies {
  id: string
  slug: string
  scientificName: string
  synonyms: string[]
  commonNames: string[]
  class: string
  order: string
  family: string
  conservation: string | null
  uvZone: number | null
  physiologyCount: number
  evidenceKinds: string[]
  ranges: GeneratedRange[]
}

const SYLLABLES = 'ba ce di fo gu la me ni po ru sa te vi xo zu bra cle dri flo gru pla sce tri'.split(' ')
const GENUS_ENDINGS = ['saurus', 'rana', 'boa', 'gekko', 'lacerta', 'bufo', 'mantis', 'tarantis']
const SPECIES_ENDINGS = ['ensis', 'atus', 'icola', 'oides', 'ifer', 'escens', 'inus', 'alis']
const ADJECTIVES =
  'amber banded barred blue brown cave coast crested desert dwarf eyed field forest giant golden grey'
    .concat(
      ' hill horned island keeled lined long marsh mottled night northern painted pale plain red river rock',
    )
    .concat(
      ' sand scaly shield shore spotted stone striped swamp tailed thorny toothed valley veiled water wood',
    )
    .split(' ')
const NOUNS =
  'lizard skink gecko agama python viper turtle tortoise frog toad newt salamander spider mantis'.split(' ')
const CLASSES = [
  { class: 'Reptilia', orders: ['Squamata', 'Testudines', 'Crocodylia'] },
  { class: 'Amphibia', orders: ['Anura', 'Caudata'] },
  { class: 'Arachnida', orders: ['Araneae', 'Scorpiones'] },
] as const
const LISTINGS = ['Least concern', 'Near threatened', 'Vulnerable', 'Endangered', null] as const
const KINDS = ['guideline', 'field-body-temperature', 'selected-in-gradient', 'tolerance-limit']
const SPECIES_PER_GENUS = 8
/** About the share of pages with ranges that a reference of some age would have. */
const SHARE_WITH_RANGES = 0.3

function toId(number: number): string {
  return `00000000-0000-4000-8000-${number.toString(16).padStart(12, '0')}`
}

function capitalise(word: string): string {
  return word.charAt(0).toUpperCase() + word.slice(1)
}

/**
 * So many invented species, the same at each run; the first thousand of a hundred thousand are those of a thousand, so that
 * the same words are asked of both.
 */
export function* generateSpecies(count: number): Generator<GeneratedSpecies> {
  const next = makeNumbers(20_260_301)
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)] as T
  const makeWord = (syllables: number, ending: string) =>
    Array.from({ length: syllables }, () => pick(SYLLABLES)).join('') + ending
  const taken = new Set<string>()
  let genus = ''
  let place: { class: string; order: string; family: string } = { class: '', order: '', family: '' }
  for (let number = 1; number <= count; number += 1) {
    if (number % SPECIES_PER_GENUS === 1) {
      genus = capitalise(makeWord(3, pick(GENUS_ENDINGS)))
      const { class: name, orders } = pick(CLASSES)
      place = {
        class: name,
        order: pick(orders),
        family: `${capitalise(pick(SYLLABLES))}${pick(SYLLABLES)}idae`,
      }
    }
    const nameSpecies = () => `${genus} ${makeWord(2, pick(SPECIES_ENDINGS))}`
    let scientificName = nameSpecies()
    while (taken.has(scientificName)) scientificName = nameSpecies()
    taken.add(scientificName)
    const warm = 24 + Math.round(next() * 24) / 2
    const cool = warm - 4 - Math.round(next() * 12) / 2
    const damp = 20 + 5 * Math.floor(next() * 14)
    const ranges: GeneratedRange[] =
      next() < SHARE_WITH_RANGES
        ? [
            {
              parameter: 'temperature',
              position: 'basking-surface',
              period: 'day',
              low: warm + 6,
              high: warm + 11,
            },
            { parameter: 'temperature', position: 'warm-end-air', period: 'day', low: warm, high: warm + 4 },
            {
              parameter: 'temperature',
              position: 'warm-end-air',
              period: 'night',
              low: warm - 8,
              high: warm - 4,
            },
            { parameter: 'temperature', position: 'cool-end-air', period: 'day', low: cool, high: cool + 4 },
            {
              parameter: 'temperature',
              position: 'cool-end-air',
              period: 'night',
              low: cool - 4,
              high: cool,
            },
            {
              parameter: 'relative-humidity',
              position: 'cool-end-air',
              period: 'day',
              low: damp,
              high: damp + 20,
            },
          ]
        : []
    yield {
      id: toId(number),
      slug: toSlug(scientificName),
      scientificName,
      synonyms:
        next() < 0.6
          ? [`${capitalise(makeWord(3, pick(GENUS_ENDINGS)))} ${scientificName.split(' ')[1]}`]
          : [],
      commonNames: Array.from(
        { length: Math.floor(next() * 3) },
        () => `${capitalise(pick(ADJECTIVES))} ${pick(ADJECTIVES)} ${pick(NOUNS)}`,
      ),
      ...place,
      conservation: pick(LISTINGS),
      uvZone: ranges.length > 0 && next() < 0.5 ? 1 + Math.floor(next() * 4) : null,
      physiologyCount: next() < 0.8 ? 1 + Math.floor(next() * 40) : 0,
      evidenceKinds: KINDS.filter(() => next() < 0.3),
      ranges,
    }
  }
}
