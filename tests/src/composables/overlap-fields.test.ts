import { describe, expect, it } from 'vitest'
import { foldOverlapFields, readOverlapFields } from '../../../src/composables/overlap-fields.js'
import { describeOverlap, listActiveFilters } from '../../../src/composables/filter-words.js'
import { EMPTY_SEARCH, parseSearchQuery } from '../../../shared/search-query.js'

const fields = { parameter: 'temperature', position: 'basking-surface', period: 'day', from: '35', to: '40' }

describe('a range filter as typed', () => {
  it('is kept in °C whatever unit it was typed in', () => {
    expect(readOverlapFields(fields, 'degC')).toMatchObject({ low: 35, high: 40 })
    // 95 °F is 35 °C and 104 °F is 40 °C exactly (NIST SP 811).
    expect(readOverlapFields({ ...fields, from: '95', to: '104' }, 'degF')).toMatchObject({
      low: 35,
      high: 40,
    })
  })

  it('does not read other parameters in the reader’s temperature unit', () => {
    const humid = { ...fields, parameter: 'relative-humidity', position: 'humid-hide', from: '70', to: '' }
    expect(readOverlapFields(humid, 'degF')).toMatchObject({ low: 70, high: null })
  })

  it.each([
    [{ from: '', to: '' }, /at least one/],
    [{ from: 'warm' }, /number/],
    [{ from: '41' }, /above/],
    [{ from: '-300' }, /no such/],
    [{ parameter: 'wind' }, /what is measured/],
    [{ parameter: 'relative-humidity', to: '101' }, /no such/],
  ])('says what is wrong with %j', (wrong, words) => {
    expect(readOverlapFields({ ...fields, ...wrong }, 'degC')).toMatch(words)
  })

  it('takes a decimal comma and a real minus sign', () => {
    expect(readOverlapFields({ ...fields, from: '−1,5', to: '' }, 'degC')).toMatchObject({
      low: -1.5,
      high: null,
    })
  })
})

describe('a form sent without script', () => {
  const sent = {
    q: 'boa',
    addParameter: 'temperature',
    addPosition: 'warm-hide',
    addPeriod: 'night',
    addFrom: '',
    addTo: '22',
  }

  it('becomes an address that the search reads', () => {
    const folded = foldOverlapFields({ ...sent, overlap: 'temperature.basking-surface.day.35_40' }, 'degC')
    const parsed = parseSearchQuery(folded ?? {})
    expect(parsed).toMatchObject({
      ok: true,
      query: {
        q: 'boa',
        overlaps: [{ position: 'basking-surface' }, { position: 'warm-hide', low: null, high: 22 }],
      },
    })
  })

  it('drops fields left empty and keeps the rest', () => {
    expect(foldOverlapFields({ ...sent, addTo: '' }, 'degC')).toEqual({ q: 'boa' })
  })

  it('leaves an address without such fields alone', () => {
    expect(foldOverlapFields({ q: 'boa' }, 'degC')).toBeNull()
  })
})

describe('the filters that are on', () => {
  const overlap = {
    parameter: 'temperature',
    position: 'basking-surface',
    period: 'day',
    low: 35,
    high: 40,
  } as const

  it('speak in the reader’s unit', () => {
    expect(describeOverlap(overlap, 'degC').replace(/\s/g, ' ')).toBe(
      'Basking surface, lights on: 35 – 40 °C',
    )
    expect(describeOverlap(overlap, 'degF').replace(/\s/g, ' ')).toBe(
      'Basking surface, lights on: 95 – 104 °F',
    )
  })

  it('can each be taken away alone', () => {
    const query = { ...EMPTY_SEARCH, family: ['Boidae', 'Scincidae'], hasRanges: true, overlaps: [overlap] }
    const filters = listActiveFilters(query, 'degC')
    expect(filters.map((filter) => filter.without)).toEqual([
      { hasRanges: null },
      { family: ['Scincidae'] },
      { family: ['Boidae'] },
      { overlaps: [] },
    ])
  })
})
