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

  it('finds the freeze-in and the freeze-out branch of one coupling in the usual bracket', () => {
    const { solutions, searched } = computeSolve({
      history: {},
      candidate: { ...wimp, initialAbundance: 'zero' },
      solveFor: 'candidate.annihilation.sWaveCm3PerS',
    })
    expect(searched).toEqual([1e-50, 1e-20])
    // The independent solutions of the same question in tests/reference/inverse.json.
    expect(solutions).toHaveLength(2)
    expect(relative(solutions[0]!, 2.7256650561524812e-45)).toBeLessThan(1e-6)
    expect(relative(solutions[1]!, 2.114636473232539e-26)).toBeLessThan(1e-6)
  })

  it('finds both sides of the passage from freeze-in to thermal, and the gap where nothing converges', () => {
    const decay = {
      mechanism: 'freeze-in-decay',
      massGeV: 100,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      backReaction: true,
      parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson' },
    }
    const solved = computeSolve({
      history: {},
      candidate: decay,
      solveFor: 'candidate.parent.lifetimeS',
      targetOmegaH2: 1e7,
      between: [1e-15, 1e-5],
    })
    expect(solved.solutions).toHaveLength(2)
    for (const lifetimeS of solved.solutions) {
      const candidate = { ...decay, parent: { ...decay.parent, lifetimeS } }
      expect(relative(computeAbundance({ history: {}, candidate }).omegaH2, 1e7)).toBeLessThan(1e-6)
    }
    expect(solved.highest.omegaH2).toBeGreaterThan(4e7)
  })

  it('looks up to the edge of what is allowed', () => {
    // The candidate may weigh up to half of the parent; the abundance is proportional to its mass up to there.
    const candidate = {
      mechanism: 'freeze-in-decay',
      degreesOfFreedom: 2,
      statistics: 'fermion',
      perDecay: 2,
      parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-3 },
    }
    const ask = { history: {}, candidate, solveFor: 'candidate.massGeV' }
    const at = (massGeV: number) =>
      computeAbundance({ history: {}, candidate: { ...candidate, massGeV } }).omegaH2
    const { solutions, gaps } = computeSolve({ ...ask, targetOmegaH2: at(149.9) })
    expect(solutions).toHaveLength(1)
    expect(relative(solutions[0]!, 149.9)).toBeLessThan(1e-9)
    expect(gaps).toHaveLength(1)
    expect(gaps[0]!.message).toMatch(/^candidate\.massGeV: allowed: at most the mass of the parent/)
    const none = computeSolve({ ...ask, targetOmegaH2: 1.01 * at(150) })
    expect(none.solutions).toEqual([])
    expect(relative(none.closest!.value, 150)).toBeLessThan(1e-5)
    expect(none.explanation).toMatch(
      /less than the target; most, .*, at 150\. From .* there is no abundance: candidate\.massGeV/,
    )
  })

  it('looks on both sides of zero where the number may be negative', () => {
    const ask = { history: {}, candidate: wimp, solveFor: 'history.bath.band' }
    const at = (band: number) =>
      computeAbundance({ history: { bath: { treatment: 'fit-2018', band } }, candidate: wimp }).omegaH2
    for (const band of [-0.7, 0.4]) {
      const { solutions, searched } = computeSolve({ ...ask, targetOmegaH2: at(band) })
      expect(searched).toEqual([-1, 1])
      expect(solutions).toHaveLength(1)
      expect(Math.abs(solutions[0]! - band)).toBeLessThan(1e-5)
    }
  })

  it('says where the abundance leaps over the target', () => {
    // A candidate that decouples while relativistic has the g_s of that moment, which steps.
    const ask = {
      history: { bath: { treatment: 'thresholds' } },
      candidate: { mechanism: 'hot-relic', massGeV: 1e-8, degreesOfFreedom: 2, statistics: 'fermion' },
      solveFor: 'candidate.decouplingTemperatureGeV',
      between: [1, 10],
    }
    const at = (decouplingTemperatureGeV: number) =>
      computeAbundance({
        history: ask.history,
        candidate: { ...ask.candidate, decouplingTemperatureGeV },
      }).omegaH2
    const targetOmegaH2 = Math.sqrt(at(4.17) * at(4.2))
    expect(at(4.17) / at(4.2)).toBeGreaterThan(1.05)
    const { solutions, leaps, explanation } = computeSolve({ ...ask, targetOmegaH2 })
    expect(solutions).toEqual([])
    expect(leaps).toHaveLength(1)
    // The bottom quark, 4.183 GeV (PDG 2024).
    expect(relative(leaps[0]!, 4.183)).toBeLessThan(1e-8)
    expect(explanation).toMatch(
      /^The abundance leaps over the target at candidate\.decouplingTemperatureGeV = 4\.183,/,
    )
  })

  it('says that there is more or less than the target everywhere', () => {
    const ask = { history: {}, candidate: wimp, solveFor: 'candidate.annihilation.sWaveCm3PerS' }
    expect(computeSolve({ ...ask, between: [1e-24, 1e-22] }).explanation).toMatch(
      /^Everywhere between 1e-24 and 1e-22 there is less than the target; most, 0\.00\d+, at 1e-24\.$/,
    )
    expect(computeSolve({ ...ask, between: [1e-28, 1e-27] }).explanation).toMatch(
      /more than the target; least, .* at 1e-27\.$/,
    )
    expect(computeSolve(ask).explanation).toBeNull()
  })

  it('sees a resonance narrower than its scan, in the usual bracket', () => {
    // The case of tests/reference/inverse.json whose bracket there is [40, 60].
    const resonance = { kind: 'resonance', massGeV: 105, widthGeV: 0.105, spin: 1, branchingProduct: 1e-5 }
    const { solutions, searched } = computeSolve({
      history: {},
      candidate: { ...wimp, annihilation: resonance },
      solveFor: 'candidate.massGeV',
    })
    expect(searched).toEqual([1e-6, 1e6])
    const near = solutions.filter((mass) => mass > 40 && mass < 60)
    expect(near).toHaveLength(2)
    expect(relative(near[0]!, 49.70790909591068)).toBeLessThan(1e-6)
    expect(relative(near[1]!, 52.973114118104654)).toBeLessThan(1e-6)
  }, 60_000)
})
