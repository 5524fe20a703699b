import { expect, test } from 'vitest'
import { toSlug } from '../../shared/slugs.js'

test.each([
  ['Pogona vitticeps', 'pogona-vitticeps'],
  ['Thamnophis sirtalis sirtalis', 'thamnophis-sirtalis-sirtalis'],
  ['Ambystoma  "jeffersonianum"-complex', 'ambystoma-jeffersonianum-complex'],
  ['Liolaemus müelleri', 'liolaemus-muelleri'],
  [' Rana (Hylarana) cf. nicobariensis ', 'rana-hylarana-cf-nicobariensis'],
  ['???', ''],
])('the slug of %j is %j', (name, slug) => {
  expect(toSlug(name)).toBe(slug)
})
