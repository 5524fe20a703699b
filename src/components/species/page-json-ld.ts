import { toFullReference } from '../../../shared/citation.js'
import { PARAMETER_LABELS } from '../../../shared/labels.js'
import type { SpeciesPage } from '../../../shared/species.js'

const CITATIONS_MAX = 40

function toTaxon(page: SpeciesPage) {
  const names = (kind: string) => page.names.filter(({ row }) => row.kind === kind).map(({ row }) => row.name)
  const parent = page.classification?.row.family ?? page.classification?.row.order ?? null
  return {
    '@type': 'Taxon',
    name: page.species.scientificName,
    taxonRank: 'species',
    alternateName: [...names('common'), ...names('synonym')],
    ...(parent === null ? {} : { parentTaxon: { '@type': 'Taxon', name: parent } }),
  }
}

/** The page for machines, in the words of schema.org: a dataset about a taxon, with what it cites. */
export function toJsonLd(page: SpeciesPage, address: string): Record<string, unknown> {
  const { species, revision } = page
  const measured = [...new Set(page.ranges.map(({ row }) => PARAMETER_LABELS[row.parameter]))]
  return {
    '@type': 'Dataset',
    name: `${species.scientificName}: cited conditions for keeping`,
    description: describePage(page),
    url: address,
    version: String(revision.number),
    datePublished: revision.publishedAt,
    // Contributions and each dataset have licences of their own; the terms say which holds for what.
    license: new URL('/terms', address).href,
    isAccessibleForFree: true,
    creator: { '@type': 'Organization', name: 'Mossgauge' },
    about: toTaxon(page),
    variableMeasured: page.physiology.length > 0 ? [...measured, 'Body temperature'] : measured,
    citation: Object.values(page.sources).slice(0, CITATIONS_MAX).map(toFullReference),
    ...(species.isInvented ? { creativeWorkStatus: 'Invented for a demonstration' } : {}),
  }
}

/** The page in a sentence or two, for link previews and search engines. */
export function describePage(page: SpeciesPage): string {
  const { species } = page
  const common = page.names.find(({ row }) => row.kind === 'common')?.row.name
  const name = common === undefined ? species.scientificName : `${species.scientificName} (${common})`
  const what =
    page.ranges.length > 0
      ? 'temperature, humidity and UV ranges by place, season and life stage, each with its source.'
      : page.physiology.length > 0
        ? 'what studies measured of its body temperature and limits, each with its source. No cited enclosure range yet.'
        : 'no cited range yet.'
  return `${species.isInvented ? 'Invented species, invented numbers. ' : ''}${name}: ${what}`
}
