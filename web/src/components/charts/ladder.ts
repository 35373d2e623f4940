/** The geometry of the factor ladder: running products from the baseline to this history. */
import { logTicks } from './scale.ts'

export interface Factor {
  label: string
  /** Null where a mixed history could not be computed. */
  factor: number | null
}

/** One rung: from one running product to the next; a factor that is not known leaves it where it was. */
export interface Rung extends Factor {
  from: number
  to: number
}

export function rungs(baseline: number, factors: readonly Factor[]): Rung[] {
  let at = baseline
  return factors.map(({ label, factor }) => {
    const from = at
    at *= factor ?? 1
    return { label, factor, from, to: at }
  })
}

/** Least room on either side of the outermost value, as a factor. */
const LEAST_ROOM = 1.25

/** A logarithmic domain that holds every value with room on both sides; a decade about one if there is none to hold. */
export function ladderDomain(values: readonly number[]): [number, number] {
  const drawn = values.filter((value) => value > 0 && value < Infinity)
  if (drawn.length === 0) return [10 ** -0.5, 10 ** 0.5]
  const low = Math.min(...drawn)
  const high = Math.max(...drawn)
  const room = Math.max(LEAST_ROOM, (high / low) ** 0.18)
  return [low / room, high * room]
}

/** Values labelled beneath, at most about `most`: 1, 2, 5 of each decade while they are few, else powers of ten, or round values where neither fits. */
export function ladderTicks(domain: readonly [number, number], most: number): number[] {
  const ticks = logTicks(domain, most)
  const round = ticks.filter(({ value }) => /^[125]e/.test(value.toExponential()))
  const chosen = round.length >= 2 && round.length <= most ? round : ticks.filter((tick) => tick.major)
  return chosen.map((tick) => tick.value)
}
