import { darkColours, fontFamily, lightColours, sizeTokens, type ColourTokens } from './tokens.js'

/** `strawWash` becomes `--straw-wash`. */
function toCustomProperty(name: string): string {
  return `--${name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`)}`
}

function toDeclarations(tokens: object): string {
  return Object.entries(tokens)
    .map(([name, value]) => `${toCustomProperty(name)}:${String(value)}`)
    .join(';')
}

function toColourDeclarations(tokens: ColourTokens, scheme: 'light' | 'dark'): string {
  return `color-scheme:${scheme};${toDeclarations(tokens)}`
}

/**
 * The tokens as CSS custom properties. The theme `system` is settled by the style sheet alone, so a page shows its
 * right colours before any script runs. Print is always light.
 */
export function toTokensCss(): string {
  const light = toColourDeclarations(lightColours, 'light')
  const dark = toColourDeclarations(darkColours, 'dark')
  return [
    `:root{--font:${fontFamily};${toDeclarations(sizeTokens)};${light}}`,
    `@media screen{[data-theme=dark]{${dark}}}`,
    `@media screen and (prefers-color-scheme:dark){[data-theme=system]{${dark}}}`,
  ].join('\n')
}
