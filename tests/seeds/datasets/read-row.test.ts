import { describe, expect, it } from 'vitest'
import { amphitherm } from '../../../seeds/datasets/amphitherm.js'
import { recordRowSchema, type RecordRow } from '../../../seeds/datasets/columns.js'
import { eu2007 } from '../../../seeds/datasets/eu2007.js'
import { globtherm } from '../../../seeds/datasets/globtherm.js'
import { repttraits } from '../../../seeds/datasets/repttraits.js'
import { squambase } from '../../../seeds/datasets/squambase.js'
import { makeAmphithermRow, toCells, type CsvRow } from '../../helpers/dataset-files.js'

const rowOf = (part: CsvRow): RecordRow => recordRowSchema.parse(toCells(makeAmphithermRow(1, part)))

describe('a row of measurements', () => {
  it('becomes one record with its spread, its number of animals and its facts in words', () => {
    const reading = amphitherm.readRow(
      rowOf({
        note: 'sd=0.5; endpoint=LRR; acclimation_temp_C=23; acclimation_days=20; ramp_C_per_min=1; lat=-20.7; ref_key=X_2019',
        source_doi: '10.1016/j.test.2019.03.010',
      }),
    )
    expect(reading).toEqual({
      form: 'record',
      citation: {
        form: 'reference',
        asPrinted: 'Tester, A.; Prober, B. (2001) A test of 1 frogs. Journal of Tests 1(1) pp. 1-9',
        doi: '10.1016/j.test.2019.03.010',
      },
      record: {
        recordId: 'amphitherm:1',
        nameAsPrinted: 'Hyla cinerea',
        quantity: 'critical-thermal-maximum',
        lethalPercent: null,
        lifeStage: 'adult',
        meanC: 40.1,
        lowC: null,
        highC: null,
        sdC: 0.5,
        seC: null,
        n: 12,
        level: 'study',
        facts: {
          endpoint: 'LRR',
          'acclimation temperature (°C)': '23',
          'acclimation time (days)': '20',
          'rate of change (°C/min)': '1',
          'latitude (°)': '-20.7',
        },
      },
    })
  })

  it.each([
    ['lt50_cold', 'lethal-minimum', 50, '-3.4'],
    ['lt50_hot', 'lethal-maximum', 50, '38'],
    ['lt100_cold', 'lethal-minimum', 100, '-9'],
    ['lt100_hot', 'lethal-maximum', 100, '44'],
    ['supercooling_point', 'supercooling-point', null, '-5.4'],
    ['ctmin', 'critical-thermal-minimum', null, '5'],
  ])('says of %s that it is the %s', (parameter, quantity, lethalPercent, value) => {
    expect(globtherm.readRow(rowOf({ parameter, value }))).toMatchObject({
      form: 'record',
      record: { quantity, lethalPercent },
    })
  })

  it('leaves a blank life stage unspecified, never any', () => {
    expect(globtherm.readRow(rowOf({ life_stage: '' }))).toMatchObject({
      record: { lifeStage: 'unspecified' },
    })
  })

  it('takes "F" of GlobTherm for an animal fresh from the field and a number for °C', () => {
    const facts = (note: string) => globtherm.readRow(rowOf({ note }))
    expect(facts('metric=ctmax; acclimation_temp_C_or_F=F')).toMatchObject({
      record: { facts: { acclimation: 'fresh from the field' } },
    })
    expect(facts('metric=ctmax; acclimation_temp_C_or_F=21.5')).toMatchObject({
      record: { facts: { 'acclimation temperature (°C)': '21.5' } },
    })
  })

  it.each([
    ['a value in °F', { value: '104' }, '104 °C is not plausible for this quantity (10 to 65 °C).'],
    ['no value', { value: '' }, 'The row gives no value.'],
    [
      'a mean below the lowest',
      { value: '20', min: '21' },
      'The mean 20 °C is below the lowest value 21 °C.',
    ],
    [
      'a mean above the highest',
      { value: '30', max: '29' },
      'The mean 30 °C is above the highest value 29 °C.',
    ],
    [
      'ends that are swapped',
      { value: '', min: '30', max: '20' },
      'The lowest value 30 °C is above the highest 20 °C.',
    ],
    [
      'a fraction of an animal',
      { n: '34.519' },
      'The number of animals, 34.519, is not a whole number above 0.',
    ],
    ['no animal', { n: '0' }, 'The number of animals, 0, is not a whole number above 0.'],
  ])('is rejected with its reason for %s', (_, part, reason) => {
    expect(amphitherm.readRow(rowOf(part))).toEqual({ form: 'rejected', reason })
  })

  it('stands without the DOI of another work', () => {
    const reading = amphitherm.readRow(
      rowOf({ note: 'ref_key=Burke_1976', source_doi: '10.1016/j.jtherbio.2020.102744' }),
    )
    expect(reading).toMatchObject({ citation: { doi: null } })
  })
})

