import { expect, test } from 'vitest'
import { findCitedSources } from '../../shared/prose-citations.js'

const A = '0a1b2c3d-0000-4000-8000-000000000001'
const B = '0a1b2c3d-0000-4000-8000-000000000002'

test('the sources a text cites are found once each, with or without a locator', () => {
  const text = `Basks at noon [@${B}, p. 4; table 2]. Hides [@${A.toUpperCase()}] and basks [@${B}].`
  expect(findCitedSources(text)).toEqual([B, A])
})

test.each(['Nothing is cited.', '[@not-an-id]', `[@${A}`, `@${A}`, `[${A}]`])(
  '%j cites no source',
  (text) => {
    expect(findCitedSources(text)).toEqual([])
  },
)
