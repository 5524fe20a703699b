import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { darkColours, lightColours, type ColourTokens } from '../../../src/assets/tokens.js'
import { toTokensCss } from '../../../src/assets/tokens-css.js'

const ROOT = join(import.meta.dirname, '../../..')

/** Relative luminance of an sRGB colour, WCAG 2.2, "relative luminance". */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

/** Contrast ratio, WCAG 2.2, "contrast ratio". */
function contrast(one: string, other: string): number {
  const [light = 0, dark = 0] = [luminance(one), luminance(other)].sort((a, b) => b - a)
  return (light + 0.05) / (dark + 0.05)
}

const GROUNDS = ['paper', 'card', 'wash'] as const
const LETTERS = ['ink', 'muted', 'moss', 'ember', 'lagoon', 'iris', 'straw', 'danger'] as const
const WASHES = ['mossWash', 'emberWash', 'lagoonWash', 'irisWash', 'strawWash', 'dangerWash'] as const
const themes: [string, ColourTokens][] = [
  ['light', lightColours],
  ['dark', darkColours],
]

describe.each(themes)('the %s theme', (_name, colours) => {
  it.each(GROUNDS.flatMap((ground) => LETTERS.map((letter) => [letter, ground] as const)))(
    'lets letters in %s be read on %s (WCAG 2.2, 1.4.3)',
    (letter, ground) => {
      expect(contrast(colours[letter], colours[ground])).toBeGreaterThanOrEqual(4.5)
    },
  )

  it.each(WASHES)('lets ink be read on %s', (wash) => {
    expect(contrast(colours.ink, colours[wash])).toBeGreaterThanOrEqual(4.5)
  })

  it('draws the edge of a field so that it can be seen (WCAG 2.2, 1.4.11)', () => {
    expect(contrast(colours.edge, colours.paper)).toBeGreaterThanOrEqual(3)
    expect(contrast(colours.edge, colours.card)).toBeGreaterThanOrEqual(3)
  })
})

describe('the tokens', () => {
  it('are written as custom properties for both themes', () => {
    const css = toTokensCss()
    expect(css).toContain(`--moss-wash:${lightColours.mossWash}`)
    expect(css).toContain(`--moss-wash:${darkColours.mossWash}`)
    expect(css).toContain('[data-theme=system]')
  })

  it('are the only place in the client where a colour is written', () => {
    const files = readdirSync(join(ROOT, 'src'), { recursive: true, encoding: 'utf8' }).filter(
      (file) => /\.(vue|ts|css)$/.test(file) && file !== join('assets', 'tokens.ts'),
    )
    expect(files.length).toBeGreaterThan(40)
    const literal = /#[0-9a-f]{3}(?:[0-9a-f]{1,3}|[0-9a-f]{5})?\b(?![-\w])|\b(?:rgba?|hsla?|oklch|oklab)\(/i
    const found = files.flatMap((file) =>
      readFileSync(join(ROOT, 'src', file), 'utf8')
        .split('\n')
        .flatMap((line, index) => (literal.test(line) ? [`${file}:${index + 1} ${line.trim()}`] : [])),
    )
    expect(found).toEqual([])
  })
})
