import { describe, expect, it } from 'vitest'
import {
  EMPTY_SEARCH,
  parseSearchQuery,
  readOverlap,
  writeOverlap,
  writeSearchQuery,
  writeSearchString,
} from '../../shared/search-query.js'
import type { SearchQuery } from '../../shared/search.js'

const FULL_SEARCH: SearchQuery = {
  q: 'bearded dragon & co',
  class: ['Reptilia', 'Amphibia'],
  order: ['Squamata'],
  family: ['Agamidae'],
  conservation: ['Least Concern'],
  uvZone: [3, 4],
  evidenceKind: ['guideline', 'review'],
  hasRanges: true,
  invented: false,
  overlaps: [
    {
      parameter: 'temperature',
      position: 'basking-surface',
      period: 'day',
      low: 35,
      high: 40.5,
    },
    {
      parameter: 'temperature',
      position: 'warm-hide',
      period: 'night',
      low: null,
      high: -2,
    },
  ],
  sort: 'name',
  cursor: 'abc',
  limit: 50,
}

describe('writeSearchQuery and parseSearchQuery', () => {
  it('give back every search they are given', () => {
    expect(parseSearchQuery(writeSearchQuery(FULL_SEARCH))).toEqual({ ok: true, query: FULL_SEARCH })
  })

  it('write nothing for a search that asks nothing', () => {
    expect(writeSearchQuery(EMPTY_SEARCH)).toEqual({})
    expect(writeSearchString(EMPTY_SEARCH)).toBe('')
    expect(parseSearchQuery({})).toEqual({ ok: true, query: EMPTY_SEARCH })
  })

  it('write an address that holds what its characters would break', () => {
    const query = { ...EMPTY_SEARCH, q: 'a&b=c', class: ['x y', 'ü'] }
    expect(writeSearchString(query)).toBe('?q=a%26b%3Dc&class=x%20y&class=%C3%BC')
  })

  it('leave out what is given empty and count a value given twice once', () => {
    const parsed = parseSearchQuery({
      q: '',
      class: ['Reptilia', '', 'Reptilia'],
      sort: null,
      cursor: undefined,
    })
    expect(parsed).toEqual({ ok: true, query: { ...EMPTY_SEARCH, class: ['Reptilia'] } })
  })

  it('join the white space of the words', () => {
    expect(parseSearchQuery({ q: '  bearded \t dragon ' })).toMatchObject({ query: { q: 'bearded dragon' } })
  })

  it.each([
    ['colour', { colour: 'green' }],
    ['q', { q: ['a', 'b'] }],
    ['q', { q: 'x'.repeat(101) }],
    ['uvZone', { uvZone: '7' }],
    ['evidenceKind', { evidenceKind: 'rumour' }],
    ['hasRanges', { hasRanges: 'maybe' }],
    ['invented', { invented: 'true' }],
    ['sort', { sort: 'random' }],
    ['limit', { limit: '101' }],
    ['limit', { limit: '0' }],
    ['limit', { limit: '1e1' }],
    ['overlap', { overlap: 'temperature.basking-surface.day' }],
    ['overlap', { overlap: Array.from({ length: 7 }, (_, low) => `temperature.shade.day.${low}_`) }],
    ['class', { class: Array.from({ length: 41 }, (_, index) => `c${index}`) }],
  ])('refuse a wrong %s (%j)', (path, parameters) => {
    const parsed = parseSearchQuery(parameters)
    expect(parsed.ok).toBe(false)
    if (!parsed.ok) expect(parsed.errors.map((error) => error.path)).toEqual([path])
  })
})

describe('readOverlap', () => {
  it.each([
    ['temperature.basking-surface.day.35_40', 35, 40],
    ['temperature.warm-hide.night._22', null, 22],
    ['uv-index.basking-air.any.2.5_', 2.5, null],
    ['temperature.cool-end-air.night.-3_-0.5', -3, -0.5],
  ])('reads %s', (text, low, high) => {
    expect(readOverlap(text)).toMatchObject({ low, high })
  })

  it.each([
    'temperature.basking-surface.day._',
    'temperature.basking-surface.day.40_35',
    'temperature.basking-surface.day.1e9_',
    'temperature.basking-surface.day.NaN_3',
    'temperature.basking-surface.noon.1_2',
    'temperature.roof.day.1_2',
    'pressure.shade.day.1_2',
    '',
  ])('says in a sentence why "%s" is none', (text) => {
    expect(readOverlap(text)).toMatch(/^[A-Z].+\.$/)
  })

  it('is written with at most six decimals, so that a converted bound can be read back', () => {
    const overlap = { ...FULL_SEARCH.overlaps[0]!, low: 85 / 2.7, high: 1e-7 }
    expect(writeOverlap(overlap)).toBe('temperature.basking-surface.day.31.481481_0')
  })
})
