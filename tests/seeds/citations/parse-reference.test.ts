import { describe, expect, it } from 'vitest'
import { parseReference } from '../../../seeds/citations/parse-reference.js'

describe('reading a printed reference', () => {
  it('takes an article apart', () => {
    expect(
      parseReference(
        'Agudelo-Cantero, G.A.; Navas, C.A. (2019) Interactive effects of experimental heating rates. Journal of Thermal Biology 82 pp. 43-51',
      ),
    ).toEqual({
      kind: 'article',
      asPrinted: null,
      csl: {
        type: 'article-journal',
        author: [
          { family: 'Agudelo-Cantero', given: 'G.A.' },
          { family: 'Navas', given: 'C.A.' },
        ],
        issued: { 'date-parts': [[2019]] },
        title: 'Interactive effects of experimental heating rates',
        'container-title': 'Journal of Thermal Biology',
        volume: '82',
        page: '43-51',
      },
    })
  })

  it('tells volume and issue, and a title that ends in a question mark', () => {
    const { csl } = parseReference(
      'Burrowes, P.A. (2020) Climatic heterogeneity: Are frogs trapped?. South American Journal of Herpetology 18(1) pp. 1-12',
    )
    expect(csl).toMatchObject({
      title: 'Climatic heterogeneity: Are frogs trapped?',
      volume: '18',
      issue: '1',
    })
  })

  it('knows a thesis by one author and a university', () => {
    expect(
      parseReference('Bovo, Rafael Parelli (2015) Fisiologia térmica. Universidad Estadual Paulista pp. 137'),
    ).toMatchObject({
      kind: 'thesis',
      asPrinted: null,
      csl: { type: 'thesis', publisher: 'Universidad Estadual Paulista', 'number-of-pages': '137' },
    })
  })

  it('ends a shortened list of authors with "others"', () => {
    const { csl } = parseReference(
      'Beukema, Wouter; Pasmans, Frank et al. (2021) Microclimate limits. Ecology Letters 24(1) pp. 27-37',
    )
    expect(csl.author).toEqual([
      { family: 'Beukema', given: 'Wouter' },
      { family: 'Pasmans', given: 'Frank' },
      { literal: 'others' },
    ])
  })

  it('puts names together again that were split at "and"', () => {
    const { csl } = parseReference(
      'Seal; er, John A.; West, Boyce W. (1969) Critical Thermal Maxima. Herpetologica 25(2) pp. 122-124',
    )
    expect(csl.author).toEqual([
      { family: 'Sealander', given: 'John A.' },
      { family: 'West', given: 'Boyce W.' },
    ])
    const mended = parseReference(
      'Crow, J.C.; Ostr; , K.G. (2016) Temperature. Herpetological Conservation 11(2) pp. 1-2',
    )
    expect(mended.csl.author?.[1]).toEqual({ family: 'Ostrand', given: 'K.G.' })
  })

  it('reads the form that has an author-year key in the place of the authors', () => {
    expect(parseReference('Branco and Malvin 1996 (1996) Thermoregulatory effects of cyanide')).toMatchObject(
      {
        kind: 'other',
        asPrinted: null,
        csl: {
          title: 'Thermoregulatory effects of cyanide',
          author: [{ family: 'Branco' }, { family: 'Malvin' }],
        },
      },
    )
  })

  it.each([
    [
      'a journal with a full stop',
      'Berner, Nancy J.; Puckett, Rosemary E. (2010) Flexibility in the newt. Journal of Experimental Zoology. Part A, Genetics 313(4) pp. 231-239',
    ],
    [
      'an abbreviated name in the title',
      'Sos, Tibor (2007) Thermoconformity (Bombina v. variegata). Herpetologica Romanica 1 pp. 1-11',
    ],
    ['a publication without a volume', 'Paulson, BK (1987) Origin of the stimulus. Copeia pp. 810-813'],
    ['no form at all', 'Somebody, in a letter'],
  ])('keeps as printed a reference with %s', (_, printed) => {
    const parsed = parseReference(printed)
    expect(parsed.asPrinted).toBe(printed)
    expect(parsed.csl.title).toBeUndefined()
  })
})
