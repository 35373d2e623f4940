/**
 * Textbook steps hold g = 106.75 above 172.57 GeV: there the equations have closed forms, and far above it nothing of note is left to
 * the time when g falls.
 */
import { describe, expect, it } from 'vitest'
import { abundance, buildHistory } from '#core/index'
import { mechanismOf } from '#core/abundance/mechanisms/mechanisms'
import { GEV_MINUS2_PER_CM3_S, HBAR_GEV_S, PLANCK_MASS_GEV, ZETA_3 } from '#core/constants/natural'
import { emptyExpansion } from '#core/history/expansionPoint'
import { isMatterEra } from '#core/history/expansions/earlyMatter'
import { candidateInput, historyInput } from '#core/wire/index'
import { relative } from '../fixtures.ts'

const G = 106.75
const ENTROPY = ((2 * Math.PI ** 2) / 45) * G
/** H M_Pl/T². */
const HUBBLE = Math.sqrt((4 * Math.PI ** 3 * G) / 45)

/** ζ(5), OEIS A013663. */
const ZETA_5 = 1.03692775514337

const particle = { degreesOfFreedom: 2, statistics: 'fermion' }
const steps = (differing: object = {}) =>
  buildHistory(historyInput.parse({ bath: { treatment: 'thresholds' }, ...differing }))
const yieldOf = (history: ReturnType<typeof steps>, candidate: unknown): number =>
  abundance(history, candidateInput.parse(candidate)).yieldToday

/** Y of a candidate at x = m/T. */
function yieldAt(history: ReturnType<typeof steps>, candidate: unknown, x: number): number {
  const parsed = candidateInput.parse(candidate)
  const samples = mechanismOf(parsed).yields(history, parsed, Float64Array.of(Math.log(x)))
  return Math.exp(samples.lnYield[0]!)
}

describe('annihilation after freeze-out', () => {
  const massGeV = 1e12
  const sWaveCm3PerS = 1e-34
  const annihilation = { kind: 'partial-waves', sWaveCm3PerS }
  const candidate = { mechanism: 'freeze-out', massGeV, ...particle, annihilation }
  /** s⟨σv⟩/H at x = 1 while radiation dominates. */
  const strength = (ENTROPY / HUBBLE) * massGeV * PLANCK_MASS_GEV * sWaveCm3PerS * GEV_MINUS2_PER_CM3_S
  const [early, xr] = [60, 1e4]

  // With u = 1/x: d(1/Y) = −λ du/√(1 + (x_r u)^n).
  it.each([
    [1, (u: number) => (2 / xr) * (Math.sqrt(1 + xr * u) - 1)],
    [2, (u: number) => Math.asinh(xr * u) / xr],
  ])(
    'while a fluid ρ ∝ a^−(4+%i) runs the expansion is λ∫ du/√(1 + (x_r u)^n) (D’Eramo, Fernandez, Profumo, JCAP 05 (2017) 012)',
    (index, integral) => {
      const history = steps({
        expansion: { kind: 'fluid', index, equalityTemperatureGeV: massGeV / xr },
      })
      const gain = 1 / yieldOf(history, candidate) - 1 / yieldAt(history, candidate, early)
      // What g falling below 172.57 GeV changes: λ 172.57/m against λ asinh/x_r, 3e-7; each Y is good to 1e-7.
      expect(relative(gain, strength * integral(1 / early))).toBeLessThan(2e-6)
      const radiation = 1 / yieldOf(steps(), candidate) - 1 / yieldAt(steps(), candidate, early)
      expect(relative(radiation, strength / early)).toBeLessThan(2e-6)
      expect(gain / radiation).toBeLessThan(index === 1 ? 0.2 : 0.05)
    },
  )

  it('of an asymmetric candidate takes ln(Y₊/Y₋) up by ηλ/x (Graesser, Shoemaker, Vecchi, JHEP 10 (2011) 110)', () => {
    const asymmetry = 3 / strength
    const asymmetric = { ...candidate, mechanism: 'asymmetric', degreesOfFreedom: 4, asymmetry }
    const history = steps()
    const lnRatio = (total: number): number => Math.log1p((2 * asymmetry) / (total - asymmetry))
    const then = lnRatio(yieldAt(history, asymmetric, early))
    const now = lnRatio(yieldOf(history, asymmetric))
    // The difference is 0.05 of numbers known to 1e-7.
    expect(relative(now - then, (asymmetry * strength) / early)).toBeLessThan(2e-5)
  })
})

