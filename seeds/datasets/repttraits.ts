import type { DatasetDefinition } from './definition.js'
import { ccBy4 } from './licences.js'
import { readRecord } from './read-record.js'

/** Body temperatures of reptiles, one row a species: the compilers' summary, without a citation for each value. */
export const repttraits: DatasetDefinition = {
  id: 'repttraits',
  title: 'ReptTraits',
  version: '1.2',
  doi: '10.6084/m9.figshare.24572683',
  ...ccBy4,
  attribution:
    'Oskyrko, O., Mi, C., Meiri, S. & Du, W. (2024), ReptTraits: a comprehensive dataset of ecological traits in reptiles, Scientific Data 11:243, doi 10.1038/s41597-024-03079-5, CC BY 4.0. Body temperatures only; values are unchanged.',
  file: 'repttraits-tb.csv',
  label: 'ReptTraits v1.2 (Oskyrko et al. 2024)',
  recordIdPrefix: 'repttraits:',
  ownSource: {
    kind: 'article',
    doi: '10.1038/s41597-024-03079-5',
    csl: {
      type: 'article-journal',
      title: 'ReptTraits: a comprehensive dataset of ecological traits in reptiles',
      author: [
        { family: 'Oskyrko', given: 'O.' },
        { family: 'Mi', given: 'C.' },
        { family: 'Meiri', given: 'S.' },
        { family: 'Du', given: 'W.' },
      ],
      issued: { 'date-parts': [[2024]] },
      'container-title': 'Scientific Data',
      volume: '11',
      page: '243',
    },
  },
  parameters: ['tb_field'],
  units: ['degC'],
  readRow: (row) => readRecord(row, 'summary', { form: 'own', asPrinted: row.source_citation }),
}
