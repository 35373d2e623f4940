import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { abundance, buildHistory, computeAbundance } from '#core/index'
import { logEquilibriumYield } from '#core/abundance/equilibrium'
import { emptyExpansion } from '#core/history/expansionPoint'
import { isMatterEra } from '#core/history/expansions/earlyMatter'
import { candidateInput, historyInput } from '#core/wire/index'
import { between } from '../arbitraries.ts'
import { relative } from '../fixtures.ts'

const particle = { degreesOfFreedom: 2, statistics: 'fermion' }
const sWave = (massGeV: number, sWaveCm3PerS: number) => ({
  mechanism: 'freeze-out',
  massGeV,
  ...particle,
  annihilation: { kind: 'partial-waves', sWaveCm3PerS },
})
const decay = (lifetimeS: number, massGeV = 1e-5) => ({
  mechanism: 'freeze-in-decay',
  massGeV,
  ...particle,
  parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'maxwell-boltzmann', lifetimeS },
})
const hotRelic = (decouplingTemperatureGeV: number) => ({
  mechanism: 'hot-relic',
  massGeV: 1e-8,
  ...particle,
  decouplingTemperatureGeV,
})
const omega = (history: unknown, candidate: unknown): number =>
  computeAbundance({ history, candidate }).omegaH2

describe('freeze-out', () => {
  it('keeps Ωh² ⟨σv⟩ √g/x_f constant over four decades of mass within the spread of the analytic estimate (Kolb & Turner §5.2)', () => {
    const history = buildHistory(historyInput.parse({}))
    const point = emptyExpansion()
    const products = [10, 100, 1000, 1e5].map((mass) => {
      const result = abundance(history, candidateInput.parse(sWave(mass, 2.2e-26)))
      history.at(Math.log(result.freezeOutTemperatureGeV!), point)
      return (result.omegaH2 * Math.sqrt(point.gRho)) / result.freezeOutX!
    })
    // The estimate itself is good to about 5 %: annihilation after freeze-out sees a changing g.
    for (const product of products) expect(relative(product, products[1]!)).toBeLessThan(0.07)
  })

  it('falls nearly as 1/⟨σv⟩, a little less, for any mass', () => {
    fc.assert(
      fc.property(between(1, 1e4), between(1e-27, 1e-24), (mass, sigmaV) => {
        const slope = Math.log(omega({}, sWave(mass, 2 * sigmaV)) / omega({}, sWave(mass, sigmaV))) / Math.LN2
        // Ωh² ∝ x_f/⟨σv⟩ and x_f ≈ 20 to 30 grows by one for each e-fold of ⟨σv⟩; a crossing of the QCD transition moves √g.
        expect(slope).toBeGreaterThan(-1.08)
        expect(slope).toBeLessThan(-0.85)
      }),
      { numRuns: 25 },
    )
  })

  it('forgets how it began where annihilation is strong: from nothing and from equilibrium it ends the same', () => {
    for (const mass of [0.01, 1, 100]) {
      const candidate = sWave(mass, 3e-26)
      const fromNothing = omega({}, { ...candidate, initialAbundance: 'zero' })
      // Both are solved to the accuracy they state, below 1e-7.
      expect(relative(fromNothing, omega({}, candidate))).toBeLessThan(2e-7)
    }
  })

  it('from nothing is freeze-in where annihilation is weak: Ωh² ∝ ⟨σv⟩', () => {
    const at = (sigmaV: number): number => omega({}, { ...sWave(100, sigmaV), initialAbundance: 'zero' })
    // (Y/Y_eq)² of what is lost is 1e-9 at the larger of the two.
    expect(relative(at(1e-42) / at(1e-43), 10)).toBeLessThan(2e-7)
  })

  it('does not know the temperature it began at, once that is well above freeze-out', () => {
    const standard = omega({}, sWave(100, 2.2e-26))
    expect(relative(omega({ maximumTemperatureGeV: 20 }, sWave(100, 2.2e-26)), standard)).toBeLessThan(2e-7)
    expect(relative(omega({}, { ...sWave(100, 2.2e-26), startX: 8 }), standard)).toBeLessThan(2e-7)
  })

  it('counts a particle that is not its own antiparticle as two halves: half the rate, all of the states', () => {
    const selfConjugate = omega({}, sWave(100, 1.1e-26))
    const pair = omega({}, { ...sWave(100, 2.2e-26), selfConjugate: false })
    expect(relative(pair, selfConjugate)).toBeLessThan(2e-7)
  })

  it('in kination is raised, the more the later it ends (D’Eramo, Fernandez, Profumo 2017)', () => {
    const at = (equalityTemperatureGeV: number): number =>
      omega({ expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV } }, sWave(100, 2.2e-26))
    const standard = omega({}, sWave(100, 2.2e-26))
    expect(at(1e5) / standard - 1).toBeLessThan(1e-5)
    expect(at(10)).toBeGreaterThan(standard)
    expect(at(1)).toBeGreaterThan(at(10))
    expect(at(0.1)).toBeGreaterThan(at(1))
    // Y ∝ 1/T_r up to the logarithm of relentless annihilation, ln(T_f/T_r): 20 to 40 % a decade here.
    expect(at(0.01) / at(0.1)).toBeGreaterThan(5)
    expect(at(0.01) / at(0.1)).toBeLessThan(10)
  })
})

