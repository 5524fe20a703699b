import { describe, expect, it } from 'vitest'
import { parseReading } from '../../../shared/checker/parse-reading.js'
import type { Reading } from '../../../shared/checker/reading.js'
import {
  arrangeRows,
  prepareForms,
  toForm,
  toPlaceKey,
  toRow,
  type FormRow,
} from '../../../src/composables/check-rows.js'
import { makeSpeciesPage } from '../../helpers/species-page.js'

const { ranges } = makeSpeciesPage()
const ADULT = { lifeStage: 'adult', season: 'active' } as const

function listPlaces(forms: readonly { period: string; position: string; parameter: string }[]): string[] {
  return forms.map(({ period, position, parameter }) => `${period} ${position} ${parameter}`)
}

function typed(row: FormRow, text: string): FormRow {
  return { ...row, form: { ...row.form, values: [text] } }
}

function counter(): () => string {
  let count = 0
  return () => `n${(count += 1)}`
}

describe('the places that stand ready', () => {
  it('are those the page has a range for, lights on before lights off', () => {
    expect(listPlaces(prepareForms(ranges, ADULT, 'degC'))).toEqual([
      'day basking-surface temperature',
      'day warm-end-air temperature',
      'day cool-end-air temperature',
      'day cool-hide temperature',
      'day humid-hide relative-humidity',
      'day basking-air uv-index',
      'day whole-enclosure photoperiod',
      'night cool-end-air temperature',
      'night cool-hide temperature',
      'night humid-hide relative-humidity',
    ])
  })

  it('are fewer for a stage the page says little of', () => {
    expect(listPlaces(prepareForms(ranges, { lifeStage: 'juvenile', season: 'active' }, 'degC'))).toEqual([
      'day basking-surface temperature',
      'day cool-hide temperature',
      'day humid-hide relative-humidity',
      'night cool-hide temperature',
      'night humid-hide relative-humidity',
    ])
  })

  it('start in the reader’s unit and with the usual instrument of the place', () => {
    const [surface, air] = prepareForms(ranges, ADULT, 'degF')
    expect(surface).toMatchObject({ unit: 'degF', instrument: 'infrared-thermometer', values: [''] })
    expect(air).toMatchObject({ unit: 'degF', instrument: 'probe-thermometer' })
  })
})

describe('arranging rows for another question', () => {
  const adult = prepareForms(ranges, ADULT, 'degC')
  const juvenile = prepareForms(ranges, { lifeStage: 'juvenile', season: 'active' }, 'degC')

  it('keeps what was typed where the new question has no row for it', () => {
    const rows = arrangeRows([], adult, counter()).map((row) =>
      row.form.position === 'warm-end-air' ? typed(row, '33') : row,
    )
    const arranged = arrangeRows(rows, juvenile, counter())
    const kept = arranged.filter((row) => row.form.values[0] === '33')
    expect(kept).toHaveLength(1)
    expect(kept[0]).toMatchObject({ isPrepared: false, form: { position: 'warm-end-air' } })
    expect(arranged.filter((row) => row.isPrepared)).toHaveLength(juvenile.length)
  })

  it('lets a reading take the place that stands ready for it, and a second one stand beside', () => {
    const reading = { ...adult[0]!, values: ['45'] }
    const rows = [toRow(reading, 'a', false), toRow({ ...reading, values: ['47'] }, 'b', false)]
    const arranged = arrangeRows(rows, adult, counter())
    expect(arranged).toHaveLength(adult.length + 1)
    expect(arranged[0]).toMatchObject({ id: 'a', isPrepared: true })
    expect(arranged.at(-1)).toMatchObject({ id: 'b', isPrepared: false })
  })

  it('keeps an empty place the person has added', () => {
    const own = toRow({ ...adult[0]!, position: 'water' }, 'own', false)
    expect(arrangeRows([own], adult, counter()).at(-1)).toMatchObject({ id: 'own', isPrepared: false })
  })
})

describe('a reading as a form', () => {
  it('reads back to the same reading, with accuracy, repeats and surface', () => {
    const reading: Reading = {
      parameter: 'temperature',
      position: 'basking-surface',
      period: 'day',
      values: [112.4, 111],
      unit: 'degF',
      instrument: 'infrared-thermometer',
      accuracy: { form: 'expanded', absolute: 1.8, relativePercent: 2, combine: 'sum' },
      resolution: 0.1,
      uvMeaning: null,
      surface: { material: 'slate', emissivity: 0.97, emissivitySet: 0.95, surroundings: 75 },
    }
    expect(parseReading(toForm(reading))).toEqual({ ok: true, reading, questions: [] })
  })

  it('is told apart from another at its place by what is measured, when, and what a UV index means', () => {
    const form = prepareForms(ranges, ADULT, 'degC')[0]!
    const keys = [
      form,
      { ...form, period: 'night' },
      { ...form, parameter: 'uv-index', uvMeaning: 'typical' },
      { ...form, parameter: 'uv-index', uvMeaning: 'maximum' },
    ].map(toPlaceKey)
    expect(new Set(keys).size).toBe(4)
  })
})
