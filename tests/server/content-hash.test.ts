import { createHash } from 'node:crypto'
import { expect, test } from 'vitest'
import { hashContent } from '../../server/content-hash.js'

function sha256(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex')
}

test('a content hash is that of the canonical form that RFC 8785 gives for its sample object', () => {
  // RFC 8785, section 3.2.2 (input) and section 3.2.3 (canonical form).
  const input: unknown = JSON.parse(String.raw`{
    "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
    "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
    "literals": [null, true, false]
  }`)
  const canonical =
    '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
    '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}'
  expect(hashContent(input)).toBe(sha256(canonical))
})

test('a content hash sorts keys by UTF-16 code units, as the sample of RFC 8785 section 3.2.3 does', () => {
  const input = {
    '\u20ac': 'Euro Sign',
    '\r': 'Carriage Return',
    '\ufb33': 'Hebrew Letter Dalet With Dagesh',
    '1': 'One',
    '\ud83d\ude00': 'Emoji: Grinning Face',
    '\u0080': 'Control',
    '\u00f6': 'Latin Small Letter O With Diaeresis',
  }
  const canonical =
    '{"\\r":"Carriage Return","1":"One","\u0080":"Control","ö":"Latin Small Letter O With Diaeresis",' +
    '"€":"Euro Sign","\ud83d\ude00":"Emoji: Grinning Face","\ufb33":"Hebrew Letter Dalet With Dagesh"}'
  expect(hashContent(input)).toBe(sha256(canonical))
})

test('what is no JSON value has no content hash', () => {
  expect(() => hashContent(undefined)).toThrow(TypeError)
  expect(() => hashContent(Number.NaN)).toThrow()
})
