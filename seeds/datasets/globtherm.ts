import type { DatasetDefinition } from './definition.js'
import { cc0 } from './licences.js'
import { parseNote } from './note.js'
import { readRecord } from './read-record.js'

/** The one key whose column mixes two meanings: a temperature in °C, or F for an animal tested fresh from the field. */
const acclimationKey = 'acclimation_temp_C_or_F'

/** Heat and cold limits of animals on land; references are author and year only. */
export const globtherm: DatasetDefinition = {
  id: 'globtherm',
  title: 'GlobTherm',
  version: '2017-11-10',
  doi: '10.5061/dryad.1cv08',
  ...cc0,
  attribution:
    'Bennett et al. (2018), GlobTherm, Scientific Data 5:180022, doi 10.1038/sdata.2018.22; data doi 10.5061/dryad.1cv08, CC0 1.0 by the policy of the archive.',
  file: 'globtherm.csv',
  label: 'GlobTherm (Bennett et al. 2018)',
  recordIdPrefix: 'globtherm:',
  ownSource: null,
  parameters: ['ctmax', 'ctmin', 'lt50_hot', 'lt50_cold', 'lt100_hot', 'lt100_cold', 'supercooling_point'],
  units: ['degC'],
  readRow: (row) => {
    const { facts, remarks } = parseNote(row.note)
    const acclimation = facts.get(acclimationKey)
    facts.delete(acclimationKey)
    if (acclimation !== undefined && acclimation !== 'F') facts.set('acclimation_temp_C', acclimation)
    const note = [...[...facts].map(([key, value]) => `${key}=${value}`), ...remarks].join('; ')
    return readRecord(
      { ...row, note },
      'study',
      { form: 'key', asPrinted: row.source_citation },
      acclimation === 'F' ? { acclimation: 'fresh from the field' } : {},
    )
  },
}
