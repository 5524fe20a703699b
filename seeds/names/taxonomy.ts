import { z } from 'zod'
import type { ClassificationRow, NameRow, NameStatus } from '../../shared/names.js'
import { InvalidInput } from '../../server/errors.js'
import { readTable } from '../reading/read-table.js'
import { splitCommonNames } from './common-names.js'
import { normaliseConservation } from './conservation.js'

const taxonomyColumns = [
  'scientific_name',
  'authority',
  'class',
  'order',
  'suborder',
  'family',
  'accepted_name_2025',
  'name_status',
  'common_names',
  'common_names_source',
  'iucn_category_in_source',
  'main_biogeographic_region',
  'microhabitat',
  'habitat_type',
  'active_time',
  'n_records',
  'n_datasets',
  'parameters',
  'taxonomy_source',
] as const

/** What a list of names says of a name as a dataset prints it. */
const listedStatuses = {
  up_to_date: 'accepted',
  'accepted in AmphibiaWeb list (Jan 2025 copy)': 'accepted',
  updated: 'old',
  'synonym listed by AmphibiaWeb': 'old',
  'synonym listed in SquamBase': 'old',
  'not matched': 'unresolved',
  check_split: 'needs-a-person',
  ambiguous: 'needs-a-person',
  duplicated: 'needs-a-person',
} as const satisfies Record<string, NameStatus | 'old'>

const orNull = z.string().transform((value) => (value === '' ? null : value))

const taxonRowSchema = z.object({
  scientific_name: z.string().min(1),
  authority: orNull,
  class: z.string().min(1),
  order: orNull,
  suborder: orNull,
  family: orNull,
  accepted_name_2025: z.string(),
  name_status: z.enum(Object.keys(listedStatuses) as [keyof typeof listedStatuses]),
  common_names: z.string(),
  common_names_source: z.string(),
  iucn_category_in_source: z.string(),
  main_biogeographic_region: orNull,
  microhabitat: orNull,
  active_time: orNull,
  taxonomy_source: z.string().min(1),
})
type TaxonRow = z.infer<typeof taxonRowSchema>

/** What a dataset's own row says of a name that no list knows. */
export interface PrintedTaxon {
  name: string
  authority: string
  class: string
  order: string | null
  family: string | null
}

/** The names and the classification a page begins with. */
export interface TaxonDescription {
  names: NameRow[]
  classification: ClassificationRow
}

/** Which page a printed name belongs to, and what that page says of its taxon. */
export interface Taxonomy {
  /** The name of the page on which records of a printed name stand: the accepted name, or the printed one. */
  toPageName(printedName: string): string
  /** Names and classification of a page; `printed` describes a taxon that stands in no list. */
  describe(pageName: string, printed: PrintedTaxon, datasetTitle: string): TaxonDescription
}

/** Reads the list of names. Throws InvalidInput for a file that is not that list. */
export async function readTaxonomy(path: string): Promise<Taxonomy> {
  const table = await readTable(path, taxonomyColumns)
  const rows = new Map<string, TaxonRow>()
  for (const { line, cells } of table.rows) {
    const parsed = taxonRowSchema.safeParse(cells)
    if (!parsed.success) {
      throw new InvalidInput(
        `Line ${line} of the list of names cannot be used: column “${parsed.error.issues[0]?.path.join('.')}”.`,
      )
    }
    rows.set(parsed.data.scientific_name, parsed.data)
  }
  const rowsOfPage = new Map<string, TaxonRow[]>()
  for (const row of rows.values()) {
    const page = findPageName(row)
    rowsOfPage.set(page, [...(rowsOfPage.get(page) ?? []), row])
  }

  return {
    toPageName: (printedName) => {
      const row = rows.get(printedName)
      return row ? findPageName(row) : printedName
    },
    describe: (pageName, printed, datasetTitle) => {
      const own = rows.get(pageName)
      const others = (rowsOfPage.get(pageName) ?? [])
        .filter((row) => row !== own)
        .sort((a, b) => (a.scientific_name < b.scientific_name ? -1 : 1))
      const known = own ? [own, ...others] : others
      return known.length > 0 ? combineRows(pageName, own, known) : describePrinted(printed, datasetTitle)
    },
  }
}

