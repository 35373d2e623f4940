import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { computeAbundance, computeSolve } from '#core/index'
import { InputError } from '#core/wire/index'
import { relative } from '../fixtures.ts'

interface InverseCase {
  input: { solveFor: string; history: unknown; candidate: { mechanism: string; massGeV?: number } }
  solutions: number[]
  searched?: [number, number]
}

const { cases } = JSON.parse(
  readFileSync(new URL('../../reference/inverse.json', import.meta.url), 'utf8'),
) as { cases: InverseCase[] }

const wimp = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
}

describe('the inverse question', () => {
  it.each(
    cases.map(
      (each, i) => [`${i}: ${each.input.solveFor}, ${each.input.candidate.mechanism}`, each] as const,
    ),
  )(
    'has the solutions found independently, to 1e-6, and no others: %s',
    (_name, { input, solutions, searched }) => {
      const found = computeSolve(searched ? { ...input, between: searched } : input)
      expect(found.solutions).toHaveLength(solutions.length)
      solutions.forEach((solution, i) => expect(relative(found.solutions[i]!, solution)).toBeLessThan(1e-6))
      expect(found.closest).toBeNull()
    },
    30_000,
  )

  it('is answered by the forward one', () => {
    const { solutions } = computeSolve({
      history: {},
      candidate: wimp,
      solveFor: 'candidate.massGeV',
      between: [1, 1e4],
      targetOmegaH2: 0.115,
    })
    for (const massGeV of solutions)
      expect(
        relative(computeAbundance({ history: {}, candidate: { ...wimp, massGeV } }).omegaH2, 0.115),
      ).toBeLessThan(1e-7)
  })

  it('says how near it came when there is no solution', () => {
    const result = computeSolve({
      history: {},
      candidate: wimp,
      solveFor: 'candidate.annihilation.sWaveCm3PerS',
      between: [1e-24, 1e-22],
    })
    expect(result.solutions).toEqual([])
    expect(result.closest!.value).toBeCloseTo(1e-24, 30)
    expect(result.closest!.omegaH2).toBeLessThan(0.12)
  })

  it('names what is wrong when no value would make an input', () => {
    const broken = { history: {}, candidate: { ...wimp, statistics: 'anyon' }, solveFor: 'candidate.massGeV' }
    expect(() => computeSolve(broken)).toThrow(InputError)
    expect(() => computeSolve(broken)).toThrow('candidate.statistics')
    expect(() => computeSolve({ history: {}, candidate: wimp, solveFor: 'mass' })).toThrow(
      'solveFor: allowed: a path to a number',
    )
    expect(() => computeSolve({ history: {}, candidate: wimp, solveFor: 'candidate.colour' })).toThrow(
      'candidate.colour: not a name known here',
    )
  })
})
