/**
 * The inverse question: for which values of one number does Ωh² equal the target? All solutions in a bracket, and when there is
 * none, how near the abundance came and what stood in the way.
 */
import { abundance } from '../abundance/abundance.ts'
import { complete } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { VariedInput } from '../variation/variedInput.ts'
import { InputError, faultLine, parseInput } from '../wire/fault.ts'
import { solveRequest } from '../wire/inverse.ts'
import type { SolveRequest, SolveResult } from '../wire/inverse.ts'
import { abundanceSearch, lowestBy, nearest } from './abundanceSearch.ts'
import type { Found } from './abundanceSearch.ts'
import { usualBracket } from './brackets.ts'
import { explanationOf } from './explanation.ts'

const messageOf = (error: Error): string =>
  error instanceof InputError ? error.faults.map(faultLine).join('; ') : error.message

/** Stretches of the bracket without an abundance, each with the first complaint in it. */
function gapsOf({ tried, complaints }: Found): SolveResult['gaps'] {
  const gaps: SolveResult['gaps'] = []
  tried.forEach(({ value, omegaH2 }, i) => {
    if (!Number.isNaN(omegaH2)) return
    const open = i > 0 && Number.isNaN(tried[i - 1]!.omegaH2) ? gaps.at(-1) : undefined
    if (open) open.to = value
    else gaps.push({ from: value, to: value, message: messageOf(complaints.get(value)!) })
  })
  return gaps
}

/**
 * Solves a parsed request.
 * @throws InputError, ConvergenceError when no value in the bracket gives an abundance
 */
export function* solveForSteps(request: SolveRequest): Steps<SolveResult> {
  const { history, candidate, solveFor, targetOmegaH2 } = request
  const searched = request.between ?? usualBracket(solveFor, { history, candidate })
  const varied = new VariedInput({ history, candidate }, [solveFor])
  const omegaH2At = (value: number): number => {
    const variant = varied.at([value])
    return abundance(variant.history, variant.candidate).omegaH2
  }
  const found = yield* abundanceSearch(omegaH2At, targetOmegaH2, searched)
  const { tried, complaints } = found
  const closest = nearest(tried, targetOmegaH2)
  if (!closest) throw complaints.values().next().value!
  const result = {
    solutions: found.solutions,
    searched: [searched[0], searched[1]] as [number, number],
    targetOmegaH2,
    closest: found.solutions.length > 0 ? null : closest,
    lowest: lowestBy(tried, ({ omegaH2 }) => omegaH2)!,
    highest: lowestBy(tried, ({ omegaH2 }) => -omegaH2)!,
    leaps: found.leaps,
    gaps: gapsOf(found),
    notComputable: complaints.size,
  }
  return { ...result, explanation: explanationOf(solveFor, result) }
}

/** The same from the wire. */
export function* solveSteps(input: unknown): Steps<SolveResult> {
  return yield* solveForSteps(parseInput(solveRequest, input))
}

export const computeSolve = (input: unknown): SolveResult => complete(solveSteps(input))
