import { quantitySchema, type PhysiologyRecord, type StudyLine } from './physiology.js'
import { recordLifeStageSchema } from './ranges.js'

function isNumber(value: number | null): value is number {
  return value !== null
}

/** What makes records one study: the same quantity, share of deaths, life stage, source and level. */
function toStudyKey(record: PhysiologyRecord): string {
  const { quantity, lethalPercent, lifeStage, level, sourceId, sourceAsPrinted } = record
  const source = sourceId === null ? `printed ${sourceAsPrinted}` : `source ${sourceId}`
  return JSON.stringify([quantity, lethalPercent, lifeStage, level, source])
}

function toStudyLine(records: readonly PhysiologyRecord[]): StudyLine | null {
  const [first] = records
  if (first === undefined) return null
  const means = records.map((record) => record.meanC).filter(isNumber)
  const numbers = records.flatMap((record) => [record.lowC, record.meanC, record.highC]).filter(isNumber)
  if (numbers.length === 0) return null
  const animals = records.map((record) => record.n).filter(isNumber)
  return {
    quantity: first.quantity,
    lethalPercent: first.lethalPercent,
    lifeStage: first.lifeStage,
    sourceId: first.sourceId,
    sourceAsPrinted: first.sourceAsPrinted,
    level: first.level,
    records: records.length,
    animals: animals.length === 0 ? null : animals.reduce((sum, n) => sum + n, 0),
    meanC: means.length === 0 ? null : means.reduce((sum, mean) => sum + mean, 0) / means.length,
    lowC: Math.min(...numbers),
    highC: Math.max(...numbers),
    isIndependent: first.level === 'study' && first.sourceId !== null,
  }
}

function compareLines(a: StudyLine, b: StudyLine): number {
  const place = (line: StudyLine) => [
    quantitySchema.options.indexOf(line.quantity),
    line.lethalPercent ?? -1,
    recordLifeStageSchema.options.indexOf(line.lifeStage),
    line.level === 'study' ? 0 : 1,
  ]
  const placeOfB = place(b)
  const difference = place(a)
    .map((value, index) => value - (placeOfB[index] ?? 0))
    .find((value) => value !== 0)
  return (
    difference ?? (a.sourceAsPrinted < b.sourceAsPrinted ? -1 : a.sourceAsPrinted > b.sourceAsPrinted ? 1 : 0)
  )
}

/**
 * A dataset's records of one species as one line per study, with their spread in °C: what a page shows first, the records
 * being opened on demand. The mean is over the records that give one, weighted by nothing, because a study's rows differ in
 * population and treatment rather than in worth; the spread runs from the lowest to the highest number any record gives.
 * Records without any number are left out. Sorted by quantity, share of deaths, life stage, level and printed source.
 */
export function summariseStudies(records: readonly PhysiologyRecord[]): StudyLine[] {
  const studies = new Map<string, PhysiologyRecord[]>()
  for (const record of records) {
    const key = toStudyKey(record)
    const study = studies.get(key)
    if (study === undefined) studies.set(key, [record])
    else study.push(record)
  }
  return [...studies.values()]
    .map(toStudyLine)
    .filter((line) => line !== null)
    .sort(compareLines)
}