describe('freeze-in', () => {
  const massGeV = 1e7
  const lifetimeS = 1e-14
  const from = (statistics: string): number => {
    const parent = { massGeV, degreesOfFreedom: 3, statistics, lifetimeS }
    return yieldOf(steps(), { mechanism: 'freeze-in-decay', massGeV: 1, ...particle, parent })
  }

  it.each([
    ['boson', ZETA_5],
    ['fermion', (15 / 16) * ZETA_5],
  ])('by decay of a %s is the Maxwell–Boltzmann closed form times Σ(−η)^{k+1}/k⁵', (statistics, sum) => {
    const width = HBAR_GEV_S / lifetimeS
    // ∫ x³ K₁(kx) dx = 3π/(2k⁴), and each term has 1/k before it: DLMF 10.43.19.
    const boltzmann =
      (3 * width * massGeV ** 3 * ((3 * Math.PI) / 2)) /
      (2 * Math.PI ** 2 * ENTROPY * (HUBBLE / PLANCK_MASS_GEV) * massGeV ** 5)
    // Decays begin at x = 1e-5, where a share of x³ has been made; a boson's sum falls as 1/x⁴ there, a share of x² = 1e-10.
    expect(relative(from(statistics), boltzmann * sum)).toBeLessThan(1e-9)
    expect(relative(from('maxwell-boltzmann'), boltzmann)).toBeLessThan(1e-9)
  })

  it.each([-2, -3, -4.5])(
    'by collisions of massless particles, σ = σ₀(√s/E₀)^k with k = %f, is (3π/2) g₁g₂σ₀E₀^{−k} m^{k+1}/(−k−1) over 16π⁴ sH/T⁵',
    (exponent) => {
      const [candidateGeV, crossSectionGeVMinus2, referenceEnergyGeV] = [1e6, 1e-30, 3e6]
      const incoming = [
        { massGeV: 0, degreesOfFreedom: 2 },
        { massGeV: 0, degreesOfFreedom: 5 },
      ]
      const scattering = {
        kind: 'power-law',
        crossSectionGeVMinus2,
        referenceEnergyGeV,
        exponent,
        incoming,
      }
      const candidate = { mechanism: 'freeze-in-scattering', massGeV: candidateGeV, ...particle, scattering }
      // γ = g₁g₂T/(16π⁴) ∫_m σ r⁴ K₁(r/T) dr; in Y the integral over T at fixed r comes first, ∫ u³K₁ du = 3π/2.
      const energies =
        (crossSectionGeVMinus2 * (referenceEnergyGeV / candidateGeV) ** -exponent * candidateGeV) /
        (-exponent - 1)
      const closed =
        (10 * ((3 * Math.PI) / 2) * energies * PLANCK_MASS_GEV) / (16 * Math.PI ** 4 * ENTROPY * HUBBLE)
      // Collisions begin at 9e15 GeV: for k = −2 a share of m over it, 1e-10, is missing. γ is tabulated to 1e-10.
      expect(relative(yieldOf(steps(), candidate), closed)).toBeLessThan(2e-9)
    },
  )

  it('with inverse decays and a large width ends in equilibrium while relativistic: Y = (3/4) 2ζ(3)/π² · 45/(2π²g)', () => {
    const parent = { massGeV, degreesOfFreedom: 1, statistics: 'maxwell-boltzmann', lifetimeS: 1e-24 }
    const candidate = { mechanism: 'freeze-in-decay', massGeV: 1e-3, ...particle, parent, backReaction: true }
    const thermal = ((3 / 4) * ((2 * ZETA_3) / Math.PI ** 2)) / ENTROPY
    // Decoupled at x ≈ 30, of 1e7 GeV, where g is still 106.75: nothing pulls Y from Y_eq, which is constant.
    expect(relative(yieldOf(steps(), candidate), thermal)).toBeLessThan(1e-7)
  })

  it('with inverse decays interpolates as Y_eq (1 − e^{−Y_free/Y_eq}) for one candidate per decay', () => {
    const thermal = ((3 / 4) * ((2 * ZETA_3) / Math.PI ** 2)) / ENTROPY
    for (const tau of [1e-12, 1e-14, 3e-15, 1e-15, 1e-16]) {
      const parent = { massGeV, degreesOfFreedom: 1, statistics: 'maxwell-boltzmann', lifetimeS: tau }
      const decay = { mechanism: 'freeze-in-decay', massGeV: 1e-3, ...particle, parent }
      const free = yieldOf(steps(), decay)
      // dY = P (1 − Y/Y_eq) with Y_eq constant.
      const closed = -thermal * Math.expm1(-free / thermal)
      expect(relative(yieldOf(steps(), { ...decay, backReaction: true }), closed), `${tau} s`).toBeLessThan(
        1e-8,
      )
    }
  })
})

