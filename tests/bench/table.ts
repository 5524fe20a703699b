/** One measured line. `isMet` is null where no bar is set and the figure is for information. */
export interface Figure {
  what: string
  measured: string
  /** What it is a ratio of, or empty. */
  beside: string
  bar: string
  isMet: boolean | null
}

const HEADS = ['what', 'measured', 'beside', 'bar', 'verdict'] as const

function describeVerdict(isMet: boolean | null): string {
  if (isMet === null) return '–'
  return isMet ? 'met' : 'NOT MET'
}

/** The figures as a table of plain text, a line each. */
export function writeTable(figures: readonly Figure[]): string {
  const rows = [
    [...HEADS],
    ...figures.map((figure) => [
      figure.what,
      figure.measured,
      figure.beside,
      figure.bar,
      describeVerdict(figure.isMet),
    ]),
  ]
  const widths = HEADS.map((_, column) => Math.max(...rows.map((row) => row[column]?.length ?? 0)))
  const lines = rows.map((row) =>
    row
      .map((cell, column) => cell.padEnd(widths[column] ?? 0))
      .join('  ')
      .trimEnd(),
  )
  const rule = widths.map((width) => '-'.repeat(width)).join('  ')
  return [lines[0], rule, ...lines.slice(1)].join('\n')
}
