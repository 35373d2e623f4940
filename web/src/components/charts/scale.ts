/** Axes as plain functions: geometry first, drawing after. */
export interface AxisScale {
  kind: 'log' | 'linear'
  domain: readonly [number, number]
  range: readonly [number, number]
}

/** Position of a value; NaN for what a logarithm does not know. */
export function position({ kind, domain, range }: AxisScale, value: number): number {
  const [from, to] = kind === 'log' ? [Math.log(domain[0]), Math.log(domain[1])] : domain
  const at = kind === 'log' ? Math.log(value) : value
  return range[0] + ((at - from) / (to - from)) * (range[1] - range[0])
}

/** The value at a position. */
export function valueAt({ kind, domain, range }: AxisScale, at: number): number {
  const share = (at - range[0]) / (range[1] - range[0])
  if (kind === 'linear') return domain[0] + share * (domain[1] - domain[0])
  return Math.exp(Math.log(domain[0]) + share * Math.log(domain[1] / domain[0]))
}

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
  const rough = (high - low) / wanted
  const power = 10 ** Math.floor(Math.log10(rough))
  const step = [1, 2, 2.5, 5, 10].find((factor) => factor * power >= rough)! * power
  const ticks: Tick[] = []
  for (let k = Math.ceil(low / step - 1e-9); k * step <= high + 1e-9 * step; k++)
    ticks.push({ value: Number((k * step).toPrecision(12)), major: true })
  return ticks
}
