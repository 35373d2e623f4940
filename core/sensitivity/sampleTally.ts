/** Keeps count of samples: their abundances, why some have none, and which warnings came with them. */
import { ConvergenceError } from '../numerics/convergence.ts'
import type { AbundanceResult, Guard } from '../wire/compute.ts'
import { InputError } from '../wire/fault.ts'
import type { Failure } from '../wire/propagation.ts'

export class SampleTally {
  /** NaN where a sample failed. */
  readonly omegaH2: Float64Array
  numericalError = 0
  failed = 0
  private readonly failures = new Map<string, Failure>()
  private readonly guards = new Map<string, Guard & { samples: number }>()

  constructor(samples: number) {
    this.omegaH2 = new Float64Array(samples).fill(NaN)
  }

  add(sample: number, result: AbundanceResult): void {
    this.omegaH2[sample] = result.omegaH2
    this.numericalError = Math.max(this.numericalError, result.numericalError)
    for (const guard of result.guards) {
      const known = this.guards.get(guard.code)
      if (known) known.samples++
      else this.guards.set(guard.code, { ...guard, samples: 1 })
    }
  }

  /** Counts a sample that is impossible or did not converge; other errors are thrown on. */
  addFailure(sample: number, error: unknown): void {
    const failure = failureOf(error, sample)
    this.failed++
    const key = `${failure.error} ${failure.path ?? ''}`
    const known = this.failures.get(key)
    if (known) known.count++
    else this.failures.set(key, failure)
  }

  failuresByFrequency(): Failure[] {
    return [...this.failures.values()].sort((a, b) => b.count - a.count)
  }

  guardsByFrequency(): (Guard & { samples: number })[] {
    return [...this.guards.values()].sort((a, b) => b.samples - a.samples)
  }

  /** The abundances there are, ascending. */
  ascending(): Float64Array {
    return this.omegaH2.filter((value) => !Number.isNaN(value)).sort()
  }
}

function failureOf(error: unknown, firstSample: number): Failure {
  if (error instanceof ConvergenceError)
    return { error: 'ConvergenceError', message: error.reason, count: 1, firstSample }
  if (!(error instanceof InputError)) throw error
  const [{ path, message, value }] = error.faults as [InputError['faults'][number]]
  const found = value === undefined ? '' : ` (found ${JSON.stringify(value)})`
  return { error: 'InputError', path, message: `${message}${found}`, count: 1, firstSample }
}
