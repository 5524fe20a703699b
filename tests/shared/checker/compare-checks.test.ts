import { expect, it } from 'vitest'
import { checkReadings } from '../../../shared/checker/check-readings.js'
import { listChangedVerdicts } from '../../../shared/checker/compare-checks.js'
import { makeCheckInput, makeCheckPage, makeReading } from '../../helpers/check-page.js'
import { makeRange } from '../../helpers/page-content.js'

const input = makeCheckInput([
  makeReading({ values: [30] }),
  makeReading({ values: [30], position: 'warm-hide' }),
  makeReading({ values: [30], position: 'cool-hide' }),
])
const hide = makeRange('hide', { position: 'warm-hide', low: 26, high: 34 })

function checkWith(low: number, upperLimit: number | null) {
  const ranges = [
    makeRange('air', { low, high: 40 }),
    hide,
    makeRange('cool', { position: 'cool-hide', upperLimit }),
  ]
  return checkReadings(makeCheckPage({ ranges }), input)
}

it('lists the readings that a newer revision answers otherwise, by range or by limit', () => {
  expect(listChangedVerdicts(checkWith(26, null), checkWith(35, null))).toEqual([0])
  expect(listChangedVerdicts(checkWith(26, 40), checkWith(26, 28))).toEqual([2])
  expect(listChangedVerdicts(checkWith(26, null), checkWith(25, null))).toEqual([])
})
