import { expect, it } from 'vitest'
import { FORMULAS, POLICY_NUMBERS } from '../../../shared/checker/method.js'
import * as policy from '../../../shared/checker/policy.js'

it('the method lists every number that is our policy, once, with a reason', () => {
  const listed = POLICY_NUMBERS.map(({ value }) => value).toSorted((a, b) => a - b)
  expect(listed).toEqual(Object.values(policy).toSorted((a, b) => a - b))
  for (const { reason, id } of POLICY_NUMBERS) expect(reason, id).toMatch(/\.$/)
})

it('the method gives every formula a source', () => {
  for (const { source, formula, id } of FORMULAS) {
    expect(source, id).not.toBe('')
    expect(formula, id).not.toMatch(/undefined|NaN/)
  }
  expect(new Set(FORMULAS.map(({ id }) => id)).size).toBe(FORMULAS.length)
})
