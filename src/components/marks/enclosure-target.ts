import type { Standing } from '../../../shared/checker/verdict.js'
import type { Parameter, Position } from '../../../shared/ranges.js'

/** One number to aim for at a position, as it is written in the drawing and read aloud. */
export interface TargetLine {
  parameter: Parameter
  /** "40 – 46 °C" */
  text: string
  /** "temperature 40 to 46 °C" */
  spoken: string
  /** The mark of a reading that was held against it; null without one. */
  standing: Standing | null
}

/** What one position should read, with the place on the page that says more. */
export interface EnclosureTarget {
  position: Position
  lines: TargetLine[]
  /** Address on the same page: `#range-…`. */
  address: string
}
