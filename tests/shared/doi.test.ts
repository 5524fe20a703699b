import { expect, test } from 'vitest'
import { toDoiKey } from '../../shared/doi.js'

test.each([
  ['10.1016/J.JTHERBIO.2019.03.010', '10.1016/j.jtherbio.2019.03.010'],
  ['https://doi.org/10.5061/dryad.1cv08', '10.5061/dryad.1cv08'],
  ['http://dx.doi.org/10.1038/sdata.2018.22', '10.1038/sdata.2018.22'],
  ['doi: 10.1038/s41597-024-03079-5 ', '10.1038/s41597-024-03079-5'],
  [
    '10.1002/(SICI)1097-010X(19990901)284:4<430::AID-JEZ9>3.0.CO;2-3',
    '10.1002/(sici)1097-010x(19990901)284:4<430::aid-jez9>3.0.co;2-3',
  ],
])('%j is compared as %j', (text, key) => {
  expect(toDoiKey(text)).toBe(key)
})

test.each([null, '', 'NA', 'Brattstrom 1968', '10.1016', '10.1016/', 'https://example.org/10.1016/x'])(
  '%j is no DOI',
  (text) => {
    expect(toDoiKey(text)).toBeNull()
  },
)
