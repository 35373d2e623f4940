/**
 * Elasticities d ln Ωh²/d ln p of every continuous input: central differences of order six in p(1 ± kh), k = 1, 2, 3, with two
 * step sizes. The finer is given; three times its difference from the coarser, and what the numerical error of Ωh² itself makes of a
 * quotient, is the stated error. Where a bath of steps makes Ωh² kink, that error says so.
 */
import { abundance } from '../abundance/abundance.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import type { AbundanceRequest } from '../wire/compute.ts'
import { complete, part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { readPath, valueAt } from '../variation/jsonPath.ts'
import { VariedInput } from '../variation/variedInput.ts'
import { InputError } from '../wire/fault.ts'

export interface Elasticity {
  path: string
  /** Null where the input cannot be moved by a few per cent either way. */
  value: number | null
  /** Estimated absolute error of the value. */
  error: number | null
}

const STEP = 0.01
/** Weights of f(k) − f(−k), k = 1, 2, 3, for the first derivative to order six (Fornberg, Math. Comp. 51 (1988) 699). */
const WEIGHTS = [3 / 4, -3 / 20, 1 / 60] as const
/** Sum of the weights' sizes, twice: what an error of one f becomes. */
const AMPLIFICATION = 2 * WEIGHTS.reduce((sum, weight) => sum + Math.abs(weight), 0)
/** Scatter of ln Ωh² between neighbouring inputs; far below the stated numerical error, which neighbours share. */
const SCATTER = 2e-9

/** Numbers that are counts, labels or rows of a table. */
const NOT_CONTINUOUS = /(degreesOfFreedom|spin|first|second|perDecay)$|\.points\[/

/** Paths of the nonzero continuous numbers in a value. */
export function continuousPaths(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return value !== 0 && !NOT_CONTINUOUS.test(path) ? [path] : []
  if (Array.isArray(value)) return value.flatMap((each, i) => continuousPaths(each, `${path}[${i}]`))
  if (value === null || typeof value !== 'object') return []
  return Object.entries(value).flatMap(([key, each]) =>
    continuousPaths(each, path === '' ? key : `${path}.${key}`),
  )
}

/** Moves, in steps, at which both differences together want ln Ωh². */
const MOVES = [...new Set(WEIGHTS.flatMap((_weight, i) => [i + 1, 2 * (i + 1)]))].flatMap((k) => [k, -k])

/** Weighted differences over k and −k, k = spacing, 2·spacing, 3·spacing steps. */
function derivative(lnOmegaAt: ReadonlyMap<number, number>, spacing: number): number {
  return WEIGHTS.reduce<number>((sum, weight, i) => {
    const k = (i + 1) * spacing
    return sum + (weight * (lnOmegaAt.get(k)! - lnOmegaAt.get(-k)!)) / (spacing * STEP)
  }, 0)
}

/** Evaluations behind one elasticity, at most. */
export const EVALUATIONS = MOVES.length

function* elasticitySteps(request: AbundanceRequest, path: string): Steps<Elasticity> {
  const start = valueAt(request, readPath(path)) as number
  const varied = new VariedInput(request, [path])
  const lnOmegaAt = new Map<number, number>()
  try {
    for (const move of MOVES) {
      const { history, candidate } = varied.at([start * (1 + move * STEP)])
      lnOmegaAt.set(move, Math.log(abundance(history, candidate).omegaH2))
      yield { done: lnOmegaAt.size, of: EVALUATIONS }
    }
  } catch (error) {
    if (error instanceof InputError || error instanceof ConvergenceError)
      return { path, value: null, error: null }
    throw error
  }
  const [fine, coarse] = [derivative(lnOmegaAt, 1), derivative(lnOmegaAt, 2)]
  return { path, value: fine, error: 3 * Math.abs(fine - coarse) + (AMPLIFICATION * SCATTER) / STEP }
}

/** The elasticity of every continuous input of a parsed request. */
export function* elasticitiesSteps(request: AbundanceRequest): Steps<Elasticity[]> {
  const paths = continuousPaths(request)
  const found: Elasticity[] = []
  for (const [i, path] of paths.entries())
    found.push(yield* part(elasticitySteps(request, path), i, 1, paths.length))
  return found
}

/** The same at once. */
export const elasticities = (request: AbundanceRequest): Elasticity[] => complete(elasticitiesSteps(request))
