import { describe, expect, it } from 'vitest'
import type { CheckPage } from '../../../shared/checker/check.js'
import { findPhysiologyCautions } from '../../../shared/checker/physiology-cautions.js'
import type { TemperatureReading } from '../../../shared/checker/physiology-cautions.js'
import { makeCheckPage, makeCitedPhysiology, makeDatasetPhysiology } from '../../helpers/check-page.js'

function makeSpot(part: Partial<TemperatureReading>): TemperatureReading {
  return {
    readingIndex: 0,
    position: 'cool-hide',
    period: 'day',
    valueC: 30,
    uncertaintyC: 0,
    limit: 'clear',
    ...part,
  }
}

type Asked = Parameters<typeof findPhysiologyCautions>[1]

function caution(page: CheckPage, spots: Partial<TemperatureReading>[], asked: Partial<Asked> = {}) {
  const readings = spots.map((spot, readingIndex) => makeSpot({ readingIndex, ...spot }))
  return findPhysiologyCautions(page, { lifeStage: 'adult', season: 'active', ...asked }, readings)
}

const selected34 = makeCitedPhysiology('s34', { meanC: 34 })
const selected36 = makeCitedPhysiology('s36', {
  meanC: 36,
  sourceId: '00000000-0000-4000-8000-000000000002',
  n: 8,
})
const criticalMaximum42 = makeCitedPhysiology('m42', { quantity: 'critical-thermal-maximum', meanC: 42 })
const criticalMaximum44 = makeCitedPhysiology('m44', { quantity: 'critical-thermal-maximum', meanC: 44 })
const criticalMinimum8 = makeCitedPhysiology('n8', { quantity: 'critical-thermal-minimum', meanC: 8 })
const criticalMinimum6 = makeCitedPhysiology('n6', { quantity: 'critical-thermal-minimum', meanC: 6 })

describe('the caution where an animal cannot get away', () => {
  const page = makeCheckPage({ physiology: [selected34, selected36, criticalMaximum42, criticalMaximum44] })

  it.each([
    ['at the highest study mean', 36, 0, []],
    ['over it', 36.1, 0, ['above-selected-temperature']],
    ['under it, 1.645 u short', 35, 0.6, []],
    ['under it, within 1.645 u', 35, 0.62, ['above-selected-temperature']],
    ['over one study only', 35, 0, []],
  ])('judges a reading %s of selected temperature', (_, valueC, uncertaintyC, kinds) => {
    const found = caution(page, [{ valueC, uncertaintyC }])
    expect(found.filter(({ level }) => level === 'caution').map(({ kind }) => kind)).toEqual(kinds)
  })

  it('names the study and its n', () => {
    const [found] = caution(page, [{ valueC: 37 }])
    expect(found).toMatchObject({
      level: 'caution',
      thresholdC: 36,
      study: { itemId: 's36', valueC: 36, n: 8 },
    })
    expect(found?.study?.name).toMatch(/Study 2.*2002/)
  })

  it.each([
    ['Reptilia', 32, []],
    ['Reptilia', 32.1, ['above-share-of-critical-maximum']],
    ['Amphibia', 28, []],
    ['Amphibia', 28.1, ['above-share-of-critical-maximum']],
  ])(
    'without a selected temperature starts below the lowest critical maximum: %s at %d °C',
    (name, valueC, kinds) => {
      const bare = makeCheckPage({ class: name, physiology: [criticalMaximum42, criticalMaximum44] })
      expect(caution(bare, [{ valueC }]).map(({ kind }) => kind)).toEqual(kinds)
    },
  )

  it('is silent where nothing is known', () => {
    expect(caution(makeCheckPage({}), [{ valueC: 40 }])).toEqual([])
  })
})

describe('danger', () => {
  const page = makeCheckPage({
    physiology: [criticalMaximum42, criticalMaximum44, criticalMinimum6, criticalMinimum8],
  })

  it.each([
    ['3.1 °C below the lowest critical maximum', 38.9, 0, false],
    ['3 °C below it', 39, 0, true],
    ['past it', 50, 0, true],
    ['3.5 °C below it, uncertain by more than the rest', 38.5, 0.4, true],
  ])('from heat at %s', (_, valueC, uncertaintyC, isDanger) => {
    const kinds = caution(page, [{ valueC, uncertaintyC }]).map(({ kind }) => kind)
    expect(kinds.includes('near-critical-maximum')).toBe(isDanger)
  })

  it.each([
    ['3.1 °C above the highest critical minimum', 11.1, 0, false],
    ['3 °C above it', 11, 0, true],
    ['below it', 2, 0, true],
    ['3.5 °C above it, uncertain by more than the rest', 11.5, 0.4, true],
  ])('from cold in the active season at %s', (_, valueC, uncertaintyC, isDanger) => {
    const kinds = caution(page, [{ valueC, uncertaintyC }]).map(({ kind }) => kind)
    expect(kinds.includes('near-critical-minimum')).toBe(isDanger)
  })

  it.each([
    [6, []],
    [3.1, []],
    [3, ['near-freezing']],
    [-1, ['near-freezing']],
  ])('in brumation warns near freezing instead: %d °C', (valueC, kinds) => {
    expect(caution(page, [{ valueC }], { season: 'brumation' }).map(({ kind }) => kind)).toEqual(kinds)
  })

  it('rests on the asked stage or an unspecified one, never on another', () => {
    const larval = makeCitedPhysiology('larva', {
      quantity: 'critical-thermal-maximum',
      lifeStage: 'larva',
      meanC: 36,
    })
    const adult = makeCitedPhysiology('adult', {
      quantity: 'critical-thermal-maximum',
      lifeStage: 'adult',
      meanC: 42,
    })
    const both = makeCheckPage({ physiology: [larval, adult] })
    expect(caution(both, [{ valueC: 35 }]).map(({ level }) => level)).toEqual(['caution'])
    expect(caution(both, [{ valueC: 35 }], { lifeStage: 'larva' })[0]).toMatchObject({
      level: 'danger',
      study: { itemId: 'larva' },
    })
    const eggs = caution(both, [{ valueC: 41 }], { lifeStage: 'egg' })
    expect(eggs).toEqual([])
    expect(caution(page, [{ valueC: 41 }], { lifeStage: 'egg' })[0]).toMatchObject({ level: 'danger' })
  })

  it('outweighs the caution of the same heat, and comes first', () => {
    const full = makeCheckPage({ physiology: [selected34, criticalMaximum42] })
    const found = caution(full, [{ valueC: 35 }, { valueC: 41 }])
    expect(found.map(({ level, readingIndex }) => [level, readingIndex])).toEqual([
      ['danger', 1],
      ['caution', 0],
    ])
  })
})