describe('a summary over several studies', () => {
  it('rests on its compiler, who said it', () => {
    const row = rowOf({
      parameter: 'tb_field',
      value: '',
      min: '24',
      max: '31',
      note: 'level=species_summary',
    })
    const summary = {
      form: 'record',
      citation: { form: 'own', asPrinted: row.source_citation },
      record: { level: 'summary', meanC: null, lowC: 24, highC: 31 },
    }
    expect(repttraits.readRow(row)).toMatchObject(summary)
    expect(squambase.readRow(row)).toMatchObject(summary)
  })

  it('is all that SquamBase gives: values read by a script are left out', () => {
    expect(
      squambase.readRow(
        rowOf({ note: "level=single_source; parsed by script from the compiler's free-text source field" }),
      ),
    ).toEqual({ form: 'left-out', reason: 'read by a script out of free text' })
  })
})

describe('a row of the housing recommendation', () => {
  const euRow = (part: CsvRow) =>
    rowOf({
      scientific_name: 'Thamnophis sirtalis',
      class: 'Reptilia',
      value: '',
      n: '',
      note: 'level=published_housing_recommendation (laboratory housing); table J.1; how_obtained=read today',
      source_citation: 'Commission Recommendation 2007/526/EC, p. 82 (read in the Polish-language text)',
      ...part,
    })

  it('becomes a range of the whole enclosure, recommended by a guideline, with page, table and printed numbers', () => {
    const reading = eu2007.readRow(
      euRow({ parameter: 'ambient_temperature_recommended', min: '22', max: '27', unit: 'degC' }),
    )
    expect(reading).toEqual({
      form: 'range',
      citation: {
        form: 'own',
        asPrinted: 'Commission Recommendation 2007/526/EC, p. 82 (read in the Polish-language text)',
      },
      range: {
        parameter: 'temperature',
        position: 'whole-enclosure',
        period: 'any',
        season: 'any',
        lifeStage: 'adult',
        low: 22,
        high: 27,
        lowerLimit: null,
        upperLimit: null,
        typedUnit: 'degC',
        typed: null,
        uvMeaning: null,
        uvZone: null,
        note: null,
      },
      evidence: {
        kind: 'guideline',
        locator: 'p. 82, table J.1',
        statement: 'interval',
        printed: { low: '22', high: '27', mean: null, sd: null, unit: 'degC' },
        low: 22,
        high: 27,
        mean: null,
        sd: null,
        n: null,
        note: 'Laboratory housing; read in the Polish-language text.',
      },
    })
  })

  it('keeps relative humidity in per cent at the whole enclosure', () => {
    expect(
      eu2007.readRow(
        euRow({ parameter: 'relative_humidity_recommended', min: '60', max: '80', unit: '%RH' }),
      ),
    ).toMatchObject({
      range: { parameter: 'relative-humidity', position: 'whole-enclosure', low: 60, high: 80 },
      evidence: { printed: { low: '60', high: '80', unit: 'percentRh' } },
    })
  })

  it('makes a one-sided range of the water of a limit that has one side', () => {
    expect(
      eu2007.readRow(
        euRow({
          parameter: 'water_temperature_recommended',
          max: '25',
          unit: 'degC',
          note: 'level=published_housing_recommendation (laboratory housing); general limit stated for aquatic reptiles: keep water below 25 degC; how_obtained=read today',
        }),
      ),
    ).toMatchObject({
      range: { position: 'water', low: null, high: 25 },
      evidence: {
        statement: 'at-most',
        locator: 'p. 82',
        low: null,
        high: 25,
        printed: { low: null, high: '25' },
      },
    })
  })

  // Read in the Official Journal, L 197 of 30.7.2007, tables I.1 and J.1: the last column is "main period of activity".
  it('takes the period of activity for the animal’s and lets the temperature hold by day and by night', () => {
    expect(
      eu2007.readRow(
        euRow({
          parameter: 'ambient_temperature_recommended',
          min: '23',
          max: '27',
          unit: 'degC',
          note: 'level=published_housing_recommendation (laboratory housing); table I.1; activity period night; how_obtained=read today',
        }),
      ),
    ).toMatchObject({
      range: { period: 'any', note: 'The table gives night as the animal’s main period of activity.' },
    })
  })

  it('is left out when it was written down from memory', () => {
    expect(
      eu2007.readRow(
        euRow({
          parameter: 'water_temperature_recommended',
          min: '18',
          max: '22',
          unit: 'degC',
          note: 'level=published_housing_recommendation (laboratory housing); table I.1; how_obtained=from memory, unconfirmed',
        }),
      ),
    ).toEqual({ form: 'left-out', reason: 'from memory, not read in the text' })
  })
})
