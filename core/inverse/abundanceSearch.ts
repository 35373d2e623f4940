/** Where an abundance equals a target, as a function of one number in a bracket. */
import { ConvergenceError } from '../numerics/convergence.ts'
import type { Steps } from '../steps/steps.ts'
import { InputError } from '../wire/fault.ts'
import { levelSearch } from './levelSearch.ts'

/** Points of the scan per decade, and at least. */
const PER_DECADE = 8
const FEWEST = 40

/** Error allowed in ln of a solution; the abundance itself is good to about 1e-8. */
const TOLERANCE = 1e-10

/** |ln(Ωh²/target)| at a solution. Where the abundance leaps over the target, as in a bath of steps, it stays larger. */
const REACHED = 1e-6

/** Scatter of ln Ωh² between neighbouring inputs. */
const NOISE = 1e-7

/** An abundance tried. */
export interface Tried {
  value: number
  /** NaN where the value is not allowed or the abundance does not converge. */
  omegaH2: number
}

export interface Found {
  solutions: number[]
  /** Where the abundance leaps over the target. */
  leaps: number[]
  /** The scan of the bracket, ascending. */
  tried: Tried[]
  /** Why there is no abundance, by value. */
  complaints: ReadonlyMap<number, InputError | ConvergenceError>
}

/** The coordinate in which the number is scanned: its logarithm, or itself where it need not be positive. */
function scaleOf([low, high]: readonly [number, number]) {
  if (low <= 0)
    return {
      valueOf: (at: number) => at,
      low,
      high,
      stretches: 2 * FEWEST,
      tolerance: TOLERANCE * (high - low),
    }
  const [from, to] = [Math.log(low), Math.log(high)]
  // The ends themselves, not what rounding makes of them: beyond an end may be forbidden.
  const valueOf = (at: number): number => (at <= from ? low : at >= to ? high : Math.exp(at))
  const stretches = Math.max(FEWEST, Math.ceil(Math.log10(high / low) * PER_DECADE))
  return { valueOf, low: from, high: to, stretches, tolerance: TOLERANCE }
}

/** @param omegaH2At the abundance; what it refuses or does not reach is a gap in the bracket */
export function* abundanceSearch(
  omegaH2At: (value: number) => number,
  target: number,
  bracket: readonly [number, number],
): Steps<Found> {
  const scale = scaleOf(bracket)
  const complaints = new Map<number, InputError | ConvergenceError>()
  const f = (at: number): number => {
    const value = scale.valueOf(at)
    try {
      return Math.log(omegaH2At(value) / target)
    } catch (error) {
      if (!(error instanceof InputError || error instanceof ConvergenceError)) throw error
      complaints.set(value, error)
      return NaN
    }
  }
  const { roots, leaps, samples } = yield* levelSearch({
    ...scale,
    f,
    reached: REACHED,
    noise: NOISE,
  })
  return {
    solutions: roots.map(scale.valueOf),
    leaps: leaps.map(scale.valueOf),
    tried: samples.map(({ at, value }) => ({ value: scale.valueOf(at), omegaH2: target * Math.exp(value) })),
    complaints,
  }
}

/** The abundance tried that came nearest to the target in its logarithm; null when there is none. */
export function nearest(tried: readonly Tried[], target: number): Tried | null {
  const distance = ({ omegaH2 }: Tried): number => Math.abs(Math.log(omegaH2 / target))
  return lowestBy(tried, distance)
}

/** The abundance tried of the least measure; null when there is none. */
export function lowestBy(tried: readonly Tried[], measure: (tried: Tried) => number): Tried | null {
  return tried.reduce<Tried | null>((best, each) => {
    if (Number.isNaN(each.omegaH2)) return best
    return best === null || measure(each) < measure(best) ? each : best
  }, null)
}
