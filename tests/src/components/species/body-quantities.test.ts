import { describe, expect, test } from 'vitest'
import { listBodyQuantities } from '../../../../src/components/species/body-quantities.js'
import { numberSources } from '../../../../src/components/species/page-sources.js'
import { makeSpeciesPage } from '../../../helpers/species-page.js'

const page = makeSpeciesPage()
const quantities = listBodyQuantities(page, numberSources(page))
const find = (name: string) => quantities.find(({ quantity }) => quantity === name)

describe('what is known of the body', () => {
  test('is grouped by quantity, what the animal selects first', () => {
    expect(quantities.map(({ quantity }) => quantity)).toEqual([
      'selected-body-temperature',
      'field-body-temperature',
      'critical-thermal-minimum',
      'critical-thermal-maximum',
    ])
  })

  test('an unresolved source adds records but no study', () => {
    expect(find('critical-thermal-maximum')).toMatchObject({ studies: 2, records: 6, summaries: 0 })
  })

  test('a compiler’s summary is no study, its span stands for the means', () => {
    expect(find('field-body-temperature')).toMatchObject({
      studies: 0,
      summaries: 1,
      lowC: 33.1,
      highC: 36.8,
    })
  })

  test('the span is that of the means, not of single animals', () => {
    expect(find('critical-thermal-maximum')).toMatchObject({ lowC: 41.25, highC: 42.6 })
  })

  test('lines stand from cool to warm, each with the number of its source', () => {
    const lines = find('critical-thermal-maximum')?.lines ?? []
    expect(lines.map(({ meanC }) => meanC)).toEqual([41.25, 41.25, 42.6])
    expect(lines.map(({ number }) => number)).toEqual([4, null, 2])
    expect(lines[1]?.name).toBe('Nobody 1970')
  })

  test('one study in two datasets counts once', () => {
    const [, dataset] = page.physiology
    const twice = { ...page, physiology: dataset ? [dataset, { ...dataset, itemId: page.species.id }] : [] }
    const [maximum] = listBodyQuantities(twice, numberSources(page)).slice(-1)
    expect(maximum).toMatchObject({ studies: 2, records: 12 })
  })
})
