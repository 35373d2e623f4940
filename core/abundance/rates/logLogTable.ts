/** A table of positive numbers joined by straight lines in the logarithms. */
export interface LogLogTable {
  readonly lnX: Float64Array
  readonly lnY: Float64Array
}

/** @param points [x, y] with x ascending and both positive */
export function logLogTable(points: readonly (readonly [number, number])[]): LogLogTable {
  return {
    lnX: Float64Array.from(points, (point) => Math.log(point[0])),
    lnY: Float64Array.from(points, (point) => Math.log(point[1])),
  }
}

/** Room for rounding at the ends of the table. */
const ROUNDING = 1e-14

/** ln y at ln x by the line through the neighbours; the end lines go on outside. */
function along({ lnX, lnY }: LogLogTable, at: number): number {
  let i = 0
  while (i < lnX.length - 2 && at > lnX[i + 1]!) i++
  const share = (at - lnX[i]!) / (lnX[i + 1]! - lnX[i]!)
  return lnY[i]! + share * (lnY[i + 1]! - lnY[i]!)
}

/** The interpolated value, zero outside the table. */
export function zeroOutside(table: LogLogTable, x: number): number {
  const at = Math.log(x)
  const size = ROUNDING * Math.max(1, Math.abs(at))
  return at < table.lnX[0]! - size || at > table.lnX.at(-1)! + size ? 0 : Math.exp(along(table, at))
}

/** The interpolated value, the end value held outside the table. */
export function heldOutside(table: LogLogTable, x: number): number {
  const at = Math.min(Math.max(Math.log(x), table.lnX[0]!), table.lnX.at(-1)!)
  return Math.exp(along(table, at))
}
