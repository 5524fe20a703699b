const PLAIN_DECIMAL = /^([+\-−–]?)(\d+)(?:[.,](\d+))?$/

/** The value of a number as printed, a decimal comma and a typographic minus understood; null for anything but a plain number. */
export function parsePrintedNumber(printed: string): number | null {
  const match = PLAIN_DECIMAL.exec(printed.trim())
  if (match === null) return null
  const [, sign, whole, fraction] = match
  const size = Number(`${whole}.${fraction ?? '0'}`)
  return sign === '' || sign === '+' ? size : -size
}

/** How many decimals a number is printed with; null for anything but a plain number. */
export function countPrintedDecimals(printed: string): number | null {
  const match = PLAIN_DECIMAL.exec(printed.trim())
  return match === null ? null : (match[3]?.length ?? 0)
}
