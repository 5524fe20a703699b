import { describe, expect, it } from 'vitest'
import { parseNumber } from '../../../shared/checker/parse-number.js'
import { parseReading } from '../../../shared/checker/parse-reading.js'
import type { ReadingForm } from '../../../shared/checker/parse-reading.js'

function makeForm(part: Partial<ReadingForm>): ReadingForm {
  return {
    parameter: 'temperature',
    position: 'warm-end-air',
    period: 'day',
    values: ['30'],
    unit: 'degC',
    instrument: 'probe-thermometer',
    accuracyForm: 'limit',
    accuracyAbsolute: '',
    accuracyRelativePercent: '',
    accuracyCombine: 'larger',
    resolution: '',
    uvMeaning: '',
    surface: null,
    ...part,
  }
}

const humidity = { parameter: 'relative-humidity', unit: 'percentRh', instrument: 'capacitive-hygrometer' }
const uv = { parameter: 'uv-index', unit: 'uvi', instrument: 'uv-index-meter', uvMeaning: 'typical' }

function pathsOf(form: Partial<ReadingForm>): string[] {
  const parsed = parseReading(makeForm(form))
  return parsed.ok ? [] : parsed.errors.map(({ path }) => path)
}

function questionsOf(form: Partial<ReadingForm>) {
  const parsed = parseReading(makeForm(form))
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.errors))
  return parsed.questions
}

describe('a typed number', () => {
  it.each([
    ['38.5', 38.5],
    ['38,5', 38.5],
    [' 38 ', 38],
    ['-2', -2],
    ['−2', -2],
    ['+4', 4],
    ['.5', 0.5],
    ['5.', 5],
    ['0', 0],
  ])('%j is read as %d', (text, value) => {
    expect(parseNumber(text)).toEqual({ form: 'number', value })
  })

  it.each(['', '   ', '\t'])('%j is missing, never zero', (text) => {
    expect(parseNumber(text)).toEqual({ form: 'missing' })
  })

  it.each([
    'abc',
    '38 C',
    '1e3',
    '0x10',
    '1,234.5',
    '1.234,5',
    '1 234',
    '--3',
    '.',
    '-',
    'Infinity',
    'NaN',
    '9'.repeat(31),
  ])('%j is not a number', (text) => {
    expect(parseNumber(text)).toEqual({ form: 'not-a-number' })
  })
})

