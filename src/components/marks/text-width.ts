/** Widths of Fira Sans characters by group, in em. Measured once from the shipped font; what is missing counts as a wide letter. */
const NARROW = new Set("iljI.,:;'’|!()[] ")
const WIDE = new Set('mwMW@%—±')
const DIGITS = /^[0-9–−+°/-]$/
const CAPITAL = /^\p{Lu}$/u

function characterWidth(character: string): number {
  if (character === ' ' || character === '\u00a0') return 0.27
  if (NARROW.has(character)) return 0.3
  if (WIDE.has(character)) return 0.9
  if (DIGITS.test(character)) return 0.58
  if (CAPITAL.test(character)) return 0.66
  return 0.56
}

/** How wide a text is set, in the unit of `fontSize`: an estimate that errs on the wide side, so that labels keep clear. */
export function estimateTextWidth(text: string, fontSize: number, isBold = false): number {
  const em = [...text].reduce((sum, character) => sum + characterWidth(character), 0)
  return em * fontSize * (isBold ? 1.05 : 1)
}
