import { describe, expect, it } from 'vitest'
import { computeAbundance } from '#core/index'
import { abundanceRequest } from '#core/wire/index'
import type { AbundanceResult } from '#core/wire/index'
import { abundanceFixture, relative } from '../fixtures.ts'

/** Reference cases whose input is not taken yet; the list shrinks as the core grows. */
const NOT_YET: readonly string[] = []

const cases = abundanceFixture.cases.map((each) => [each.name, each] as const)
const solved = new Map<string, AbundanceResult>()
const solve = (name: string, input: unknown): AbundanceResult => {
  const known = solved.get(name) ?? computeAbundance(input)
  solved.set(name, known)
  return known
}

/** 1e-6 is what the product promises; the reference is good to a few 1e-9. */
const TOLERANCE: Record<string, number> = {
  // Γ/H falls as e^{−x}: twenty times the relative error of x_f.
  rateOverHubbleAtFreezeOut: 3e-5,
}

/** One output against the reference; a group of outputs, number by number. */
function expectNear(result: object, field: string, expected: number | Record<string, number>): void {
  const found = (result as Record<string, unknown>)[field]
  if (typeof expected === 'number') {
    expect(relative(found as number, expected), field).toBeLessThan(TOLERANCE[field] ?? 1e-6)
    return
  }
  for (const [name, value] of Object.entries(expected)) expectNear(found as object, name, value)
}

describe('the abundance', () => {
  it('is taken for every reference case but those listed', () => {
    const refused = abundanceFixture.cases
      .filter((each) => !abundanceRequest.safeParse(each.input).success)
      .map((each) => each.name)
    expect(refused).toEqual(NOT_YET)
  })

  it.each(cases.filter(([name]) => !NOT_YET.includes(name)))(
    'agrees with independent solvers to 1e-6: %s',
    (name, { input, outputs }) => {
      const result = solve(name, input)
      for (const [field, expected] of Object.entries(outputs)) expectNear(result, field, expected)
    },
  )

  it('states its numerical error honestly: 95 % of the cases lie within it, and typically it is not a hundredfold too large', () => {
    const judged = cases
      .filter(([name]) => !NOT_YET.includes(name))
      .map(([name, { input, outputs, accuracy }]) => {
        const result = solve(name, input)
        const actual = relative(result.omegaH2, outputs['omegaH2'] as number)
        return {
          within: actual <= result.numericalError + accuracy,
          ratio: result.numericalError / Math.max(actual, accuracy),
        }
      })
    expect(judged.filter((each) => each.within).length / judged.length).toBeGreaterThanOrEqual(0.95)
    const ratios = judged.map((each) => each.ratio).sort((a, b) => a - b)
    expect(ratios[ratios.length >> 1]).toBeLessThan(100)
  })
})
