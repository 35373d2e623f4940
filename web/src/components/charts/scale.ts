import { Scale } from '@visx/visx'

/** Axes as plain functions: geometry first, drawing after. */
export interface AxisScale {
  kind: 'log' | 'linear'
  domain: readonly [number, number]
  range: readonly [number, number]
}

/** The scale as the drawing library knows it. */
export function visxScale({ kind, domain, range }: AxisScale) {
  const config = { domain: [...domain], range: [...range] }
  return kind === 'log' ? Scale.scaleLog<number>(config) : Scale.scaleLinear<number>(config)
}

/** Position of a value; NaN for what a logarithm does not know. */
export const position = (axis: AxisScale, value: number): number => positions(axis)(value)

/** The same for many values of one axis. */
export function positions(axis: AxisScale): (value: number) => number {
  const scale = visxScale(axis)
  return (value) => (axis.kind === 'log' && !(value > 0) ? NaN : (scale(value) ?? NaN))
}

/** The value at a position. */
export const valueAt = (axis: AxisScale, at: number): number => Number(visxScale(axis).invert(at))

/** Whether a position lies in a range, given in either direction, to half a pixel. */
export const inside = (at: number, [a, b]: readonly [number, number]): boolean =>
  at >= Math.min(a, b) - 0.5 && at <= Math.max(a, b) + 0.5

export interface Tick {
  value: number
  /** Minor ticks carry no label. */
  major: boolean
}

/** Fewer labels than this do not tell what an axis measures. */
const FEWEST = 2

/**
 * Ticks of a logarithmic axis. Powers of ten carry labels, thinned to about `most`; the digits between are minor.
 * Where hardly a power of ten fits, 2 and 5 carry labels too, and in a narrower domain still, round values.
 * Empty where a logarithm has no meaning.
 */
export function logTicks(domain: readonly [number, number], most: number): Tick[] {
  const low = Math.min(...domain)
  const high = Math.max(...domain)
  if (!(low > 0 && high < Infinity)) return []
  const ticks = decades(low, high, most)
  if (ticks.filter((tick) => tick.major).length >= FEWEST) return ticks
  const labelled = ticks.map(({ value }) => ({ value, major: /^[125]e/.test(value.toExponential()) }))
  if (labelled.filter((tick) => tick.major).length >= FEWEST) return labelled
  return linearTicks([low, high], Math.max(FEWEST, Math.min(most, 4)))
}

function decades(low: number, high: number, most: number): Tick[] {
  const first = Math.ceil(Math.log10(low) - 1e-9)
  const last = Math.floor(Math.log10(high) + 1e-9)
  const every = Math.max(1, Math.ceil((last - first + 1) / Math.max(1, most)))
  const ticks: Tick[] = []
  for (let power = first - 1; power <= last; power++) {
    if (power >= first) ticks.push({ value: Number(`1e${power}`), major: power % every === 0 })
    if (every > 1) continue
    for (let digit = 2; digit <= 9; digit++) {
      const value = Number(`${digit}e${power}`)
      if (value >= low && value <= high) ticks.push({ value, major: false })
    }
  }
  return ticks
}

/** Round values inside a domain, about `wanted` of them; none in an empty domain. */
export function linearTicks(domain: readonly [number, number], wanted: number): Tick[] {
  const [low, high] = domain
  if (!(high > low && high - low < Infinity)) return []
  const scale = Scale.scaleLinear<number>({ domain: [low, high], range: [0, 1] })
  return scale.ticks(wanted).map((value) => ({ value, major: true }))
}
