import type { Curve } from '#core/bench/types'
import { positions } from './scale.ts'
import type { AxisScale } from './scale.ts'

/** A stretch of a curve without gaps, in pixels. */
export type Stretch = [x: number, y: number][]

/** Far outside the frame a line is only in the way of the renderer. */
const FARTHEST = 4000

/** The stretches of a curve, cut where it is not defined, thinned so that no pixel column holds more than its extremes. */
export function stretches({ temperatureGeV, value }: Curve, x: AxisScale, y: AxisScale): Stretch[] {
  const found: Stretch[] = []
  let open: Stretch = []
  const across = positions(x)
  const up = positions(y)
  temperatureGeV.forEach((temperature, i) => {
    const at = across(temperature)
    const height = up(value[i]!)
    if (Number.isFinite(at) && (Number.isFinite(height) || value[i] === 0)) {
      const bounded = Number.isFinite(height) ? height : y.range[0] + FARTHEST
      open.push([at, Math.max(-FARTHEST, Math.min(FARTHEST, bounded))])
    } else if (open.length > 0) {
      found.push(open)
      open = []
    }
  })
  if (open.length > 0) found.push(open)
  return found.map(thinned)
}

/** Keeps first, lowest, highest and last of every pixel column. */
export function thinned(points: Stretch): Stretch {
  const kept: Stretch = []
  let column: Stretch = []
  const flush = (): void => {
    if (column.length <= 4) kept.push(...column)
    else {
      const indices = new Set([0, column.length - 1])
      const heights = column.map((point) => point[1])
      indices.add(heights.indexOf(Math.min(...heights)))
      indices.add(heights.indexOf(Math.max(...heights)))
      kept.push(...[...indices].sort((a, b) => a - b).map((i) => column[i]!))
    }
    column = []
  }
  for (const point of points) {
    if (column.length > 0 && Math.floor(point[0]) !== Math.floor(column[0]![0])) flush()
    column.push(point)
  }
  flush()
  return kept
}

/** SVG path data of the stretches. */
export const pathData = (parts: readonly Stretch[]): string =>
  parts
    .map((points) =>
      points.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`).join(''),
    )
    .join('')

/** The value of a curve at a temperature, by the line between its neighbours in ln T; NaN outside. */
export function valueAtTemperature({ temperatureGeV, value }: Curve, at: number): number {
  for (let i = 1; i < temperatureGeV.length; i++) {
    const hot = temperatureGeV[i - 1]!
    const cold = temperatureGeV[i]!
    if (at > hot || at < cold) continue
    // A neighbour that is not defined must not take the known point with it.
    if (at === hot) return value[i - 1]!
    if (at === cold) return value[i]!
    const share = Math.log(at / hot) / Math.log(cold / hot)
    return value[i - 1]! + share * (value[i]! - value[i - 1]!)
  }
  return NaN
}
