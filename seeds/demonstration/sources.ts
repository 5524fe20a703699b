import type { EvidenceKind } from '../../shared/evidence.js'
import type { CslItem, SourceKind } from '../../shared/sources.js'

/** An invented source and the kind of evidence that it usually gives. */
interface DemonstrationSource {
  kind: SourceKind
  evidenceKind: EvidenceKind
  csl: CslItem
}

const CSL_TYPES = {
  article: 'article-journal',
  book: 'book',
  thesis: 'thesis',
  report: 'report',
  'web-page': 'webpage',
} as const

function invent(
  kind: keyof typeof CSL_TYPES,
  evidenceKind: EvidenceKind,
  authors: readonly (readonly [family: string, given: string])[] | string,
  year: number,
  title: string,
  publishedIn: string,
  place: { volume?: string; page?: string } = {},
): DemonstrationSource {
  const author =
    typeof authors === 'string'
      ? [{ literal: authors }]
      : authors.map(([family, given]) => ({ family, given }))
  const where = `${publishedIn} (invented)`
  return {
    kind,
    evidenceKind,
    csl: {
      type: CSL_TYPES[kind],
      title,
      author,
      issued: { 'date-parts': [[year]] },
      ...(kind === 'article' ? { 'container-title': where } : { publisher: where }),
      ...place,
      note: 'Invented for the demonstration; there is no such work.',
    },
  }
}

