/** A table of positive numbers joined by straight lines in the logarithms. */
import { IntervalLookup } from '../../numerics/interpolation/intervalLookup.ts'

export interface LogLogTable {
  readonly lnX: Float64Array
  readonly lnY: Float64Array
  readonly intervals: IntervalLookup
}

/** @param points [x, y] with x ascending and both positive */
export function logLogTable(points: readonly (readonly [number, number])[]): LogLogTable {
  const lnX = Float64Array.from(points, (point) => Math.log(point[0]))
  const lnY = Float64Array.from(points, (point) => Math.log(point[1]))
  return { lnX, lnY, intervals: new IntervalLookup(lnX) }
}

/** The interpolated value, the end value held outside the table. */
export function heldOutside({ lnX, lnY, intervals }: LogLogTable, x: number): number {
  const at = Math.min(Math.max(Math.log(x), lnX[0]!), lnX.at(-1)!)
  const i = intervals.find(at)
  const share = (at - lnX[i]!) / (lnX[i + 1]! - lnX[i]!)
  return Math.exp(lnY[i]! + share * (lnY[i + 1]! - lnY[i]!))
}
