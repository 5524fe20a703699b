import { describe, expect, test } from 'vitest'
import type { Parameter } from '../../../../shared/ranges.js'
import { listAnswers, listOtherRows } from '../../../../src/components/species/page-rows.js'
import { listTargets } from '../../../../src/components/species/page-targets.js'
import { makeRange, makeSpeciesPage } from '../../../helpers/species-page.js'

const { ranges } = makeSpeciesPage()
const adultByDay = { lifeStage: 'adult', season: 'active', period: 'day' } as const
const units = { temperature: 'degC', length: 'cm' } as const
const plain = (text: string) => text.replaceAll('\u00a0', ' ')

function rowsOf(parameter: Parameter, choice: Parameters<typeof listAnswers>[1] = adultByDay) {
  return listAnswers(ranges, choice).find((answer) => answer.parameter === parameter)
}

describe('rows that answer the page’s question', () => {
  test('are those of the stage, season and period, from the lamp to the cool end', () => {
    expect(rowsOf('temperature')?.rows.map(({ range }) => [range.row.position, range.row.low])).toEqual([
      ['basking-surface', 40],
      ['warm-end-air', 31],
      ['cool-end-air', 22],
      ['cool-hide', null],
    ])
  })

  test('change with the stage, and a place without a row for it says so', () => {
    const juvenile = rowsOf('temperature', { ...adultByDay, lifeStage: 'juvenile' })
    expect(juvenile?.rows.map(({ range }) => [range.row.position, range.row.low])).toEqual([
      ['basking-surface', 37],
      ['cool-hide', null],
    ])
    expect(juvenile?.unanswered.map(({ position }) => position)).toEqual(['warm-end-air', 'cool-end-air'])
  })

  test('a row for any season does not answer for brumation', () => {
    const cool = rowsOf('temperature', { ...adultByDay, season: 'brumation' })
    expect(cool?.rows.map(({ range }) => range.row.position)).toEqual(['warm-end-air'])
    expect(cool?.unanswered.map(({ position }) => position)).toContain('cool-hide')
  })

  test('carry the limits that hold at the place', () => {
    const basking = rowsOf('temperature')?.rows[0]
    expect(basking?.upper?.value).toBe(54)
    expect(basking?.lower).toBeNull()
  })

  test('a limit inherited from a wider row is known as such', () => {
    const wide = makeRange({ lifeStage: 'any', upperLimit: 50 })
    const [answer] = listAnswers([makeRange({ low: 38 }), wide], adultByDay)
    expect(answer?.rows[0]?.upper).toMatchObject({ value: 50, isInherited: true })
  })

  test('a place that the row of the whole enclosure answers for is not missing', () => {
    const whole = makeRange({ position: 'whole-enclosure', season: 'brumation', period: 'any' })
    const cool = { ...adultByDay, season: 'brumation' } as const
    const [answer] = listAnswers([...ranges, whole], cool)
    expect(answer?.rows.map(({ range }) => range.row.position)).toEqual(['warm-end-air', 'whole-enclosure'])
    expect(answer?.unanswered.map(({ position }) => position)).toEqual(['basking-surface'])
  })

  test('a parameter with nothing to say at night is left out', () => {
    expect(rowsOf('uv-index', { ...adultByDay, period: 'night' })).toBeUndefined()
  })

  test('places where nobody has given a temperature are named, those of the whole enclosure’s row are not', () => {
    expect(rowsOf('temperature')?.gaps).toEqual(['basking-air', 'humid-hide'])
    const whole = makeRange({ position: 'whole-enclosure', period: 'any', lifeStage: 'any', season: 'any' })
    const [answer] = listAnswers([...ranges, whole], adultByDay)
    expect(answer?.gaps).toEqual([])
  })

  test('every row of the page is shown once, here or among the others', () => {
    const answers = listAnswers(ranges, adultByDay)
    const shown = answers.flatMap(({ rows }) => rows.map(({ range }) => range.itemId))
    const others = listOtherRows(ranges, answers).map(({ itemId }) => itemId)
    expect([...shown, ...others].sort()).toEqual(ranges.map(({ itemId }) => itemId).sort())
  })
})

describe('the day’s targets', () => {
  test('gather the numbers of a place under one entry, in the reader’s unit', () => {
    const both = [...ranges, makeRange({ position: 'basking-air', low: 36, high: 38 })]
    const targets = listTargets(listAnswers(both, adultByDay), units)
    const basking = targets.find(({ position }) => position === 'basking-air')
    expect(basking?.lines.map(({ text }) => plain(text))).toEqual(['36 – 38 °C', '3.0 – 5.0 UVI'])
    expect(basking?.lines.map(({ spoken }) => plain(spoken))).toEqual([
      'temperature 36 to 38 °C',
      'UV index 3.0 to 5.0 UVI',
    ])
  })

  test('lead to the row that says them', () => {
    const [first] = listTargets(listAnswers(ranges, adultByDay), units)
    expect(first?.address).toBe(`#range-${ranges[0]?.itemId}`)
  })
})