describe('an entropy release', () => {
  it('after production has ended dilutes by D and by nothing else', () => {
    const expansion = { kind: 'entropy-step', temperatureGeV: 0.01, factor: 25 }
    expect(relative(omega({}, decay(1e-8)) / omega({ expansion }, decay(1e-8)), 25)).toBeLessThan(1e-12)
    expect(relative(omega({}, hotRelic(1)) / omega({ expansion }, hotRelic(1)), 25)).toBeLessThan(1e-12)
  })

  it('after annihilation has ended dilutes by D, and the less of it by what annihilates before with the denser gas', () => {
    const expansion = { kind: 'entropy-step', temperatureGeV: 1e-6, factor: 25 }
    const ratio = omega({}, sWave(100, 2.2e-26)) / omega({ expansion }, sWave(100, 2.2e-26))
    // Of 1/Y, T/T_f ≈ 1e-6/4 is still to come at 1 keV.
    expect(relative(ratio, 25)).toBeLessThan(1e-6)
  })

  it('before production has begun changes nothing today', () => {
    const expansion = { kind: 'entropy-step', temperatureGeV: 1e7, factor: 25 }
    // Above 1e7 GeV, x < 3e-5, the share of production is x³.
    expect(relative(omega({ expansion }, decay(1e-8)), omega({}, decay(1e-8)))).toBeLessThan(1e-12)
  })
})

describe('an era of matter', () => {
  const expansion = { kind: 'early-matter', reheatTemperatureGeV: 0.02, startTemperatureGeV: 10 }

  it('dilutes a relic that decoupled before it by its D exactly', () => {
    const history = buildHistory(historyInput.parse({ expansion }))
    if (!isMatterEra(history.expansion)) throw new Error('not an era of matter')
    // At 1e5 GeV the field is 1e-4 of the radiation and has heated it by 1e-12.
    const ratio = omega({}, hotRelic(1e5)) / omega({ expansion }, hotRelic(1e5))
    expect(relative(ratio, history.expansion.dilution)).toBeLessThan(1e-8)
  })

  it('that makes candidates adds to what is there, in proportion to the branching', () => {
    const branched = (branching: number): number =>
      omega({ expansion: { ...expansion, branching, fieldMassGeV: 1e6 } }, decay(1e-9))
    const [one, two, four] = [branched(1), branched(2), branched(4)] as const
    expect(one).toBeGreaterThan(omega({ expansion }, decay(1e-9)))
    // Each is known to 1e-9 by its own account, and the differences are a quarter of it.
    expect(relative((four - two) / (two - one), 2)).toBeLessThan(1e-8)
  })
})

