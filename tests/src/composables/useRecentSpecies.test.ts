import { beforeEach, describe, expect, it } from 'vitest'
import { readRecentSpecies, rememberSpecies } from '../../../src/composables/useRecentSpecies.js'

const make = (slug: string) => ({ slug, scientificName: slug, isInvented: false })

beforeEach(() => localStorage.clear())

describe('the species checked last', () => {
  it('stand newest first, each once, and no more than six', () => {
    for (const slug of ['a', 'b', 'c', 'd', 'e', 'f', 'g', 'c']) rememberSpecies(localStorage, make(slug))
    expect(readRecentSpecies(localStorage).map(({ slug }) => slug)).toEqual(['c', 'g', 'f', 'e', 'd', 'b'])
  })

  it('are none where the storage holds something else', () => {
    expect(readRecentSpecies({ getItem: () => '[{"slug":4},null]' })).toEqual([])
    expect(readRecentSpecies({ getItem: () => 'x' })).toEqual([])
  })
})
