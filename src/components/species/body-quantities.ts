import { toShortCitation } from '../../../shared/citation.js'
import type { Quantity, StudyLine } from '../../../shared/physiology.js'
import type { RecordLifeStage } from '../../../shared/ranges.js'
import type { SpeciesPage } from '../../../shared/species.js'

/** One study's line about the animal's body, °C. */
export interface BodyLine {
  key: string
  itemId: string
  name: string
  sourceId: string | null
  number: number | null
  /** Title of the dataset that holds the records; null for a statement cited on the page itself. */
  dataset: string | null
  locator: string | null
  lifeStage: RecordLifeStage
  level: StudyLine['level']
  isIndependent: boolean
  records: number
  animals: number | null
  meanC: number | null
  lowC: number | null
  highC: number | null
  sdC: number | null
  /** What asks the API for the records of this line; null where there are none to open. */
  recordSource: string | null
}

/** Everything a page knows of one quantity. */
export interface BodyQuantity {
  key: string
  quantity: Quantity
  lethalPercent: StudyLine['lethalPercent']
  lines: BodyLine[]
  /** Independent studies: each source once, compilers' summaries and unresolved keys not counted. */
  studies: number
  summaries: number
  records: number
  /** The span of what the lines give as their mean, or as their ends where they give no mean; °C. */
  lowC: number
  highC: number
  datasets: string[]
}

const QUANTITIES: readonly Quantity[] = [
  'selected-body-temperature',
  'field-body-temperature',
  'optimum-temperature',
  'critical-thermal-minimum',
  'critical-thermal-maximum',
  'lethal-minimum',
  'lethal-maximum',
  'supercooling-point',
]

type PhysiologyItem = SpeciesPage['physiology'][number]
type KeyedLine = BodyLine & Pick<BodyQuantity, 'quantity' | 'lethalPercent'>

function linesOf(
  item: PhysiologyItem,
  sources: SpeciesPage['sources'],
  numbers: ReadonlyMap<string, number>,
): KeyedLine[] {
  const { row, itemId, dataset, studies } = item
  if (row.form === 'cited') {
    const source = sources[row.sourceId]
    return [
      {
        key: itemId,
        itemId,
        quantity: row.quantity,
        lethalPercent: null,
        name: source === undefined ? 'Source not on this page' : toShortCitation(source),
        sourceId: row.sourceId,
        number: numbers.get(row.sourceId) ?? null,
        dataset: null,
        locator: row.locator,
        lifeStage: row.lifeStage,
        level: 'study',
        isIndependent: true,
        records: 1,
        animals: row.n,
        meanC: row.meanC,
        lowC: row.lowC,
        highC: row.highC,
        sdC: row.sdC,
        recordSource: null,
      },
    ]
  }
  return studies.map((line, index) => {
    const source = line.sourceId === null ? undefined : sources[line.sourceId]
    return {
      key: `${itemId}-${index}`,
      itemId,
      quantity: line.quantity,
      lethalPercent: line.lethalPercent,
      name: source === undefined ? line.sourceAsPrinted : toShortCitation(source),
      sourceId: line.sourceId,
      number: line.sourceId === null ? null : (numbers.get(line.sourceId) ?? null),
      dataset: dataset?.title ?? row.datasetId,
      locator: null,
      lifeStage: line.lifeStage,
      level: line.level,
      isIndependent: line.isIndependent,
      records: line.records,
      animals: line.animals,
      meanC: line.meanC,
      lowC: line.lowC,
      highC: line.highC,
      sdC: null,
      recordSource: line.sourceId ?? line.sourceAsPrinted,
    }
  })
}

/** The middle a line is sorted and drawn by, °C. */
export function middleOf(line: Pick<BodyLine, 'meanC' | 'lowC' | 'highC'>): number {
  return line.meanC ?? ((line.lowC ?? line.highC ?? 0) + (line.highC ?? line.lowC ?? 0)) / 2
}

function hasNumber(line: BodyLine): boolean {
  return line.meanC !== null || line.lowC !== null || line.highC !== null
}

/** What is known of the animal's body, by quantity, lines sorted from cool to warm. */
export function listBodyQuantities(
  page: Pick<SpeciesPage, 'physiology' | 'sources'>,
  numbers: ReadonlyMap<string, number>,
): BodyQuantity[] {
  const groups = new Map<string, KeyedLine[]>()
  for (const line of page.physiology.flatMap((item) => linesOf(item, page.sources, numbers))) {
    if (!hasNumber(line)) continue
    const key = line.lethalPercent === null ? line.quantity : `${line.quantity}-${line.lethalPercent}`
    const group = groups.get(key)
    if (group === undefined) groups.set(key, [line])
    else group.push(line)
  }
  return [...groups]
    .map(([key, lines]) => {
      const sorted = [...lines].sort((a, b) => middleOf(a) - middleOf(b))
      const [first] = lines
      const ends = lines.flatMap((line) =>
        line.meanC === null ? [line.lowC, line.highC].filter((end) => end !== null) : [line.meanC],
      )
      const independent = new Set(
        lines.flatMap(({ isIndependent, sourceId }) =>
          isIndependent && sourceId !== null ? [sourceId] : [],
        ),
      )
      return {
        key,
        quantity: first?.quantity ?? 'field-body-temperature',
        lethalPercent: first?.lethalPercent ?? null,
        lines: sorted,
        studies: independent.size,
        summaries: lines.filter(({ level }) => level === 'summary').length,
        records: lines.reduce((sum, { records }) => sum + records, 0),
        lowC: Math.min(...ends),
        highC: Math.max(...ends),
        datasets: [...new Set(lines.flatMap(({ dataset }) => (dataset === null ? [] : [dataset])))],
      }
    })
    .sort(
      (a, b) =>
        QUANTITIES.indexOf(a.quantity) - QUANTITIES.indexOf(b.quantity) ||
        (a.lethalPercent ?? 0) - (b.lethalPercent ?? 0),
    )
}