/** Accepted names listed for a row; more than one where a species was split or lists disagree. */
function listAcceptedNames(row: TaxonRow): string[] {
  return row.accepted_name_2025
    .split(/[;|]/)
    .map((name) => name.trim())
    .filter((name) => name !== '')
}

function findStatus(row: TaxonRow): NameStatus | 'old' {
  const listed = listedStatuses[row.name_status]
  // Two accepted names for one old name: which of them a record means, only a person can tell.
  return listed === 'old' && listAcceptedNames(row).length !== 1 ? 'needs-a-person' : listed
}

function findPageName(row: TaxonRow): string {
  const [accepted] = listAcceptedNames(row)
  return findStatus(row) === 'old' && accepted !== undefined ? accepted : row.scientific_name
}

/** The facts of several rows that lead to one page: the page's own row first, then the old names in alphabetical order. */
function combineRows(pageName: string, own: TaxonRow | undefined, rows: TaxonRow[]): TaxonDescription {
  const status = own ? findStatus(own) : 'accepted'
  const sources = [...new Set(rows.map((row) => row.taxonomy_source))]
  const candidates = own && status === 'needs-a-person' ? listAcceptedNames(own) : []
  const names: NameRow[] = [
    {
      kind: 'scientific',
      name: pageName,
      authority: own?.authority ?? null,
      status: status === 'old' ? 'accepted' : status,
      language: null,
      provenance: clip(
        [
          (own ?? rows[0])?.taxonomy_source ?? '',
          candidates.length > 0 ? `the lists offer for it: ${candidates.join(', ')}` : '',
        ]
          .filter((part) => part !== '')
          .join('; '),
      ),
    },
    ...rows
      .filter((row) => row !== own)
      .map((row): NameRow => ({
        kind: 'synonym',
        name: row.scientific_name,
        authority: row.authority,
        status: null,
        language: null,
        provenance: row.taxonomy_source,
      })),
    ...listCommonNames(rows),
  ]
  const first = <K extends keyof TaxonRow>(key: K): TaxonRow[K] | null =>
    rows.map((row) => row[key]).find((value) => value !== null && value !== '') ?? null
  const order = first('order')
  const suborder = first('suborder')
  const conservationPrinted = first('iucn_category_in_source')
  const conservation = conservationPrinted === null ? null : normaliseConservation(conservationPrinted)
  return {
    names,
    classification: {
      class: first('class') ?? '',
      order,
      // Some lists repeat the order where there is no suborder.
      suborder: suborder === order ? null : suborder,
      family: first('family'),
      conservation,
      activeTime: first('active_time'),
      microhabitat: first('microhabitat'),
      region: first('main_biogeographic_region'),
      provenance: [
        sources.join('; '),
        conservation === null ? '' : `conservation category printed there as “${conservationPrinted}”`,
      ]
        .filter((part) => part !== '')
        .join('; '),
    },
  }
}

function listCommonNames(rows: TaxonRow[]): NameRow[] {
  const seen = new Set<string>()
  const names: NameRow[] = []
  for (const row of rows) {
    for (const { name, language, subspecies } of splitCommonNames(row.common_names)) {
      if (seen.has(name.toLowerCase())) continue
      seen.add(name.toLowerCase())
      names.push({
        kind: 'common',
        name,
        authority: null,
        status: null,
        language,
        provenance: [
          describeNameSource(row.common_names_source),
          subspecies && `of the subspecies ${subspecies}`,
        ]
          .filter(Boolean)
          .join('; '),
      })
    }
  }
  return names
}

function describeNameSource(printed: string): string {
  if (printed === 'from memory') return 'name from memory, no source'
  return printed.replace(/^from memory; /, 'name from memory; ')
}

function describePrinted(printed: PrintedTaxon, datasetTitle: string): TaxonDescription {
  const provenance = `as printed in ${datasetTitle}; in no list of names`
  return {
    names: [
      {
        kind: 'scientific',
        name: printed.name,
        authority: printed.authority === '' ? null : printed.authority,
        status: 'unresolved',
        language: null,
        provenance: clip(provenance),
      },
    ],
    classification: {
      class: printed.class,
      order: printed.order,
      suborder: null,
      family: printed.family,
      conservation: null,
      activeTime: null,
      microhabitat: null,
      region: null,
      provenance,
    },
  }
}

/** Provenance is a note of at most 300 characters. */
function clip(text: string): string {
  return text.length <= 300 ? text : `${text.slice(0, 299)}…`
}
