import type { Quantity } from '../../shared/physiology.js'
import type { RecordRow } from './columns.js'
import type { Citation, RowReading } from './definition.js'
import { findSpreadC, parseNote, toFacts } from './note.js'
import { findImplausible } from './plausibility.js'

interface Meaning {
  quantity: Quantity
  lethalPercent: 0 | 50 | 100 | null
}

/** What each parameter of the files measures. */
const meanings: Record<string, Meaning> = {
  tb_field: { quantity: 'field-body-temperature', lethalPercent: null },
  tpref: { quantity: 'selected-body-temperature', lethalPercent: null },
  ctmin: { quantity: 'critical-thermal-minimum', lethalPercent: null },
  ctmax: { quantity: 'critical-thermal-maximum', lethalPercent: null },
  lt0_cold: { quantity: 'lethal-minimum', lethalPercent: 0 },
  lt0_hot: { quantity: 'lethal-maximum', lethalPercent: 0 },
  lt50_cold: { quantity: 'lethal-minimum', lethalPercent: 50 },
  lt50_hot: { quantity: 'lethal-maximum', lethalPercent: 50 },
  lt100_cold: { quantity: 'lethal-minimum', lethalPercent: 100 },
  lt100_hot: { quantity: 'lethal-maximum', lethalPercent: 100 },
  supercooling_point: { quantity: 'supercooling-point', lethalPercent: null },
}

/** Reads a row as one record of the animal's body, or says why it cannot be used. */
export function readRecord(
  row: RecordRow,
  level: 'study' | 'summary',
  citation: Citation,
  moreFacts: Record<string, string> = {},
): RowReading {
  const meaning = meanings[row.parameter]
  if (!meaning) throw new RangeError(`No meaning is known for the parameter ${row.parameter}.`)
  const numbers = { meanC: toNumber(row.value), lowC: toNumber(row.min), highC: toNumber(row.max) }
  const implausible = findImplausible(meaning.quantity, numbers)
  if (implausible !== null) return { form: 'rejected', reason: implausible }
  const n = toNumber(row.n)
  // A fraction here is most often a temperature in the wrong column (8 °C selected by 34.519 lizards).
  if (n !== null && !(Number.isInteger(n) && n > 0)) {
    return { form: 'rejected', reason: `The number of animals, ${n}, is not a whole number above 0.` }
  }
  const note = parseNote(row.note)
  return {
    form: 'record',
    citation,
    record: {
      recordId: row.record_id,
      nameAsPrinted: row.scientific_name,
      ...meaning,
      // A blank stage is unspecified, which is not the same as any.
      lifeStage: row.life_stage === '' ? 'unspecified' : row.life_stage,
      ...numbers,
      sdC: findSpreadC(note, 'sd'),
      seC: findSpreadC(note, 'se'),
      n,
      level,
      facts: { ...toFacts(note), ...moreFacts },
    },
  }
}

function toNumber(printed: string | null): number | null {
  return printed === null ? null : Number(printed)
}
