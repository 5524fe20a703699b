import { expect, it } from 'vitest'
import * as policy from '../../../shared/lints/policy.js'

it('the method lists every number of the lints that is our policy, once, with a reason', () => {
  const { LINT_POLICY_NUMBERS: listed, ...numbers } = policy
  expect(listed.map(({ value }) => value).toSorted((a, b) => a - b)).toEqual(
    Object.values(numbers).toSorted((a, b) => a - b),
  )
  for (const { reason, id } of listed) expect(reason, id).toMatch(/\.$/)
})