describe('freeze-in', () => {
  it('by decay is proportional to the width, and to the mass and number of what is made', () => {
    fc.assert(
      fc.property(between(1e-9, 1e-5), between(1, 100), (lifetimeS, factor) => {
        const once = omega({}, decay(lifetimeS))
        expect(relative(omega({}, decay(lifetimeS / factor)) / once, factor)).toBeLessThan(1e-12)
        expect(relative(omega({}, decay(lifetimeS, 1e-5 * factor)) / once, factor)).toBeLessThan(1e-12)
        expect(relative(omega({}, { ...decay(lifetimeS), perDecay: 3 }) / once, 3)).toBeLessThan(1e-12)
      }),
      { numRuns: 20 },
    )
  })

  it('by decay takes a width for a lifetime: Γ = ħ/τ', () => {
    const { widthGeV, lifetimeS } = computeAbundance({ history: {}, candidate: decay(1e-8) })
    const parent = { massGeV: 300, degreesOfFreedom: 1, statistics: 'maxwell-boltzmann', widthGeV }
    const candidate = { ...decay(1e-8), parent }
    expect(relative(omega({}, candidate), omega({}, decay(1e-8)))).toBeLessThan(1e-14)
    expect(relative(lifetimeS!, 1e-8)).toBeLessThan(1e-14)
  })

  it('by decay goes on smoothly into a thermal relic as the width grows, and never above equilibrium', () => {
    const withInverse = (lifetimeS: number): number =>
      computeAbundance({ history: {}, candidate: { ...decay(lifetimeS), backReaction: true } }).yieldToday
    const free = (lifetimeS: number): number =>
      computeAbundance({ history: {}, candidate: decay(lifetimeS) }).yieldToday
    // What inverse decays take is of the order of Y/Y_eq: 1e-5 here.
    expect(relative(withInverse(1e-5), free(1e-5))).toBeLessThan(1e-4)
    const yields = [1e-6, 1e-7, 1e-8, 1e-9, 1e-10, 1e-11, 1e-12, 1e-13].map(withInverse)
    for (let i = 1; i < yields.length; i++) {
      expect(yields[i]).toBeGreaterThan(yields[i - 1]!)
      expect(yields[i]! / yields[i - 1]!).toBeLessThan(10.01)
    }
    const point = emptyExpansion()
    const temperature = 300 / 25
    buildHistory(historyInput.parse({})).at(Math.log(temperature), point)
    const species = [{ massGeV: 1e-5, degreesOfFreedom: 2, statistics: 'fermion' }] as const
    const thermal = Math.exp(logEquilibriumYield(species, 1e-5, 1e-5 / temperature, point.gS))
    // The fastest come apart at x ≈ 25, give or take five, over which g_s changes by as many per cents.
    expect(relative(yields.at(-1)!, thermal)).toBeLessThan(0.1)
  })

  it('beyond its own reach grows as T_max^(2q − 1) at constant g (Elahi, Kolda, Unwin 2015)', () => {
    const ultraviolet = { coefficient: 1e-3, scaleGeV: 1e12, index: 2 }
    const candidate = { mechanism: 'freeze-in-ultraviolet', massGeV: 1, ...particle, ultraviolet }
    const at = (maximumTemperatureGeV: number): number =>
      omega({ bath: { treatment: 'thresholds' }, maximumTemperatureGeV }, candidate)
    // What is made below 172.57 GeV, where g steps, is (172.57/1e6)³ of the whole.
    expect(relative(at(1e7) / at(1e6), 1e3)).toBeLessThan(1e-10)
  })

  it('of a parent that annihilates is the sum of its two limits while they are apart in time (Hall et al. 2010)', () => {
    const parent = { ...decay(1e-3).parent, annihilation: { kind: 'partial-waves', sWaveCm3PerS: 1e-25 } }
    const result = computeAbundance({ history: {}, candidate: { ...decay(1e-3), parent } })
    // Γ/H at the parent's freeze-out is 1e-5, and that is the overlap.
    expect(relative(result.yieldToday, result.yieldFreezeIn! + result.yieldLateDecay!)).toBeLessThan(1e-3)
  })
})

describe('an asymmetric candidate', () => {
  const candidate = (asymmetry: number, sWaveCm3PerS: number) => ({
    ...sWave(5, sWaveCm3PerS),
    mechanism: 'asymmetric',
    degreesOfFreedom: 4,
    asymmetry,
  })

  it('whose asymmetry outweighs annihilation is fixed by it', () => {
    const result = computeAbundance({ history: {}, candidate: candidate(9e-11, 5e-25) })
    expect(relative(result.yieldToday, 9e-11)).toBeLessThan(1e-6)
  })

  it('keeps its asymmetry for any rate: Y₊ − Y₋ = η, Y = Y₊ + Y₋', () => {
    fc.assert(
      fc.property(between(1e-14, 1e-11), between(1e-27, 1e-24), (asymmetry, sigmaV) => {
        const result = computeAbundance({ history: {}, candidate: candidate(asymmetry, sigmaV) })
        const { yieldParticle, yieldAntiparticle, yieldToday } = result
        expect(Math.abs(yieldParticle! - yieldAntiparticle! - asymmetry)).toBeLessThan(1e-14 * yieldToday)
        expect(relative(yieldParticle! + yieldAntiparticle!, yieldToday)).toBeLessThan(1e-14)
      }),
      { numRuns: 20 },
    )
  })

  it('of vanishing asymmetry is a particle with its antiparticle', () => {
    const symmetric = { ...sWave(5, 2.2e-26), degreesOfFreedom: 4, selfConjugate: false }
    // η/Y is 1e-9.
    expect(relative(omega({}, candidate(1e-20, 2.2e-26)), omega({}, symmetric))).toBeLessThan(3e-7)
  })
})
