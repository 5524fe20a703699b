import { expect, test } from 'vitest'
import { numberSources } from '../../../../src/components/species/page-sources.js'
import { makeSource, makeSpeciesPage, toId } from '../../../helpers/species-page.js'

const numberOf = (page: ReturnType<typeof makeSpeciesPage>, key: string) =>
  numberSources(page).get(toId(`source ${key}`))

test('sources are numbered in the order they are cited, ranges before physiology before prose', () => {
  const page = makeSpeciesPage()
  expect(['guide', 'field', 'keepers', 'runs'].map((key) => numberOf(page, key))).toEqual([1, 2, 3, 4])
})

test('a source that only prose cites has a number, one that nothing cites comes last', () => {
  const prose = makeSource('prose only')
  const idle = makeSource('idle')
  const page = makeSpeciesPage({
    ranges: [],
    physiology: [],
    prose: [{ itemId: toId('p'), row: { heading: 'x', markdown: `Seen [@${prose.id}, p. 2].` } }],
    sources: { [idle.id]: idle, [prose.id]: prose },
  })
  expect([numberOf(page, 'prose only'), numberOf(page, 'idle')]).toEqual([1, 2])
})

test('a citation of a source the page does not carry has no number', () => {
  const page = makeSpeciesPage({ sources: {} })
  expect(numberSources(page).size).toBe(0)
})
