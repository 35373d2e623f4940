/**
 * The inverse question: for which value of one number does Ωh² equal the target? All solutions in a bracket: the abundance is
 * scanned evenly in the logarithm, every change of sign is closed in on, and where it comes near the target without crossing,
 * the turning point is looked at too, so that two solutions close together are both found.
 */
import { abundance } from '../abundance/abundance.ts'
import { buildHistory } from '../history/thermalHistory.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { brent } from '../numerics/roots/brent.ts'
import { abundanceRequest } from '../wire/compute.ts'
import { InputError, parseInput } from '../wire/fault.ts'
import { solveRequest } from '../wire/inverse.ts'
import type { SolveRequest, SolveResult } from '../wire/inverse.ts'
import { usualBracket } from './brackets.ts'
import { readPath, substitute } from './substitute.ts'

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

interface Sample {
  at: number
  excess: number
}

function excessOf(request: SolveRequest): {
  excess: Excess
  complaint: () => Error | null
  refused: () => number
} {
  const path = readPath(request.solveFor)
  const inputs = { history: request.history, candidate: request.candidate }
  let complaint: Error | null = null
  let refused = 0
  const excess = (lnValue: number): number => {
    try {
      const { history, candidate } = parseInput(abundanceRequest, substitute(inputs, path, Math.exp(lnValue)))
      return Math.log(abundance(buildHistory(history), candidate).omegaH2 / request.targetOmegaH2)
    } catch (error) {
      if (!(error instanceof InputError || error instanceof ConvergenceError)) throw error
      complaint ??= error
      refused++
      return NaN
    }
  }
  return { excess, complaint: () => complaint, refused: () => refused }
}

function scan(excess: Excess, low: number, high: number): Sample[] {
  const points = Math.max(FEWEST, Math.ceil(((high - low) / Math.LN10) * PER_DECADE))
  return Array.from({ length: points + 1 }, (_, i) => {
    const at = low + ((high - low) * i) / points
    return { at, excess: excess(at) }
  })
}

/** The extreme of the excess towards zero between two samples, by golden section. */
function turningPoint(excess: Excess, low: number, high: number, sign: number): Sample {
  let [a, b] = [low, high]
  for (let i = 0; i < TURNING_STEPS; i++) {
    const [left, right] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)]
    if (sign * excess(left) < sign * excess(right)) b = right
    else a = left
  }
  const at = (a + b) / 2
  return { at, excess: excess(at) }
}

/** The samples, and between three that bend towards the target without reaching it, their turning point. */
function withTurningPoints(excess: Excess, samples: readonly Sample[]): Sample[] {
  const all = [...samples]
  for (let i = 1; i + 1 < samples.length; i++) {
    const [before, here, after] = [samples[i - 1]!, samples[i]!, samples[i + 1]!]
    const sign = Math.sign(here.excess)
    const bends = sign * here.excess < sign * before.excess && sign * here.excess <= sign * after.excess
    const oneSide = Math.sign(before.excess) === sign && Math.sign(after.excess) === sign
    if (bends && oneSide) all.push(turningPoint(excess, before.at, after.at, sign))
  }
  return all.sort((a, b) => a.at - b.at)
}

/** Solves a parsed request. @throws InputError when no value in the bracket makes a valid input */
export function solveFor(request: SolveRequest): SolveResult {
  const searched = request.between ?? usualBracket(request.solveFor)
  const { excess, complaint, refused } = excessOf(request)
  const coarse = scan(excess, Math.log(searched[0]), Math.log(searched[1]))
  const known = coarse.filter((sample) => Number.isFinite(sample.excess))
  if (known.length === 0) throw complaint()
  const samples = withTurningPoints(excess, coarse)
  const solutions: number[] = []
  for (let i = 0; i + 1 < samples.length; i++) {
    const [a, b] = [samples[i]!, samples[i + 1]!]
    if (a.excess === 0) solutions.push(Math.exp(a.at))
    else if (a.excess * b.excess < 0) {
      const root = brent(excess, a.at, b.at, TOLERANCE)
      // Where the abundance leaps over the target, as in a bath of steps, there is a change of sign and no solution.
      if (Math.abs(excess(root)) < REACHED) solutions.push(Math.exp(root))
    }
  }
  if (samples.at(-1)!.excess === 0) solutions.push(Math.exp(samples.at(-1)!.at))
  const nearest = known.reduce((best, sample) =>
    Math.abs(sample.excess) < Math.abs(best.excess) ? sample : best,
  )
  return {
    solutions,
    searched: [searched[0], searched[1]],
    targetOmegaH2: request.targetOmegaH2,
    closest:
      solutions.length > 0
        ? null
        : { value: Math.exp(nearest.at), omegaH2: request.targetOmegaH2 * Math.exp(nearest.excess) },
    notComputable: refused(),
  }
}

/** The same from the wire. */
export const computeSolve = (input: unknown): SolveResult => solveFor(parseInput(solveRequest, input))
