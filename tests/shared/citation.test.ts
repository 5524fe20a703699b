import { describe, expect, test } from 'vitest'
import {
  toDoiUrl,
  toFullReference,
  toReferenceParts,
  toRevisionCitation,
  toSafeUrl,
  toShortCitation,
} from '../../shared/citation.js'

/** A real article, its fields as its publisher registered them (Ecology 58: 1066–1075). */
const article = {
  doi: null,
  asPrinted: null,
  csl: {
    type: 'article-journal',
    title: 'Seasonal variation in thermoregulatory behavior and body temperature of diurnal Kalahari lizards',
    author: [
      { family: 'Huey', given: 'R. B.' },
      { family: 'Pianka', given: 'E. R.' },
    ],
    issued: { 'date-parts': [[1977]] },
    'container-title': 'Ecology',
    volume: '58',
    page: '1066-1075',
  },
}
const printed = { doi: null, asPrinted: 'Berkhouse & Fries 1995', csl: { type: 'article' } }

describe('the short form', () => {
  test('names two authors and the year', () => {
    expect(toShortCitation(article)).toBe('Huey & Pianka 1977')
  })

  test('names one author alone and shortens three to the first', () => {
    const [first] = article.csl.author
    expect(toShortCitation({ ...article, csl: { ...article.csl, author: first ? [first] : [] } })).toBe(
      'Huey 1977',
    )
    const three = [...article.csl.author, { literal: 'Third' }]
    expect(toShortCitation({ ...article, csl: { ...article.csl, author: three } })).toBe('Huey et al. 1977')
  })

  test('falls back to the printed words, then to the title', () => {
    expect(toShortCitation(printed)).toBe('Berkhouse & Fries 1995')
    const untitled = {
      asPrinted: null,
      csl: { type: 'report', title: 'Keeping notes', issued: { 'date-parts': [[2020]] } },
    }
    expect(toShortCitation(untitled)).toBe('Keeping notes 2020')
    expect(toShortCitation({ asPrinted: null, csl: { type: 'book' } })).toBe('Source without a title')
  })

  test('clips a long printed reference at a word', () => {
    const long = 'Commission Recommendation of 18 June 2007, Official Journal of the European Union, page 82'
    expect(toShortCitation({ asPrinted: long, csl: { type: 'legislation' } })).toBe(
      'Commission Recommendation of 18 June 2007 …',
    )
  })
})

describe('the full form', () => {
  test('is authors, year, title, container, volume and pages', () => {
    expect(toFullReference(article)).toBe(
      'Huey, R. B. & Pianka, E. R. (1977) Seasonal variation in thermoregulatory behavior and body temperature of ' +
        'diurnal Kalahari lizards. Ecology 58: 1066–1075.',
    )
  })

  test('ends with the DOI', () => {
    const withDoi = { ...article, doi: '10.2307/1936926' }
    expect(toFullReference(withDoi)).toMatch(/1066–1075\. doi:10\.2307\/1936926$/)
    expect(toReferenceParts(withDoi).url).toBe('https://doi.org/10.2307/1936926')
  })

  test('names the publisher of what stands in no journal', () => {
    const report = {
      doi: null,
      asPrinted: null,
      csl: { type: 'report', title: 'Housing standards', publisher: 'A board' },
    }
    expect(toFullReference(report)).toBe('Housing standards. A board.')
  })

  test('is the printed words where the fields say nothing', () => {
    expect(toFullReference(printed)).toBe('Berkhouse & Fries 1995.')
    expect(toReferenceParts(printed)).toMatchObject({ title: null, asPrinted: 'Berkhouse & Fries 1995' })
  })
})

describe('addresses', () => {
  test('only a DOI becomes a DOI address', () => {
    expect(toDoiUrl('10.1016/j.jtherbio.2019.03.010')).toBe('https://doi.org/10.1016/j.jtherbio.2019.03.010')
    expect(toDoiUrl('doi:10.1016/x')).toBeNull()
    expect(toDoiUrl('10.1000/a#b?c')).toBe('https://doi.org/10.1000/a%23b%3Fc')
    expect(toDoiUrl(null)).toBeNull()
  })

  test('only http addresses may be followed', () => {
    expect(toSafeUrl('https://example.org/a')).toBe('https://example.org/a')
    expect(toSafeUrl('javascript:alert(1)')).toBeNull()
    expect(toSafeUrl('https://example.org/" onclick="x')).toBeNull()
  })
})

test('a revision is cited with its number, day and permanent address', () => {
  expect(
    toRevisionCitation({
      scientificName: 'Rhinella marina',
      number: 3,
      publishedOn: '3 October 2026',
      address: 'https://example.org/species/rhinella-marina/revisions/3',
    }),
  ).toBe(
    'Mossgauge. Rhinella marina, revision 3, published 3 October 2026. https://example.org/species/rhinella-marina/revisions/3',
  )
})
