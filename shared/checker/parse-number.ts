/** Longest text of a number a form takes. */
export const NUMBER_TEXT_LENGTH_MAX = 30

export type ParsedNumber = { form: 'missing' } | { form: 'not-a-number' } | { form: 'number'; value: number }

/**
 * A number as a person types it: decimal point or comma ("38,5"), an optional sign (the typographic minus too). Empty is
 * missing, never zero; groups of thousands, units and exponents are not numbers here, because guessing them is how a wrong
 * value becomes a right-looking one.
 */
export function parseNumber(text: string): ParsedNumber {
  const trimmed = text.trim()
  if (trimmed === '') return { form: 'missing' }
  if (trimmed.length > NUMBER_TEXT_LENGTH_MAX || !/^[-+−]?(?:\d+(?:[.,]\d*)?|[.,]\d+)$/.test(trimmed)) {
    return { form: 'not-a-number' }
  }
  return { form: 'number', value: Number(trimmed.replace('−', '-').replace(',', '.')) }
}
