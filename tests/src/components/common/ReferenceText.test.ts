import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import ReferenceText from '../../../../src/components/common/ReferenceText.vue'

function write(source: { csl: object; asPrinted?: string | null; doi?: string | null }): string {
  const whole = { asPrinted: null, doi: null, ...source, csl: { type: 'article-journal', ...source.csl } }
  return mount(ReferenceText, { props: { source: whole } })
    .text()
    .replace(/\s+/g, ' ')
}

const csl = {
  title: 'Thermal limits of larvae',
  author: [{ family: 'Navas', given: 'C. A.' }],
  issued: { 'date-parts': [[2019]] },
  'container-title': 'Journal of Thermal Biology',
}

describe('a reference in words', () => {
  it('keeps its parts apart', () => {
    expect(
      write({ csl: { ...csl, volume: '82', page: '43-51' }, doi: '10.1016/j.jtherbio.2019.03.010' }),
    ).toBe(
      'Navas, C. A. (2019) Thermal limits of larvae. Journal of Thermal Biology 82: 43–51. doi:10.1016/j.jtherbio.2019.03.010',
    )
  })

  it('ends the container with a full stop where no volume follows', () => {
    expect(write({ csl })).toBe('Navas, C. A. (2019) Thermal limits of larvae. Journal of Thermal Biology.')
  })

  it('shows printed words as they are', () => {
    expect(write({ csl: {}, asPrinted: 'Brattstrom 1965, Am. Midl. Nat. 73: 376' })).toBe(
      'Brattstrom 1965, Am. Midl. Nat. 73: 376.',
    )
  })
})
