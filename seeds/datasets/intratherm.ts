import type { DatasetDefinition } from './definition.js'
import { cc0 } from './licences.js'
import { readRecord } from './read-record.js'

/** Heat and cold limits at several acclimation temperatures; references are author and year only. */
export const intratherm: DatasetDefinition = {
  id: 'intratherm',
  title: 'Intratherm (part)',
  version: 'revision d5ea458d',
  doi: null,
  ...cc0,
  attribution:
    'Part of the Intratherm compilation, from the data of Moore et al. (2023); CC0 1.0, acknowledgement requested.',
  file: 'intratherm-subset.csv',
  label: 'Intratherm subset in the Moore et al. 2023 data repository',
  recordIdPrefix: 'intratherm:',
  ownSource: null,
  parameters: ['ctmax', 'ctmin'],
  units: ['degC'],
  readRow: (row) => readRecord(row, 'study', { form: 'key', asPrinted: row.source_citation }),
}