describe('a reading from a form', () => {
  it('keeps the numbers and the unit as typed', () => {
    const parsed = parseReading(makeForm({ values: ['95,5', '', '96'], unit: 'degF', resolution: '0,1' }))
    expect(parsed).toMatchObject({
      ok: true,
      reading: { values: [95.5, 96], unit: 'degF', accuracy: null, resolution: 0.1 },
      questions: [],
    })
  })

  it('leaves an accuracy unstated that nobody typed, and reads one that somebody did', () => {
    const stated = parseReading(
      makeForm({ accuracyForm: 'expanded', accuracyRelativePercent: '2', accuracyCombine: 'sum' }),
    )
    expect(stated).toMatchObject({
      ok: true,
      reading: { accuracy: { form: 'expanded', absolute: null, relativePercent: 2, combine: 'sum' } },
    })
  })

  it.each([
    ['nothing typed', { values: ['', ' '] }, ['values.0']],
    ['no field at all', { values: [] }, ['values.0']],
    ['a word', { values: ['30', 'warm'] }, ['values.1']],
    ['absolute zero undercut in °C', { values: ['-273.2'] }, ['values.0']],
    ['absolute zero undercut in °F', { values: ['-459.7'], unit: 'degF' }, ['values.0']],
    ['RH over 100', { ...humidity, values: ['100.1'] }, ['values.0']],
    ['RH below 0', { ...humidity, values: ['-1'] }, ['values.0']],
    ['a UV index below 0', { ...uv, values: ['-0.1'] }, ['values.0']],
    ['a wrong second repeat behind an empty one', { ...humidity, values: ['', '50', '101'] }, ['values.2']],
    ['a UV index without its meaning', { ...uv, uvMeaning: '' }, ['uvMeaning']],
    ['°F for humidity', { ...humidity, unit: 'degF' }, ['unit']],
    ['a hygrometer for temperature', { instrument: 'capacitive-hygrometer' }, ['instrument']],
    ['an accuracy of zero', { accuracyAbsolute: '0' }, ['accuracy.absolute']],
    ['an accuracy in words', { accuracyAbsolute: 'good' }, ['accuracy.absolute']],
    ['a step of zero', { resolution: '0' }, ['resolution']],
    ['no parameter chosen', { parameter: '' }, ['parameter']],
    ['a parameter nobody offers', { parameter: 'noise' }, ['parameter']],
    ['21 repeats', { values: Array.from({ length: 21 }, () => '30') }, ['values']],
  ])('refuses %s at its field', (_, form, paths) => {
    expect(pathsOf(form)).toEqual(paths)
  })

  it.each([
    ['absolute zero itself', { values: ['-273.15'] }],
    ['absolute zero in °F', { values: ['-459.67'], unit: 'degF' }],
    ['RH 0', { ...humidity, values: ['0'] }],
    ['RH 100', { ...humidity, values: ['100'] }],
    ['UV index 0', { ...uv, values: ['0'] }],
  ])('takes %s', (_, form) => {
    expect(pathsOf(form)).toEqual([])
  })

  it.each(['zone 3', 'Zone 2', 'z4', 'UV zone 1'])('explains that %j is a zone and not an index', (text) => {
    const parsed = parseReading(makeForm({ ...uv, values: [text] }))
    expect(parsed).toEqual({
      ok: false,
      errors: [{ path: 'values.0', message: expect.stringMatching(/zone is a class of animals.*UV index/) }],
    })
  })

  it('wants every number of a named surface', () => {
    const infrared = { instrument: 'infrared-thermometer', position: 'basking-surface' }
    const surface = { material: 'slate', emissivity: '0.97', emissivitySet: '', surroundings: '25' }
    expect(pathsOf({ ...infrared, surface })).toEqual(['surface.emissivitySet'])
    expect(pathsOf({ ...infrared, surface: { ...surface, emissivitySet: '0,95' } })).toEqual([])
    expect(pathsOf({ ...infrared, surface: { ...surface, emissivitySet: '0' } })).toEqual([
      'surface.emissivitySet',
    ])
    const inAir = { ...surface, emissivitySet: '0.95' }
    expect(pathsOf({ surface: inAir })).toEqual(['surface'])
  })

  it('refuses a surface that no temperature could explain', () => {
    const surface = { material: '', emissivity: '0.1', emissivitySet: '1', surroundings: '900' }
    const infrared = { instrument: 'infrared-thermometer', position: 'basking-surface', values: ['0'] }
    expect(pathsOf({ ...infrared, surface })).toEqual(['surface.emissivity'])
  })
})

describe('asking back', () => {
  it.each([
    ['air at 60 °C', { values: ['60'] }, []],
    ['air at 60.1 °C', { values: ['60.1'] }, ['meant-fahrenheit']],
    ['a hide at 95 °C', { position: 'cool-hide', values: ['95'] }, ['meant-fahrenheit']],
    ['a basking surface at 65 °C', { position: 'basking-surface', values: ['65'] }, []],
    ['air at 95 °F', { values: ['95'], unit: 'degF' }, []],
    ['air at 150 °F', { values: ['150'], unit: 'degF' }, ['temperature-very-high']],
    ['a UV index of 15', { ...uv, values: ['15'] }, []],
    ['a UV index of 15.1', { ...uv, values: ['15.1'] }, ['uv-index-very-high']],
    [
      'an infrared reading of air',
      { instrument: 'infrared-thermometer' },
      ['instrument-does-not-fit-position'],
    ],
    [
      'an infrared reading of a surface',
      { instrument: 'infrared-thermometer', position: 'basking-surface' },
      [],
    ],
  ])('of %s asks %j', (_, form, questions) => {
    expect(questionsOf(form)).toEqual(questions)
  })
})
