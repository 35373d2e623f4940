/**
 * Elasticities d ln Ωh²/d ln p of every continuous input: central differences of order six in p(1 ± kh), k = 1, 2, 3, with two
 * step sizes. The finer is given; three times its difference from the coarser, and what the numerical error of Ωh² itself makes of a
 * quotient, is the stated error. Where a bath of steps makes Ωh² kink, that error says so.
 */
import { abundance } from '../abundance/abundance.ts'
import { buildHistory } from '../history/thermalHistory.ts'
import { readPath, substitute } from '../inverse/substitute.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { abundanceRequest } from '../wire/compute.ts'
import type { AbundanceRequest } from '../wire/compute.ts'
import { InputError, parseInput } from '../wire/fault.ts'

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

function valueAt(value: unknown, path: readonly (string | number)[]): number {
  return path.reduce<unknown>((each, key) => (each as Record<string | number, unknown>)[key], value) as number
}

function derivative(lnOmegaAt: (factor: number) => number, step: number): number {
  return WEIGHTS.reduce<number>((sum, weight, i) => {
    const move = (i + 1) * step
    return sum + (weight * (lnOmegaAt(1 + move) - lnOmegaAt(1 - move))) / step
  }, 0)
}

/** The elasticity of every continuous input of a parsed request. */
export function elasticities(request: AbundanceRequest): Elasticity[] {
  return continuousPaths(request).map((path) => {
    const keys = readPath(path)
    const start = valueAt(request, keys)
    const lnOmegaAt = (factor: number): number => {
      const { history, candidate } = parseInput(abundanceRequest, substitute(request, keys, start * factor))
      return Math.log(abundance(buildHistory(history), candidate).omegaH2)
    }
    try {
      const [fine, coarse] = [derivative(lnOmegaAt, STEP), derivative(lnOmegaAt, 2 * STEP)]
      return { path, value: fine, error: 3 * Math.abs(fine - coarse) + (AMPLIFICATION * SCATTER) / STEP }
    } catch (error) {
      if (error instanceof InputError || error instanceof ConvergenceError)
        return { path, value: null, error: null }
      throw error
    }
  })
}
