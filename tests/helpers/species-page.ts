import { createHash } from 'node:crypto'
import type { EvidenceRow, Statement } from '../../shared/evidence.js'
import type { NameRow } from '../../shared/names.js'
import type { StudyLine } from '../../shared/physiology.js'
import type { RangeRow } from '../../shared/ranges.js'
import type { RevisionMark } from '../../shared/revisions.js'
import type { SourceBrief } from '../../shared/sources.js'
import type { CitedRange, SpeciesPage } from '../../shared/species.js'

/** A UUID that is the same for the same words, so that failures can be read and runs compared. */
export function toId(words: string): string {
  const hex = createHash('sha256').update(words).digest('hex')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-4${hex.slice(13, 16)}-8${hex.slice(17, 20)}-${hex.slice(20, 32)}`
}

/** An invented source. */
export function makeSource(key: string, over: Partial<SourceBrief> = {}): SourceBrief {
  return {
    id: toId(`source ${key}`),
    kind: 'article',
    doi: null,
    csl: {
      type: 'article-journal',
      title: `Invented observations: ${key}`,
      author: [
        { family: 'Brack', given: 'O.' },
        { family: 'Sedge', given: 'T.' },
      ],
      issued: { 'date-parts': [[2019]] },
      'container-title': 'Annals of an Invented Place',
      volume: '4',
      page: '11-19',
    },
    asPrinted: null,
    isInvented: true,
    ...over,
  }
}

/** One statement as an interval, or of the form asked for. */
export function makeEvidence(
  sourceKey: string,
  low: number | null,
  high: number | null,
  over: Partial<EvidenceRow> = {},
): { itemId: string; row: EvidenceRow } {
  const statement: Statement = low === null ? 'at-most' : high === null ? 'at-least' : 'interval'
  return {
    itemId: toId(`evidence ${sourceKey} ${low} ${high}`),
    row: {
      sourceId: toId(`source ${sourceKey}`),
      kind: 'guideline',
      locator: 'table 2',
      statement,
      printed: {
        low: low === null ? null : String(low),
        high: high === null ? null : String(high),
        mean: null,
        sd: null,
        unit: 'degC',
      },
      low,
      high,
      mean: null,
      sd: null,
      n: null,
      note: null,
      ...over,
    },
  }
}

/** One range of an adult by day at the basking surface, or what `row` says instead. */
export function makeRange(row: Partial<RangeRow>, evidence: CitedRange['evidence'] = []): CitedRange {
  const whole: RangeRow = {
    parameter: 'temperature',
    position: 'basking-surface',
    period: 'day',
    season: 'active',
    lifeStage: 'adult',
    low: 40,
    high: 46,
    lowerLimit: null,
    upperLimit: null,
    typedUnit: 'degC',
    typed: null,
    uvMeaning: null,
    uvZone: null,
    note: null,
    ...row,
  }
  const keys = [whole.parameter, whole.position, whole.period, whole.season, whole.lifeStage, whole.uvMeaning]
  return { itemId: toId(`range ${keys.join(' ')}`), row: whole, evidence }
}

/** A mark of the revision line. */
export function makeMark(number: number, over: Partial<RevisionMark> = {}): RevisionMark {
  return {
    id: toId(`revision ${number}`),
    number,
    publishedAt: `2026-0${number}-14T09:00:00.000Z`,
    summary:
      number === 1 ? 'First version of the page' : 'Basking surface raised, two invented studies added',
    broughtBy: { form: 'demonstration' },
    ...over,
  }
}

function makeName(row: Partial<NameRow> & Pick<NameRow, 'kind' | 'name'>) {
  const whole: NameRow = {
    authority: null,
    status: row.kind === 'scientific' ? 'accepted' : null,
    language: row.kind === 'common' ? 'en' : null,
    provenance: 'the demonstration',
    ...row,
  }
  return { itemId: toId(`name ${row.name}`), row: whole }
}

function makeLine(over: Partial<StudyLine>): StudyLine {
  return {
    quantity: 'critical-thermal-maximum',
    lethalPercent: null,
    lifeStage: 'adult',
    sourceId: toId('source runs'),
    sourceAsPrinted: 'Brack & Sedge 2019',
    level: 'study',
    records: 4,
    animals: 40,
    meanC: 41.25,
    lowC: 40.1,
    highC: 42.3,
    isIndependent: true,
    ...over,
  }
}

/** An invented desert basker with ranges, evidence that disagrees, physiology, prose and two revisions. */
export function makeSpeciesPage(over: Partial<SpeciesPage> = {}): SpeciesPage {
  const sources = ['runs', 'keepers', 'guide', 'field'].map((key) => makeSource(key))
  return {
    species: {
      id: toId('species'),
      slug: 'fabulacerta-cinnabarina',
      scientificName: 'Fabulacerta cinnabarina',
      isInvented: true,
    },
    revision: makeMark(2),
    currentRevisionNumber: 2,
    names: [
      makeName({ kind: 'scientific', name: 'Fabulacerta cinnabarina', authority: 'Brack, 2019' }),
      makeName({ kind: 'synonym', name: 'Lacerta cinnabarina', authority: 'Sedge, 1988' }),
      makeName({ kind: 'common', name: 'Cinnabar fable lizard' }),
      makeName({ kind: 'common', name: 'سحلية الزنجفر', language: 'ar', provenance: 'from memory' }),
    ],
    classification: {
      itemId: toId('classification'),
      row: {
        class: 'Reptilia',
        order: 'Squamata',
        suborder: 'Sauria',
        family: 'Lacertidae',
        conservation: null,
        activeTime: 'Diurnal',
        microhabitat: 'Terrestrial/Saxicolous',
        region: 'An invented place',
        provenance: 'the demonstration',
      },
    },
    ranges: [
      makeRange({ upperLimit: 54, note: 'Measured on slate.' }, [
        makeEvidence('guide', 38, 44),
        makeEvidence('field', 41, 47, { kind: 'field-site', n: 23 }),
        makeEvidence('keepers', 40, 46, { kind: 'keepers-report', locator: null }),
        makeEvidence('runs', null, null, {
          kind: 'selected-in-gradient',
          statement: 'mean-sd',
          mean: 37.4,
          sd: 1.2,
          n: 18,
          printed: { low: null, high: null, mean: '37.4', sd: '1.2', unit: 'degC' },
        }),
      ]),
      makeRange({ lifeStage: 'juvenile', low: 37, high: 41, upperLimit: 50 }, [
        makeEvidence('guide', 36, 41),
      ]),
      makeRange({ position: 'warm-end-air', low: 31, high: 34, upperLimit: 40 }, [
        makeEvidence('guide', 30, 34),
        makeEvidence('field', 31, 35, { kind: 'field-site' }),
      ]),
      makeRange({ position: 'cool-end-air', low: 22, high: 26, lowerLimit: 12, upperLimit: 36 }, [
        makeEvidence('guide', 21, 25),
        makeEvidence('field', 22, 27, { kind: 'field-site' }),
      ]),
      makeRange({ position: 'cool-end-air', period: 'night', low: 16, high: 20, lowerLimit: 8 }, [
        makeEvidence('guide', 15, 20),
      ]),
      makeRange(
        { position: 'cool-hide', period: 'any', lifeStage: 'any', season: 'any', low: null, high: 25 },
        [makeEvidence('keepers', null, 25, { kind: 'keepers-report' })],
      ),
      makeRange({ position: 'warm-end-air', season: 'brumation', period: 'any', low: 8, high: 12 }, []),
      makeRange(
        {
          parameter: 'relative-humidity',
          position: 'humid-hide',
          period: 'any',
          lifeStage: 'any',
          low: 70,
          high: 85,
          typedUnit: 'percentRh',
        },
        [
          makeEvidence('guide', 65, 80, {
            printed: { low: '65', high: '80', mean: null, sd: null, unit: 'percentRh' },
          }),
          makeEvidence('keepers', 70, 90, {
            kind: 'keepers-report',
            printed: { low: '70', high: '90', mean: null, sd: null, unit: 'percentRh' },
          }),
        ],
      ),
      makeRange(
        {
          parameter: 'uv-index',
          position: 'basking-air',
          low: 3,
          high: 5,
          upperLimit: 8,
          typedUnit: 'uvi',
          uvMeaning: 'typical',
          uvZone: 3,
        },
        [
          makeEvidence('field', 2.6, 5.2, {
            kind: 'field-site',
            printed: { low: '2.6', high: '5.2', mean: null, sd: null, unit: 'uvi' },
          }),
        ],
      ),
      makeRange(
        {
          parameter: 'photoperiod',
          position: 'whole-enclosure',
          period: 'any',
          low: 12,
          high: 14,
          typedUnit: 'h',
        },
        [
          makeEvidence('guide', 12, 14, {
            printed: { low: '12', high: '14', mean: null, sd: null, unit: 'h' },
          }),
        ],
      ),
    ],
    physiology: [
      {
        itemId: toId('body cited'),
        row: {
          form: 'cited',
          quantity: 'selected-body-temperature',
          lifeStage: 'adult',
          sourceId: toId('source runs'),
          locator: 'p. 14',
          printed: { low: null, high: null, mean: '37.4', sd: '1.2', unit: 'degC' },
          meanC: 37.4,
          lowC: null,
          highC: null,
          sdC: 1.2,
          n: 18,
          note: null,
        },
        dataset: null,
        studies: [],
      },
      {
        itemId: toId('body dataset'),
        row: { form: 'dataset', datasetId: 'invented', recordSetHash: '0'.repeat(64) },
        dataset: {
          id: 'invented',
          title: 'Invented dataset of limits',
          version: '1',
          doi: null,
          licence: 'CC BY 4.0',
          licenceUrl: 'https://creativecommons.org/licenses/by/4.0/',
          attribution: 'Brack and Sedge, 2019.',
        },
        studies: [
          makeLine({}),
          makeLine({
            sourceId: toId('source field'),
            meanC: 42.6,
            lowC: 42.6,
            highC: 42.6,
            records: 1,
            animals: 6,
          }),
          makeLine({
            sourceId: null,
            sourceAsPrinted: 'Nobody 1970',
            isIndependent: false,
            lifeStage: 'unspecified',
            animals: null,
            records: 1,
          }),
          makeLine({ quantity: 'critical-thermal-minimum', meanC: 7.8, lowC: 6.9, highC: 9.1 }),
          makeLine({
            quantity: 'field-body-temperature',
            level: 'summary',
            isIndependent: false,
            meanC: null,
            lowC: 33.1,
            highC: 36.8,
            records: 1,
          }),
        ],
      },
    ],
    prose: [
      {
        itemId: toId('prose'),
        row: {
          heading: 'Living on warm stone',
          markdown: `It basks on *slate* from the first hour [@${toId('source field')}, p. 3].\n\n- flat stones under the lamp\n- a cool side that stays cool\n`,
        },
      },
    ],
    images: [],
    sources: Object.fromEntries(sources.map((source) => [source.id, source])),
    history: [makeMark(2), makeMark(1)],
    ...over,
  }
}
