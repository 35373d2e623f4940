/** Whatever stands in an input, there is a sensible answer to it. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ConvergenceError, computeAbundance, computeHistory } from '#core/index'
import { InputError } from '#core/wire/index'
import type { AbundanceResult } from '#core/wire/index'
import { between, candidates, history } from '../arbitraries.ts'

/** Seeded, so that a run that passed passes again; raise the number of runs to search further. */
const SEED = 20261201

/** The answer, or null when it is an error of one of the two kinds that are named. */
function answered(input: unknown): AbundanceResult | null {
  try {
    return computeAbundance(input)
  } catch (error) {
    expect(error instanceof InputError || error instanceof ConvergenceError, String(error)).toBe(true)
    expect(String((error as Error).message).length).toBeGreaterThan(10)
    return null
  }
}

describe('any JSON', () => {
  it('is answered with a result or an InputError that names at least one fault', () => {
    const request = fc.oneof(
      fc.jsonValue(),
      fc.record({ history: fc.jsonValue(), candidate: fc.jsonValue() }),
      fc.record({ history: fc.jsonValue(), temperaturesGeV: fc.jsonValue() }),
    )
    fc.assert(
      fc.property(request, (input) => {
        for (const compute of [computeAbundance, computeHistory]) {
          try {
            compute(input)
          } catch (error) {
            expect(error).toBeInstanceOf(InputError)
            expect((error as InputError).faults.length).toBeGreaterThan(0)
          }
        }
      }),
      { numRuns: 400 },
    )
  })
})

describe('any valid input', () => {
  /** Collisions by a power law tabulate their reaction density first, which takes a fifth of a second. */
  const runsOf = (name: string): number => (name === 'freeze-in-scattering' ? 8 : 24)

  it.each(Object.entries(candidates))(
    'is answered with finite numbers, or with an error that has a name: %s',
    (name, candidate) => {
      let asked = 0
      let numbers = 0
      fc.assert(
        fc.property(history, candidate, (h, c) => {
          const result = answered({ history: h, candidate: c })
          asked++
          if (!result) return
          numbers++
          expect(result.omegaH2).toBeGreaterThan(0)
          expect(result.omegaH2).toBeLessThan(Infinity)
          expect(result.numericalError).toBeGreaterThan(0)
          // Solutions are taken as agreeing at 5e-7, and a table adds no more than that.
          expect(result.numericalError).toBeLessThan(1e-6)
          for (const value of Object.values(result))
            if (typeof value === 'number') expect(value).not.toBeNaN()
        }),
        { numRuns: runsOf(name), seed: SEED },
      )
      // Ultraviolet freeze-in needs a maximum temperature, which half of these histories lack.
      expect(numbers / asked).toBeGreaterThan(0.35)
    },
  )

  it('of a history is answered with rows of finite numbers, an age that grows and an energy that falls as it cools', () => {
    const temperatures = fc.array(between(1e-12, 1e10), { minLength: 2, maxLength: 6 })
    fc.assert(
      fc.property(history, temperatures, (h, temperaturesGeV) => {
        temperaturesGeV.sort((a, b) => b - a)
        let rows
        try {
          rows = computeHistory({ history: h, temperaturesGeV }).rows
        } catch (error) {
          expect(error instanceof InputError || error instanceof ConvergenceError, String(error)).toBe(true)
          return
        }
        rows.forEach((row, i) => {
          for (const [name, value] of Object.entries(row))
            expect(value === null || Number.isFinite(value), `${name} = ${value}`).toBe(true)
          const before = rows[i - 1]
          if (!before || before.temperatureGeV === row.temperatureGeV) return
          expect(row.timeS).toBeGreaterThan(before.timeS)
          expect(row.energyDensityGeV4).toBeLessThan(before.energyDensityGeV4 * 1.001)
        })
      }),
      { numRuns: 60, seed: SEED },
    )
  })
})
