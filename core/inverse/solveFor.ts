/**
 * The inverse question: for which value of one number does Ωh² equal the target? All solutions in a bracket: the abundance is
 * scanned evenly in the logarithm, every change of sign is closed in on, and where it comes near the target without crossing,
 * the turning point is looked at too, so that two solutions close together are both found.
 */
import { abundance } from '../abundance/abundance.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { brentSearch } from '../numerics/roots/brent.ts'
import type { Sample } from '../numerics/roots/brent.ts'
import { complete, part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { VariedInput } from '../variation/variedInput.ts'
import { InputError, parseInput } from '../wire/fault.ts'
import { solveRequest } from '../wire/inverse.ts'
import type { SolveRequest, SolveResult } from '../wire/inverse.ts'
import { usualBracket } from './brackets.ts'

/** Points of the scan per decade, and at least. */
const PER_DECADE = 8
const FEWEST = 40

/** Error allowed in ln of a solution; the abundance itself is good to about 1e-8. */
const TOLERANCE = 1e-10

/** |ln(Ωh²/target)| at a solution. */
const REACHED = 1e-6

/** Golden-section steps that narrow a turning point by 1e-4. */
const TURNING_STEPS = 20
const GOLDEN = (Math.sqrt(5) - 1) / 2

/** ln(Ωh²/target) at ln p; NaN where the input is not allowed or does not converge. */
type Excess = (lnValue: number) => number

function excessOf(request: SolveRequest): {
  excess: Excess
  complaint: () => Error | null
  refused: () => number
} {
  const varied = new VariedInput({ history: request.history, candidate: request.candidate }, [
    request.solveFor,
  ])
  let complaint: Error | null = null
  let refused = 0
  const excess = (lnValue: number): number => {
    try {
      const { history, candidate } = varied.at([Math.exp(lnValue)])
      return Math.log(abundance(history, candidate).omegaH2 / request.targetOmegaH2)
    } catch (error) {
      if (!(error instanceof InputError || error instanceof ConvergenceError)) throw error
      complaint ??= error
      refused++
      return NaN
    }
  }
  return { excess, complaint: () => complaint, refused: () => refused }
}

function* scan(excess: Excess, low: number, high: number): Steps<Sample[]> {
  const points = Math.max(FEWEST, Math.ceil(((high - low) / Math.LN10) * PER_DECADE))
  const samples: Sample[] = []
  for (let i = 0; i <= points; i++) {
    const at = low + ((high - low) * i) / points
    samples.push({ at, value: excess(at) })
    yield { done: i + 1, of: points + 1 }
  }
  return samples
}

/** The extreme of the excess towards zero between two samples, by golden section. */
function* turningPoint(excess: Excess, low: number, high: number, sign: number): Steps<Sample> {
  let [a, b] = [low, high]
  for (let i = 0; i < TURNING_STEPS; i++) {
    const [left, right] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)]
    if (sign * excess(left) < sign * excess(right)) b = right
    else a = left
    yield { done: i + 1, of: TURNING_STEPS + 1 }
  }
  const at = (a + b) / 2
  return { at, value: excess(at) }
}

/** The samples, and between three that bend towards the target without reaching it, their turning point. */
function* withTurningPoints(excess: Excess, samples: readonly Sample[]): Steps<Sample[]> {
  const all = [...samples]
  for (let i = 1; i + 1 < samples.length; i++) {
    const [before, here, after] = [samples[i - 1]!, samples[i]!, samples[i + 1]!]
    const sign = Math.sign(here.value)
    const bends = sign * here.value < sign * before.value && sign * here.value <= sign * after.value
    const oneSide = Math.sign(before.value) === sign && Math.sign(after.value) === sign
    if (bends && oneSide)
      all.push(yield* part(turningPoint(excess, before.at, after.at, sign), i, 1, samples.length))
  }
  return all.sort((a, b) => a.at - b.at)
}

/** ln p of every solution between neighbouring samples, ascending. */
function* crossings(excess: Excess, samples: readonly Sample[]): Steps<number[]> {
  const solutions: number[] = []
  const of = samples.length
  for (let i = 0; i < of; i++) {
    const [a, b] = [samples[i]!, samples[i + 1]]
    if (a.value === 0) solutions.push(a.at)
    else if (b && a.value * b.value < 0) {
      const search = brentSearch(a, b, TOLERANCE)
      let next = search.next()
      while (!next.done) {
        next = search.next(excess(next.value))
        yield { done: i, of }
      }
      // Where the abundance leaps over the target, as in a bath of steps, there is a change of sign and no solution.
      if (Math.abs(excess(next.value)) < REACHED) solutions.push(next.value)
    }
  }
  return solutions
}

/** Shares of the scan, the turning points and the crossings in the progress told: about those of the time. */
const SHARES = [70, 15, 15] as const
const WHOLE = SHARES[0] + SHARES[1] + SHARES[2]

/** Solves a parsed request. @throws InputError when no value in the bracket makes a valid input */
export function* solveForSteps(request: SolveRequest): Steps<SolveResult> {
  const searched = request.between ?? usualBracket(request.solveFor)
  const { excess, complaint, refused } = excessOf(request)
  const ends = [Math.log(searched[0]), Math.log(searched[1])] as const
  const coarse = yield* part(scan(excess, ...ends), 0, SHARES[0], WHOLE)
  const known = coarse.filter((sample) => Number.isFinite(sample.value))
  if (known.length === 0) throw complaint()
  const samples = yield* part(withTurningPoints(excess, coarse), SHARES[0], SHARES[1], WHOLE)
  const roots = yield* part(crossings(excess, samples), SHARES[0] + SHARES[1], SHARES[2], WHOLE)
  const nearest = known.reduce((best, sample) =>
    Math.abs(sample.value) < Math.abs(best.value) ? sample : best,
  )
  return {
    solutions: roots.map(Math.exp),
    searched: [searched[0], searched[1]],
    targetOmegaH2: request.targetOmegaH2,
    closest:
      roots.length > 0
        ? null
        : { value: Math.exp(nearest.at), omegaH2: request.targetOmegaH2 * Math.exp(nearest.value) },
    notComputable: refused(),
  }
}

/** The same from the wire. */
export function* solveSteps(input: unknown): Steps<SolveResult> {
  return yield* solveForSteps(parseInput(solveRequest, input))
}

export const computeSolve = (input: unknown): SolveResult => complete(solveSteps(input))
