import type { DatasetDefinition } from './definition.js'
import { cc0 } from './licences.js'
import { readRecord } from './read-record.js'

/** Selected and field body temperatures, one row a study; references are author and year only. */
export const moore2023: DatasetDefinition = {
  id: 'moore2023',
  title: 'Selected and field body temperatures compiled for Moore et al. 2023',
  version: 'revision d5ea458d',
  doi: null,
  ...cc0,
  attribution:
    'Selected and field body temperatures compiled for Moore et al. (2023), on thermal potentials of ectotherms on land; CC0 1.0, acknowledgement requested.',
  file: 'moore2023-tpref.csv',
  label: 'Tpref/Tb compilation in the Moore et al. 2023 data repository',
  recordIdPrefix: 'moore2023:',
  ownSource: null,
  parameters: ['tpref', 'tb_field'],
  units: ['degC'],
  readRow: (row) => readRecord(row, 'study', { form: 'key', asPrinted: row.source_citation }),
}
