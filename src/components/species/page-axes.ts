import { toReaderUnit, type ReaderUnits } from '../../../shared/format.js'
import { toStatedInterval } from '../../../shared/evidence-votes.js'
import type { Parameter, RangeRow } from '../../../shared/ranges.js'
import type { CitedRange } from '../../../shared/species.js'
import { fromCanonical } from '../../../shared/units.js'
import { chooseAxis, type Axis } from '../marks/axis.js'

const isNumber = (value: number | null | undefined): value is number => value !== null && value !== undefined

function numbersOf({ row, evidence }: CitedRange): number[] {
  const own = [row.low, row.high, row.lowerLimit, row.upperLimit]
  const stated = evidence.flatMap((item) => {
    const interval = toStatedInterval(item.row)
    return [interval?.low, interval?.high]
  })
  return [...own, ...stated].filter(isNumber)
}

/** The reader's unit of a range row. */
export function unitOf(row: RangeRow, units: ReaderUnits) {
  return toReaderUnit(row.typedUnit, units)
}

/**
 * One axis for all rows of a parameter on a page, in the reader's unit, so that rows can be compared down the page and
 * the picture does not jump when the stage or the lights are switched.
 */
export function chooseParameterAxis(
  ranges: readonly CitedRange[],
  parameter: Parameter,
  units: ReaderUnits,
): Axis {
  const ofParameter = ranges.filter(({ row }) => row.parameter === parameter)
  const [first] = ofParameter
  const unit = first === undefined ? units.temperature : unitOf(first.row, units)
  return chooseAxis(
    ofParameter.flatMap(numbersOf).map((value) => fromCanonical(value, unit)),
    unit,
  )
}

/** A near look at one range with its evidence. */
export function chooseRangeAxis(range: CitedRange, units: ReaderUnits): Axis {
  const unit = unitOf(range.row, units)
  return chooseAxis(
    numbersOf(range).map((value) => fromCanonical(value, unit)),
    unit,
    true,
  )
}
