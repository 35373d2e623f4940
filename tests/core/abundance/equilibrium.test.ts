import { describe, expect, it } from 'vitest'
import { buildHistory, computeAbundance } from '#core/index'
import { annihilatingState } from '#core/abundance/mechanisms/freezeOut'
import { mechanismOf } from '#core/abundance/mechanisms/mechanisms'
import { candidateInput, historyInput } from '#core/wire/index'
import { relative } from '../fixtures.ts'

const candidateWith = (sWaveCm3PerS: number) => {
  const parsed = candidateInput.parse({
    mechanism: 'freeze-out',
    massGeV: 100,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    annihilation: { kind: 'partial-waves', sWaveCm3PerS },
  })
  if (parsed.mechanism !== 'freeze-out') throw new Error('not freeze-out')
  return parsed
}

const EXPANSIONS = [
  { kind: 'radiation' },
  { kind: 'fluid', index: 2, equalityTemperatureGeV: 1 },
  { kind: 'entropy-step', temperatureGeV: 7, factor: 30 },
  { kind: 'early-matter', reheatTemperatureGeV: 0.5, startTemperatureGeV: 200 },
]

/** Y/Y_eq − 1 in the history at x, and how far behind it is by first order: −(d ln Z_eq/d ln x)/(2kZ_eq). */
function lead(expansion: object, sWaveCm3PerS: number, x: number): { found: number; firstOrder: number } {
  const history = buildHistory(historyInput.parse({ expansion }))
  const candidate = candidateWith(sWaveCm3PerS)
  const samples = mechanismOf(candidate).yields(history, candidate, Float64Array.of(Math.log(x)))
  const state = annihilatingState(history, candidate)
  const h = 1e-3
  state.moveTo(Math.log(x) + h)
  const after = state.lnEquilibrium
  state.moveTo(Math.log(x) - h)
  const before = state.lnEquilibrium
  state.moveTo(Math.log(x))
  const firstOrder = -(after - before) / (2 * h) / (2 * state.strength * Math.exp(state.lnEquilibrium))
  return { found: Math.expm1(samples.lnYield[0]! - state.lnEquilibrium - state.lnDilution), firstOrder }
}

describe('strong annihilation', () => {
  it.each(EXPANSIONS.map((expansion) => [expansion.kind, expansion] as const))(
    'holds Y to Y_eq, behind by H/Γ to first order and less the stronger it is: %s',
    (_kind, expansion) => {
      let before = Infinity
      for (const sigmaV of [1e-24, 1e-23, 1e-22, 1e-21]) {
        const { found, firstOrder } = lead(expansion, sigmaV, 20)
        // Second order is (lag)² times the steepness of Y_eq over it, some times the lag itself.
        expect(Math.abs(found - firstOrder), `${sigmaV}`).toBeLessThan(3 * firstOrder ** 2 + 1e-9)
        expect(found).toBeGreaterThan(0)
        expect(found).toBeLessThan(before / 8)
        before = found
      }
      expect(before).toBeLessThan(1e-3)
    },
  )

  it('never leaves less than equilibrium would at any later time, nor more than at freeze-out', () => {
    for (const expansion of EXPANSIONS) {
      const history = buildHistory(historyInput.parse({ expansion }))
      const candidate = candidateWith(2e-26)
      const lnX = Float64Array.from({ length: 60 }, (_, i) => Math.log(5) + i * 0.1)
      const { lnYield } = mechanismOf(candidate).yields(history, candidate, lnX)
      const state = annihilatingState(history, candidate)
      lnX.forEach((at, i) => {
        state.moveTo(at)
        // Good to the 1e-7 of the solution that is drawn.
        expect(lnYield[i]! - state.lnEquilibrium - state.lnDilution).toBeGreaterThan(-1e-5)
      })
    }
  })
})

describe('the curve of the yield', () => {
  it('goes over smoothly from following equilibrium to the solved equation', () => {
    for (const expansion of EXPANSIONS) {
      const history = buildHistory(historyInput.parse({ expansion }))
      const step = 1e-3
      const lnX = Float64Array.from({ length: 2000 }, (_, i) => Math.log(7) + i * step)
      const { lnYield } = mechanismOf(candidateWith(2e-26)).yields(history, candidateWith(2e-26), lnX)
      for (let i = 1; i + 2 < lnX.length; i++) {
        const hot = 100 / Math.exp(lnX[i - 1]!)
        const cold = 100 / Math.exp(lnX[i + 2]!)
        // The entropy release is a true jump, and no slope is taken across it.
        if (history.breaks.some((each) => each <= 1.01 * hot && each >= 0.99 * cold)) continue
        const third = lnYield[i + 2]! - 3 * lnYield[i + 1]! + 3 * lnYield[i]! - lnYield[i - 1]!
        // Of the curve itself x step³ = 2e-8; where the two meet, the fourth order of a lag of 1/24.
        expect(Math.abs(third), `x = ${Math.exp(lnX[i]!)}`).toBeLessThan(1e-5)
      }
    }
  })
})

describe('species that share their fate', () => {
  it('as five of one mass and one rate are one species of five times the states', () => {
    const alike = { massGeV: 100, degreesOfFreedom: 2, statistics: 'fermion' }
    const pairs = [0, 1, 2, 3, 4].flatMap((first) =>
      [0, 1, 2, 3, 4]
        .filter((second) => second >= first)
        .map((second) => ({ first, second, sWaveCm3PerS: 2e-26, pWaveCm3PerS: 1e-25 })),
    )
    const omega = (candidate: object): number =>
      computeAbundance({ history: {}, candidate: { mechanism: 'freeze-out', ...alike, ...candidate } })
        .omegaH2
    const together = omega({
      annihilation: { kind: 'coannihilation', others: [alike, alike, alike, alike], pairs },
    })
    const single = omega({
      degreesOfFreedom: 10,
      annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2e-26, pWaveCm3PerS: 1e-25 },
    })
    expect(relative(together, single)).toBeLessThan(1e-9)
  })

  it('leave a heavier one out when it is too heavy to be there', () => {
    const alike = { massGeV: 100, degreesOfFreedom: 2, statistics: 'fermion' }
    const others = [{ ...alike, massGeV: 400 }]
    const pairs = [
      { first: 0, second: 0, sWaveCm3PerS: 2e-26 },
      { first: 1, second: 1, sWaveCm3PerS: 1e-22 },
    ]
    const omega = (annihilation: object): number =>
      computeAbundance({ history: {}, candidate: { mechanism: 'freeze-out', ...alike, annihilation } })
        .omegaH2
    const alone = omega({ kind: 'partial-waves', sWaveCm3PerS: 2e-26 })
    // Its share at x = 22 is 8 e^{−66}, times 5000 in the rate.
    expect(relative(omega({ kind: 'coannihilation', others, pairs }), alone)).toBeLessThan(2e-7)
  })
})