describe('a basking place', () => {
  const page = makeCheckPage({ physiology: [selected34, criticalMaximum42] })
  const basking = { position: 'basking-surface', valueC: 50 } as const
  const kindsFor = (spots: Partial<TemperatureReading>[]) =>
    caution(page, spots)
      .filter(({ level }) => level !== 'inform')
      .map(({ kind, readingIndex }) => [kind, readingIndex])

  it('may be hotter than the critical maximum when the check shows a cooler, tolerable place', () => {
    expect(kindsFor([basking, { position: 'cool-end-air', valueC: 25 }])).toEqual([])
  })

  it.each([
    ['alone', []],
    ['with a cooler place at another time', [{ period: 'night', valueC: 20 }]],
    ['with another basking place', [{ position: 'basking-air', valueC: 33 }]],
    ['with a place past its limit', [{ valueC: 25, limit: 'past' }]],
    ['with a place near its limit', [{ valueC: 25, limit: 'near' }]],
    ['with a place no cooler', [{ valueC: 50 }]],
  ] as const)('is judged as any other %s', (_, others) => {
    expect(kindsFor([basking, ...others])[0]).toEqual(['near-critical-maximum', 0])
  })

  it('is judged when every cooler place calls for caution itself', () => {
    expect(kindsFor([basking, { position: 'warm-hide', valueC: 36 }])).toEqual([
      ['near-critical-maximum', 0],
      ['above-selected-temperature', 1],
    ])
  })
})

describe('what is told besides', () => {
  const page = makeCheckPage({ physiology: [selected34, selected36] })
  const told = (spots: Partial<TemperatureReading>[], asked: Partial<Asked> = {}) =>
    caution(page, spots, asked)
      .filter(({ level }) => level === 'inform')
      .map(({ kind }) => kind)

  it('no position that reaches the selected temperature, by day and in a warm season', () => {
    expect(told([{ valueC: 28 }, { valueC: 33 }])).toEqual(['selected-temperature-not-reached'])
    expect(told([{ valueC: 28 }, { valueC: 34 }])).toEqual([])
    expect(told([{ valueC: 28, period: 'night' }])).toEqual([])
    expect(told([{ valueC: 8 }], { season: 'brumation' })).toEqual([])
  })

  it.each([
    ['basking-surface', 45, true],
    ['basking-surface', 44.9, false],
    ['substrate', 45, true],
    ['basking-air', 60, false],
  ] as const)(
    'contact with %s at %d °C can burn: %s (our policy, from memory)',
    (position, valueC, burns) => {
      expect(told([{ position, valueC }, { valueC: 34 }]).includes('contact-burn')).toBe(burns)
    },
  )
})

describe('studies of a dataset', () => {
  it('count by their mean; of a compiler’s summary the ends are study means', () => {
    const page = makeCheckPage({
      physiology: [
        makeDatasetPhysiology('d', [
          { meanC: 33, lowC: 28, highC: 38 },
          {
            level: 'summary',
            meanC: null,
            lowC: 32,
            highC: 35,
            animals: null,
            sourceAsPrinted: 'Compiler 2020',
          },
        ]),
      ],
    })
    const [found] = caution(page, [{ valueC: 35.1 }])
    expect(found).toMatchObject({
      thresholdC: 35,
      study: { name: 'Compiler 2020', n: null, basis: 'span-of-means', sourceId: null },
    })
  })

  it('that give a span but no mean count by the end that makes for more caution', () => {
    const page = makeCheckPage({
      physiology: [
        makeDatasetPhysiology('d', [{ quantity: 'critical-thermal-maximum', lowC: 40, highC: 44 }]),
      ],
    })
    expect(caution(page, [{ valueC: 37.5 }])[0]).toMatchObject({
      level: 'danger',
      study: { valueC: 40, basis: 'span-without-mean' },
    })
  })
})
