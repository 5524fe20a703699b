import type { DatasetDefinition } from './definition.js'
import { ccBy4 } from './licences.js'
import { parseNote } from './note.js'
import { readRecord } from './read-record.js'

/**
 * Reference keys that stand beside the DOI of another work: an article of 1976 beside a DOI of 2020, and two theses beside
 * articles of the journal the DOI names. Joining those would put one study's numbers under another's title.
 */
const foreignDois: Record<string, string> = {
  Burke_1976: '10.1016/j.jtherbio.2020.102744',
  Markle_2015: '10.1002/ece3.4006',
  'Paez-Vacas_2016': '10.1002/ece3.7521',
}

/** Amphibian heat and cold limits and selected temperatures, one row a published estimate. */
export const amphitherm: DatasetDefinition = {
  id: 'amphitherm',
  title: 'AmphiTherm',
  version: '2025, revision 8f5be5b8',
  doi: '10.5281/zenodo.16751427',
  ...ccBy4,
  attribution:
    'Pottier et al. (2025), AmphiTherm, doi 10.5281/zenodo.16751427, CC BY 4.0. Rows were regrouped by species and study; values are unchanged.',
  file: 'amphitherm.csv',
  label: 'AmphiTherm (Pottier et al. 2025)',
  recordIdPrefix: 'amphitherm:',
  ownSource: null,
  parameters: ['ctmax', 'ctmin', 'tpref', 'lt50_hot', 'lt50_cold'],
  units: ['degC'],
  readRow: (row) => {
    const key = parseNote(row.note).facts.get('ref_key')
    const isForeign = key !== undefined && foreignDois[key] === row.source_doi
    return readRecord(row, 'study', {
      form: 'reference',
      asPrinted: row.source_citation,
      doi: isForeign ? null : row.source_doi,
    })
  },
}