describe('an era of matter', () => {
  const history = (reheatTemperatureGeV: number, startTemperatureGeV: number) =>
    steps({ expansion: { kind: 'early-matter', reheatTemperatureGeV, startTemperatureGeV } })

  it('dilutes by 1.83 g^{1/4} m Y τ^{1/2}/M_Pl^{1/2} when it is long (Scherrer & Turner, PRD 31 (1985) 681)', () => {
    for (const [reheat, start] of [
      [1e4, 1e8],
      [1e6, 1e11],
    ] as const) {
      const { expansion, at } = history(reheat, start)
      if (!isMatterEra(expansion)) throw new Error('not an era of matter')
      const point = emptyExpansion()
      at(Math.log(start), point)
      const massTimesYield =
        (point.otherEnergy / point.entropy) * expansion.dilution * Math.exp(-point.lnDilution)
      const estimate = G ** 0.25 * massTimesYield * Math.sqrt(1 / expansion.widthGeV / PLANCK_MASS_GEV)
      // Three digits: half of the last is 0.3 %.
      expect(relative(expansion.dilution / estimate, 1.83)).toBeLessThan(3e-3)
    }
  })

  it('has ρ_φ ∝ T³ before it heats and T ∝ a^{−3/8}, H ∝ T⁴ while it does (Giudice, Kolb, Riotto, PRD 64 (2001) 023508)', () => {
    const { at } = history(1e4, 1e10)
    const slope = (f: (point: ReturnType<typeof emptyExpansion>) => number, T: number): number => {
      const point = emptyExpansion()
      at(Math.log(1.01 * T), point)
      const hot = f(point)
      at(Math.log(T / 1.01), point)
      return Math.log(hot / f(point)) / (2 * Math.log(1.01))
    }
    // At 1e9 GeV, a tenth of the start, the field has made 1e-10 of the entropy and is 10/11 of the energy.
    expect(slope((point) => point.otherEnergy, 1e9)).toBeCloseTo(3, 3)
    // Between T_RH and its own entropy, T ≪ T_RH (T_start/T_RH)^{1/5} = 1.6e5 GeV, not far enough for better than per cents.
    expect(slope((point) => point.hubble, 5e4)).toBeGreaterThan(3.7)
    expect(slope((point) => point.hubble, 5e4)).toBeLessThan(4.1)
    const point = emptyExpansion()
    at(Math.log(5e4), point)
    expect(point.stretch).toBeGreaterThan(2.4)
    expect(point.stretch).toBeLessThan(8 / 3 + 0.1)
  })
})

describe('a relic that has ceased to annihilate', () => {
  // σv ∝ T⁴: of 1/Y, (T/T_f)⁵ is still to come.
  const annihilation = { kind: 'power-law', coefficientCm3PerS: 1e-26, exponent: 4 }
  const candidate = { mechanism: 'freeze-out', massGeV: 1e7, ...particle, annihilation }
  const omega = (expansion: object): number =>
    abundance(buildHistory(historyInput.parse({ expansion })), candidateInput.parse(candidate)).omegaH2
  const standard = omega({ kind: 'radiation' })

  it('is diluted by D exactly in an entropy step', () => {
    for (const [temperatureGeV, factor] of [
      [10, 7],
      [0.01, 1e5],
    ] as const)
      // Each number is good to 2e-7.
      expect(
        relative(standard / omega({ kind: 'entropy-step', temperatureGeV, factor }), factor),
      ).toBeLessThan(1e-6)
  })

  it('is diluted by D exactly in an era of matter', () => {
    const expansion = { kind: 'early-matter', reheatTemperatureGeV: 0.005, startTemperatureGeV: 0.1 }
    const { expansion: era } = buildHistory(historyInput.parse({ expansion }))
    if (!isMatterEra(era)) throw new Error('not an era of matter')
    // At freeze-out near 4e5 GeV the field is 3e-7 of the radiation.
    const ratio = standard / omega(expansion)
    expect(relative(ratio, era.dilution)).toBeLessThan(1e-6)
    expect(era.dilution).toBeGreaterThan(10)
  })
})