/** The invented literature of the invented country of Sulenmark. They disagree, as sources do. */
export const SOURCES = {
  'standards-board': invent(
    'report',
    'guideline',
    'Sulenmark Board of Animal Standards',
    2021,
    'Housing standards for native reptiles, amphibians and arachnids',
    'Board papers, Port Ellery',
  ),
  'hollow-manual': invent(
    'report',
    'guideline',
    'Carrick Hollow Zoological Gardens',
    2019,
    'Care manual of the vivarium house, fourth edition',
    'Carrick Hollow',
  ),
  'field-stations': invent(
    'report',
    'field-site',
    [
      ['Ostrand', 'Maive'],
      ['Quill', 'Perrin'],
    ],
    2014,
    'Hourly temperature and humidity at nine field stations, 2009 to 2013',
    'Sulenmark Weather Office',
  ),
  'open-sky': invent(
    'article',
    'field-site',
    [
      ['Ostrand', 'Maive'],
      ['Feldt', 'Ingrun'],
    ],
    2016,
    'How much ultraviolet do Sulenmark reptiles seek?',
    'Annals of the Sulenmark Field Stations',
    { volume: '12', page: '41-66' },
  ),
  'vivarium-year': invent(
    'book',
    'review',
    [['Merrowby', 'Dace']],
    2018,
    'A vivarium year',
    'Lantern Quay Press',
  ),
  'circle-returns': invent(
    'web-page',
    'keepers-report',
    'Sulenmark Vivarium Circle',
    2023,
    'Members’ husbandry returns, 2015 to 2022',
    'Sulenmark Vivarium Circle',
  ),
  'nine-ectotherms': invent(
    'thesis',
    'selected-in-gradient',
    [['Lindqvar', 'Sunniva']],
    2011,
    'Heat and cold in nine ectotherms of the Sulenmark',
    'University of Port Ellery',
  ),
  'hot-stones': invent(
    'article',
    'field-site',
    [
      ['Tarnow', 'Brisa'],
      ['Ostrand', 'Maive'],
    ],
    2025,
    'Hot stones: surfaces under basking pan lizards across three summers',
    'Annals of the Sulenmark Field Stations',
    { volume: '21', page: '3-19' },
  ),
  'pan-lizard-gradient': invent(
    'article',
    'selected-in-gradient',
    [['Pavlen', 'Joss']],
    2017,
    'Selected temperature of the salt-pan lizard before and after feeding',
    'Ellery Journal of Comparative Biology',
    { volume: '8', page: '112-125' },
  ),
  'pan-keeping': invent(
    'web-page',
    'keepers-report',
    [['Dorrin', 'Kesta']],
    2022,
    'Eleven years with salt-pan lizards',
    'Own pages',
  ),
  'night-rock': invent(
    'article',
    'field-site',
    [
      ['Hask', 'Oriel'],
      ['Quill', 'Perrin'],
    ],
    2013,
    'Night on warm rock: retreats of a crevice gecko',
    'Annals of the Sulenmark Field Stations',
    { volume: '9', page: '77-98' },
  ),
  'gecko-notes': invent(
    'web-page',
    'keepers-report',
    [['Ivers', 'Tolly']],
    2020,
    'Breeding notes on the hush gecko',
    'Circle newsletter',
  ),
  'cloud-canopy': invent(
    'article',
    'field-site',
    [['Wetherane', 'Ludo']],
    2015,
    'Life in the wet canopy: a climbing lizard of the cloud belt',
    'Annals of the Sulenmark Field Stations',
    { volume: '11', page: '5-33' },
  ),
  'cloud-keeping': invent(
    'web-page',
    'keepers-report',
    [['Ollenby', 'Fern']],
    2021,
    'Keeping cloudwood climbers cool',
    'Own pages',
  ),
  'fen-snakes': invent(
    'article',
    'field-site',
    [
      ['Fenn', 'Haldis'],
      ['Lindqvar', 'Sunniva'],
    ],
    2012,
    'Summer warmth and winter dens of the rimeback snake',
    'Annals of the Sulenmark Field Stations',
    { volume: '8', page: '51-80' },
  ),
  'rimeback-breeding': invent(
    'web-page',
    'keepers-report',
    [['Braskel', 'Noor']],
    2019,
    'Nine broods of rimebacks',
    'Circle newsletter',
  ),
  'down-tortoises': invent(
    'article',
    'field-site',
    [['Sarnfield', 'Odell']],
    2016,
    'Grazing hours and warm places of the down tortoise',
    'Annals of the Sulenmark Field Stations',
    { volume: '12', page: '101-127' },
  ),
  'tortoise-keeping': invent(
    'web-page',
    'keepers-report',
    [['Tollervane', 'Ruth']],
    2022,
    'Raising down tortoises from the egg',
    'Own pages',
  ),
  'mere-turtles': invent(
    'article',
    'field-site',
    [
      ['Meredan', 'Alis'],
      ['Quill', 'Perrin'],
    ],
    2010,
    'Logs, banks and water: a pond turtle through the year',
    'Annals of the Sulenmark Field Stations',
    { volume: '6', page: '14-40' },
  ),
  'turtle-rearing': invent(
    'web-page',
    'keepers-report',
    [['Pellam', 'Grey']],
    2021,
    'Rearing mere turtle hatchlings',
    'Circle newsletter',
  ),
  'drip-leaf': invent(
    'article',
    'field-site',
    [['Ilvery', 'Sanne']],
    2018,
    'Where dripleaf frogs sit: heat and water in the understorey',
    'Annals of the Sulenmark Field Stations',
    { volume: '14', page: '60-83' },
  ),
  'frog-room': invent(
    'web-page',
    'keepers-report',
    [['Dunmarrow', 'Cole']],
    2020,
    'A frog room diary',
    'Own pages',
  ),
  'ledge-burrows': invent(
    'article',
    'field-site',
    [['Ledger', 'Wynn']],
    2017,
    'The air of a burrow: a tunnel spider of the dune ledges',
    'Annals of the Sulenmark Field Stations',
    { volume: '13', page: '22-39' },
  ),
  'spider-keeping': invent(
    'web-page',
    'keepers-report',
    [['Keppler', 'Isa']],
    2022,
    'Tunnel spiders without fuss',
    'Own pages',
  ),
} as const satisfies Record<string, DemonstrationSource>

/** Names an invented source in the scenario's own files. */
export type SourceKey = keyof typeof SOURCES

/** The reference in words, by which the source is known again when the scenario is loaded anew. */
export function toReference(key: SourceKey): string {
  const { csl } = SOURCES[key]
  const authors = (csl.author ?? []).map(
    (author) => author.literal ?? `${author.family ?? ''}, ${author.given ?? ''}`,
  )
  const year = csl.issued?.['date-parts']?.[0]?.[0] ?? ''
  const where = csl['container-title'] ?? csl.publisher
  return `${authors.join('; ')} (${year}). ${csl.title ?? ''}. ${String(where)}.`
}
