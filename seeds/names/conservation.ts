/**
 * A conservation category in the words of its name alone: "Least Concern (LC)" and "Least Concern" are one category.
 * Null when the dataset gives none.
 */
export function normaliseConservation(printed: string): string | null {
  const category = printed
    .replace(/\([A-Z]{2}\)/, '')
    .replace(/ - Provisional$/i, '')
    .replace(/\s+/g, ' ')
    .trim()
  return category === '' ? null : category
}
