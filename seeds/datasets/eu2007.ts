import type { Statement } from '../../shared/evidence.js'
import type { Parameter, Position } from '../../shared/ranges.js'
import type { Unit } from '../../shared/units.js'
import type { RecordRow } from './columns.js'
import type { DatasetDefinition, RowReading } from './definition.js'
import { parseNote, type Note } from './note.js'

interface Meaning {
  parameter: Parameter
  position: Position
  unit: Unit
  printedUnit: string
}

/** Air and humidity are recommended for the enclosure as a whole; water for the water. */
const meanings: Record<string, Meaning> = {
  ambient_temperature_recommended: {
    parameter: 'temperature',
    position: 'whole-enclosure',
    unit: 'degC',
    printedUnit: 'degC',
  },
  water_temperature_recommended: {
    parameter: 'temperature',
    position: 'water',
    unit: 'degC',
    printedUnit: 'degC',
  },
  relative_humidity_recommended: {
    parameter: 'relative-humidity',
    position: 'whole-enclosure',
    unit: 'percentRh',
    printedUnit: '%RH',
  },
}

/** Housing that the European Union recommends for animals in laboratories: the only enclosure ranges in these data. */
export const eu2007: DatasetDefinition = {
  id: 'eu2007',
  title: 'Commission Recommendation 2007/526/EC, tables I.1 and J.1',
  version: '2007-07-30',
  doi: null,
  licence: 'Legal text of the European Union; its terms of reuse were not confirmed',
  licenceUrl: null,
  attribution:
    'Commission Recommendation 2007/526/EC of 18 June 2007, Official Journal of the European Union L 197, 30.7.2007; numbers only, read in the Polish-language text.',
  file: 'eu-2007-526-ec.csv',
  label: 'EU Recommendation 2007/526/EC tables I.1 and J.1',
  recordIdPrefix: 'eu2007:',
  ownSource: {
    kind: 'law',
    doi: null,
    csl: {
      type: 'legislation',
      title:
        'Commission Recommendation 2007/526/EC of 18 June 2007 on guidelines for the accommodation and care of animals used for experimental and other scientific purposes',
      author: [{ literal: 'European Commission' }],
      issued: { 'date-parts': [[2007, 6, 18]] },
      'container-title': 'Official Journal of the European Union',
      volume: 'L 197',
    },
  },
  parameters: Object.keys(meanings),
  units: ['degC', '%RH'],
  readRow: (row) => {
    const note = parseNote(row.note)
    return note.facts.get('how_obtained') === 'read today'
      ? readRange(row, note)
      : { form: 'left-out', reason: 'from memory, not read in the text' }
  },
}

function readRange(row: RecordRow, note: Note): RowReading {
  const meaning = meanings[row.parameter]
  if (!meaning) throw new RangeError(`No meaning is known for the parameter ${row.parameter}.`)
  if (row.unit !== meaning.printedUnit)
    return { form: 'rejected', reason: `The unit ${row.unit} does not fit.` }
  const { min, max } = row
  const low = min === null ? null : Number(min)
  const high = max === null ? null : Number(max)
  if (low === null && high === null) return { form: 'rejected', reason: 'The row gives no bound.' }
  if (low !== null && high !== null && low > high) {
    return { form: 'rejected', reason: `The lower bound ${low} is above the upper ${high}.` }
  }
  const statement: Statement = low === null ? 'at-most' : high === null ? 'at-least' : 'interval'
  return {
    form: 'range',
    citation: { form: 'own', asPrinted: row.source_citation },
    range: {
      parameter: meaning.parameter,
      position: meaning.position,
      // The tables' last column is the animal's main period of activity (read in the Official Journal: "Główny okres
      // aktywności"), not the time of day its temperature is for; the recommendation holds by day and by night.
      period: 'any',
      season: 'any',
      lifeStage: 'adult',
      low,
      high,
      lowerLimit: null,
      upperLimit: null,
      typedUnit: meaning.unit,
      typed: null,
      uvMeaning: null,
      uvZone: null,
      note: describeActivity(note),
    },
    evidence: {
      kind: 'guideline',
      locator: findLocator(row.source_citation, note),
      statement,
      printed: { low: min, high: max, mean: null, sd: null, unit: meaning.unit },
      low,
      high,
      mean: null,
      sd: null,
      n: null,
      note: describeScope(note),
    },
  }
}

/** "The table gives day as the animal's main period of activity." where the note says so. */
function describeActivity({ remarks }: Note): string | null {
  const activity = remarks
    .map((remark) => /^activity period (?<when>.+)$/.exec(remark)?.groups?.when)
    .find(Boolean)
  return activity ? `The table gives ${activity} as the animal’s main period of activity.` : null
}

/** Page and table: "p. 82, table J.1". */
function findLocator(citation: string, { remarks }: Note): string | null {
  const page = /\bp\. \d+/.exec(citation)?.[0]
  const table = remarks.map((remark) => /^table [A-Z]\.\d/.exec(remark)?.[0]).find(Boolean)
  const places = [page, table].filter((place) => place !== undefined)
  return places.length > 0 ? places.join(', ') : null
}

function describeScope({ remarks }: Note): string {
  const subspecies = remarks
    .map((remark) => /subspecies (?<name>[a-z]+)/.exec(remark)?.groups?.name)
    .find(Boolean)
  const general = remarks.find((remark) => remark.startsWith('general limit'))
  return [
    'Laboratory housing; read in the Polish-language text.',
    subspecies ? `Printed for the subspecies ${subspecies}.` : null,
    general
      ? 'Printed for aquatic reptiles in general: below this temperature, against germs in the water.'
      : null,
  ]
    .filter((sentence) => sentence !== null)
    .join(' ')
}
