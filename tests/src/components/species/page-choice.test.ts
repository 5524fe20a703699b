import { describe, expect, test } from 'vitest'
import { listOptions, readChoice, writeChoice } from '../../../../src/components/species/page-choice.js'
import { makeRange, makeSpeciesPage } from '../../../helpers/species-page.js'

const { ranges } = makeSpeciesPage()
const options = listOptions(ranges)

describe('what a reader can choose from', () => {
  test('is what the page has rows for, in the order of a life and a year', () => {
    expect(options).toEqual({
      lifeStages: ['juvenile', 'adult'],
      seasons: ['active', 'brumation'],
      periods: ['day', 'night'],
    })
  })

  test('a row for any stage and season speaks of the active adult', () => {
    const any = [
      makeRange({ lifeStage: 'any', season: 'any', period: 'any' }),
      makeRange({ lifeStage: 'larva' }),
    ]
    expect(listOptions(any)).toEqual({
      lifeStages: ['larva', 'adult'],
      seasons: ['active'],
      periods: ['day', 'night'],
    })
  })

  test('without any row there is nothing to choose', () => {
    expect(listOptions([])).toEqual({ lifeStages: ['adult'], seasons: ['active'], periods: ['day'] })
  })
})

describe('the address', () => {
  test('says nothing of the active adult with the lights on', () => {
    const choice = readChoice({}, options)
    expect(choice).toEqual({ lifeStage: 'adult', season: 'active', period: 'day' })
    expect(writeChoice(choice, options)).toEqual({})
  })

  test('reads back what it was written from', () => {
    for (const lifeStage of options.lifeStages) {
      for (const season of options.seasons) {
        for (const period of options.periods) {
          const choice = { lifeStage, season, period }
          expect(readChoice(writeChoice(choice, options), options)).toEqual(choice)
        }
      }
    }
  })

  test('falls back where it names what the page does not have', () => {
    expect(readChoice({ stage: 'egg', season: ['brumation', 'active'], lights: 'dim' }, options)).toEqual({
      lifeStage: 'adult',
      season: 'active',
      period: 'day',
    })
  })

  test('without an adult on the page the last stage of life is shown', () => {
    const young = listOptions([makeRange({ lifeStage: 'larva' }), makeRange({ lifeStage: 'juvenile' })])
    expect(readChoice({}, young).lifeStage).toBe('juvenile')
  })
})
