import type { DatasetDefinition } from './definition.js'
import { cc0 } from './licences.js'
import { parseNote } from './note.js'
import { readRecord } from './read-record.js'

/**
 * Field and selected body temperatures of lizards, worm lizards and snakes: the compiler's lowest and highest published
 * mean of each species. The summary is the compiler's statement, so the dataset is its source; the studies behind it are
 * kept as printed and count as no study of their own.
 */
export const squambase: DatasetDefinition = {
  id: 'squambase',
  title: 'SquamBase',
  version: '1.0',
  doi: '10.5061/dryad.76hdr7t3b',
  ...cc0,
  attribution:
    'Meiri (2024), SquamBase 1.0, Global Ecology and Biogeography 33:e13812; data doi 10.5061/dryad.76hdr7t3b, CC0 1.0 by the policy of the archive, attribution requested.',
  file: 'squambase-thermal.csv',
  label: 'SquamBase 1.0 (Meiri 2024)',
  recordIdPrefix: 'squambase:',
  ownSource: {
    kind: 'dataset',
    doi: '10.5061/dryad.76hdr7t3b',
    csl: {
      type: 'dataset',
      title: 'SquamBase 1.0',
      author: [{ family: 'Meiri' }],
      issued: { 'date-parts': [[2024]] },
      publisher: 'Dryad',
    },
  },
  parameters: ['tb_field', 'tpref'],
  units: ['degC'],
  readRow: (row) =>
    parseNote(row.note).facts.get('level') === 'species_summary'
      ? readRecord(row, 'summary', { form: 'own', asPrinted: row.source_citation })
      : { form: 'left-out', reason: 'read by a script out of free text' },
}
