import { expect, it } from 'vitest'
import { normaliseConservation } from '../../../seeds/names/conservation.js'

it.each([
  ['Least Concern (LC)', 'Least Concern'],
  ['Least Concern', 'Least Concern'],
  ['Critically Endangered (CR)', 'Critically Endangered'],
  ['Extinct in the Wild', 'Extinct in the Wild'],
  ['Least Concern (LC) - Provisional', 'Least Concern'],
  ['', null],
])('writes the conservation category “%s” as %s', (printed, category) => {
  expect(normaliseConservation(printed)).toBe(category)
})
