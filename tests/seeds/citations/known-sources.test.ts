import { describe, expect, it } from 'vitest'
import { KnownSources } from '../../../seeds/citations/known-sources.js'
import { parseReference } from '../../../seeds/citations/parse-reference.js'

const sources = new KnownSources(
  [
    'Berkhouse, CS; Fries, JN (1995) Critical thermal maxima. Southwestern Naturalist 40(4) pp. 430-434',
    'Brattstrom, Bayard H. (1968) Thermal acclimation. Comparative Biochemistry 24(1) pp. 93-111',
    'Johnson, C.R. (1972) Diel variation. Journal of Herpetology 6(1) pp. 35',
    'Johnson, Clifford Ray (1972) Thermal relations. Zoology 3(1) pp. 1-2',
    'Christian, K.A.; Nunez, F.; Clos, L. (1988) Thermal relations. Biotropica 20(3) pp. 236-239',
    'Gvoždík, Lumír (2005) Does reproduction influence. Canadian Journal of Zoology 83(8) pp. 1038-1044',
    'Crawshaw et al 1992 (1992) Seasonal rhythms',
  ].map((printed, index) => ({ id: `source-${index}`, csl: parseReference(printed).csl })),
)

describe('resolving an author-year key', () => {
  it.each([
    ['two authors', 'Berkhouse & Fries 1995', 'source-0'],
    ['two authors in words', 'Berkhouse and Fries 1995', 'source-0'],
    ['one author', 'Brattstrom 1968', 'source-1'],
    ['three authors as et al', 'Christian et al 1988', 'source-4'],
    ['et al with a full stop', 'Christian et al. 1988', 'source-4'],
    ['another spelling of accents', 'Gvozdik 2005', 'source-5'],
    ['a shortened reference', 'Crawshaw et al 1992', 'source-6'],
    ['no source with two answering', 'Johnson 1972', null],
    ['no source of another year', 'Brattstrom 1970', null],
    ['no source for one author where there are two', 'Berkhouse 1995', null],
    ['no source for et al where there are two', 'Berkhouse et al 1995', null],
    ['no source for another second author', 'Berkhouse & Frey 1995', null],
    ['no source for a year with a letter', 'Brattstrom 1968a', null],
    ['no source for a work cited in another', 'Cherchi 1956 in Brattstrom 1968', null],
    ['no source for two years', 'Brattstrom 1965,1968', null],
    ['no source for what is no key', 'Brattstrom, in a letter', null],
  ])('finds %s', (_, key, id) => {
    expect(sources.findByKey(key)).toBe(id)
  })
})
