import { describe, expect, it } from 'vitest'
import { countPrintedDecimals, parsePrintedNumber } from '../../shared/printed-numbers.js'

describe('a printed number', () => {
  it.each([
    ['32', 32, 0],
    [' 32.50 ', 32.5, 2],
    ['32,5', 32.5, 1],
    ['−4.25', -4.25, 2],
    ['+7', 7, 0],
  ])('"%s" is %d with %d decimals', (printed, value, decimals) => {
    expect(parsePrintedNumber(printed)).toBe(value)
    expect(countPrintedDecimals(printed)).toBe(decimals)
  })

  it.each(['', 'thirty', '30–32', '3e1', '.', '5.'])('"%s" is not a plain number', (printed) => {
    expect(parsePrintedNumber(printed)).toBeNull()
    expect(countPrintedDecimals(printed)).toBeNull()
  })
})
