import { describe, expect, it } from 'vitest'
import { CRITICAL_DENSITY_GEV4, GEV_PER_KELVIN, HBAR_GEV_S, PLANCK_MASS_GEV } from '#core/constants/natural'
import { computeAbundance, computeLaboratory } from '#core/index'
import { InputError, USUAL_REACH_BANDS } from '#core/wire/index'
import type { LaboratoryResult } from '#core/wire/index'
import { relative } from '../fixtures.ts'

const exact = (value: number) => ({ value, minus: 0, plus: 0 })

const measured = {
  parentMassGeV: { value: 300, minus: 10, plus: 10 },
  lifetimeS: { value: 1e-9, minus: 2e-10, plus: 3e-10 },
  massGeV: { value: 1e-5, minus: 1e-6, plus: 1e-6 },
}
const asked = { history: {}, measured, parent: { degreesOfFreedom: 1, statistics: 'boson' }, samples: 50 }

/** Far above all masses the textbook bath has 106.75 states throughout the production, so that the closed form is exact. */
const CONSTANT_G = 106.75
const constantG = {
  ...asked,
  history: { bath: { treatment: 'thresholds' }, neutrinos: { treatment: 'instantaneous' } },
  measured: { parentMassGeV: exact(1e6), lifetimeS: exact(1e-12), massGeV: exact(0.1) },
  parent: { degreesOfFreedom: 1, statistics: 'maxwell-boltzmann' },
  measuredDensity: exact(0.12),
}

/** Y = n_X g_B Γ M_Pl 45 (3π/2)/(4π⁴ g_s √(4π³g_ρ/45) m_B²), from ∫x³K₁ = 3π/2 (Hall et al., JHEP 03 (2010) 080). */
function closedForm(parentMassGeV: number, lifetimeS: number, massGeV: number): number {
  const hubblePerT2 = Math.sqrt((4 * Math.PI ** 3 * CONSTANT_G) / 45) / PLANCK_MASS_GEV
  const entropyPerT3 = (2 * Math.PI ** 2 * CONSTANT_G) / 45
  const perEntropy =
    ((HBAR_GEV_S / lifetimeS) * 1.5 * Math.PI) /
    (2 * Math.PI ** 2 * entropyPerT3 * hubblePerT2 * parentMassGeV ** 2)
  const entropyToday = ((2 * Math.PI ** 2) / 45) * (43 / 11) * (2.7255 * GEV_PER_KELVIN) ** 3
  return (massGeV * perEntropy * entropyToday) / CRITICAL_DENSITY_GEV4
}

describe('the laboratory check', () => {
  it('has the closed form where the number of states is constant, and is the abundance everywhere', () => {
    const { central, omegaH2, comparison } = computeLaboratory(constantG)
    // The solver states 1e-9 or so.
    expect(relative(central.omegaH2, closedForm(1e6, 1e-12, 0.1))).toBeLessThan(1e-8)
    expect(omegaH2.smallest).toBe(omegaH2.largest)
    expect(comparison.pull).toBeNull()
    const candidate = {
      mechanism: 'freeze-in-decay',
      massGeV: 1e-5,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-9 },
    }
    expect(computeLaboratory(asked).central.omegaH2).toBe(
      computeAbundance({ history: {}, candidate }).omegaH2,
    )
  })

  it('finds the lifetime of the published formula, 6.7e-3 s (m_X/100 GeV)(300 GeV/m_B)²(100/g)^(3/2)', () => {
    const published = 6.7e-3 * (0.1 / 100) * (300 / 1e6) ** 2 * (100 / CONSTANT_G) ** 1.5
    const [needed] = computeLaboratory(constantG).needed.lifetimes
    // Two digits: half of the last is 0.75 %.
    expect(relative(needed!.lifetimeS, published)).toBeLessThan(0.0075)
    // Exactly: Ωh² is inverse to the lifetime.
    expect(relative(needed!.lifetimeS, (1e-12 * closedForm(1e6, 1e-12, 0.1)) / 0.12)).toBeLessThan(1e-8)
  })

  it('propagates errors as the closed form does: ln Ω = ln m_X − 2 ln m_B − ln τ + const', () => {
    const errors = { parentMassGeV: 0.01, lifetimeS: 0.03, massGeV: 0.02 }
    const within = (value: number, error: number) => ({ value, minus: value * error, plus: value * error })
    const { omegaH2, comparison, rankCorrelations } = computeLaboratory({
      ...constantG,
      measured: {
        parentMassGeV: within(1e6, errors.parentMassGeV),
        lifetimeS: within(1e-12, errors.lifetimeS),
        massGeV: within(0.1, errors.massGeV),
      },
      measuredDensity: { value: 0.12, minus: 0.0012, plus: 0.0012 },
      samples: 2000,
    })
    const width = Math.hypot(2 * errors.parentMassGeV, errors.lifetimeS, errors.massGeV)
    // Columns of 2000 correlate by chance to 1/√2000 = 2 %, which is at most that much of the width.
    expect(relative(omegaH2.standardDeviationOfLn, width)).toBeLessThan(0.03)
    // Second order of the errors, and their mean, are of order 1e-3.
    expect(Math.abs(omegaH2.meanOfLn - Math.log(closedForm(1e6, 1e-12, 0.1)))).toBeLessThan(2e-3)
    const distance = Math.log(closedForm(1e6, 1e-12, 0.1) / 0.12)
    expect(relative(comparison.pull!, distance / Math.hypot(width, 0.01))).toBeLessThan(0.06)
    expect(rankCorrelations.map(({ path }) => path)).toEqual(
      ['parentMassGeV', 'lifetimeS', 'massGeV'].map((name) => `measured.${name}`),
    )
    expect(rankCorrelations.map(({ value }) => Math.sign(value!))).toEqual([-1, -1, 1])
  })

  it('says which share of the dark matter is explained', () => {
    const { central, comparison, omegaH2 } = computeLaboratory(asked)
    comparison.share.quantiles.forEach(({ value }, i) =>
      expect(relative(value, omegaH2.quantiles[i]!.value / 0.12)).toBeLessThan(1e-12),
    )
    expect(central.omegaH2).toBeGreaterThan(omegaH2.quantiles[1]!.value)
    expect(comparison.measured).toEqual({ value: 0.12, minus: 0.0012, plus: 0.0012 })
  })
})

describe('the flight of the parent', () => {
  const flight = (lifetimeS: number, more = {}): LaboratoryResult['flight'] =>
    computeLaboratory({
      ...asked,
      measured: { ...measured, lifetimeS: exact(lifetimeS) },
      samples: 10,
      ...more,
    }).flight

  it('is 0.299792458 m for a nanosecond at βγ = 1, exactly as the metre is defined', () => {
    const { decayLengthM, meanFlightM } = flight(1e-9)
    expect(relative(decayLengthM.value, 0.299792458)).toBeLessThan(1e-15)
    expect(meanFlightM.value).toBe(decayLengthM.value)
    expect(relative(flight(1e-9, { betaGamma: 4 }).meanFlightM.value, 4 * 0.299792458)).toBeLessThan(1e-15)
  })

  it('falls into the bands, and its decays are shared out among them', () => {
    const { bands } = flight(1e-9)
    expect(bands.filter(({ holdsMean }) => holdsMean).map(({ name }) => name)).toEqual(['displaced'])
    const length = bands.filter(({ quantity }) => quantity === 'meanFlightM')
    expect(Math.abs(length.reduce((sum, { decayShare }) => sum + decayShare, 0) - 1)).toBeLessThan(1e-14)
    const mean = 0.299792458
    expect(relative(length[1]!.decayShare, Math.exp(-1e-4 / mean) - Math.exp(-1 / mean))).toBeLessThan(1e-14)
    const late = flight(1e-3).bands.filter(({ holdsMean }) => holdsMean)
    expect(late.map(({ name }) => name)).toEqual(['leaves the detector', 'stopped, decaying later'])
    // A thousand kilometres: one in 1e10 decays within 0.1 mm of the start.
    const prompt = flight(1e-3 / 0.299792458).bands[0]!.decayShare
    expect(relative(prompt, 1e-10)).toBeLessThan(1e-9)
  })

  it('is a displaced vertex for a parent of 300 GeV and a candidate of a few keV', () => {
    // Common practice, no source.
    for (const massGeV of [1e-6, 3e-6, 1e-5]) {
      const { needed } = computeLaboratory({
        ...asked,
        measured: { ...measured, massGeV: exact(massGeV) },
        samples: 10,
      })
      expect(needed.lifetimes.map(({ bands }) => bands)).toEqual([['displaced']])
    }
  })

  it('takes the bands a group writes, and says of its own that they are common practice', () => {
    const bands = [{ name: 'ours', quantity: 'meanFlightM', from: 0.1, to: 1, source: 'our calorimeter' }]
    expect(flight(1e-9, { reachBands: bands }).bands).toMatchObject([{ ...bands[0], holdsMean: true }])
    for (const { source } of USUAL_REACH_BANDS) expect(source).toBe('common practice, no source')
  })
})

describe('the lifetime–mass line', () => {
  const omegaAt = (lifetimeS: number, massGeV: number, more: object = {}, parent: object = {}): number =>
    computeAbundance({
      history: {},
      candidate: {
        mechanism: 'freeze-in-decay',
        massGeV,
        degreesOfFreedom: 2,
        statistics: 'fermion',
        parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS, ...parent },
        ...more,
      },
    }).omegaH2

  it('is straight while the parent stays in equilibrium, and gives the measured density', () => {
    const { line } = computeLaboratory({ ...asked, line: { fromGeV: 1e-5, toGeV: 100, points: 4 } })
    expect(line!.map(({ massGeV }) => massGeV)).toHaveLength(4)
    expect([line![0]!.massGeV, line![3]!.massGeV]).toEqual([1e-5, 100])
    for (const { massGeV, lifetimes } of line!) {
      expect(lifetimes).toHaveLength(1)
      expect(relative(omegaAt(lifetimes[0]!.lifetimeS, massGeV), 0.12)).toBeLessThan(1e-9)
      expect(
        relative(lifetimes[0]!.lifetimeS / massGeV, line![0]!.lifetimes[0]!.lifetimeS / 1e-5),
      ).toBeLessThan(1e-9)
    }
  })

  it('has a band of one standard deviation: density and mass of the parent in quadrature', () => {
    const { needed } = computeLaboratory({
      ...constantG,
      measured: { ...constantG.measured, parentMassGeV: { value: 1e6, minus: 2e4, plus: 1e4 } },
      measuredDensity: { value: 0.12, minus: 0.0024, plus: 0.0012 },
    })
    const [{ lifetimeS, lowS, highS }] = needed.lifetimes as [(typeof needed.lifetimes)[number]]
    // τ ∝ 1/(Ωh² m_B²).
    const up = Math.hypot(Math.log(0.98), 2 * Math.log(0.98))
    const down = Math.hypot(Math.log(1.01), 2 * Math.log(1.01))
    expect(relative(Math.log(highS! / lifetimeS), up)).toBeLessThan(1e-6)
    expect(relative(Math.log(lifetimeS / lowS!), down)).toBeLessThan(1e-6)
  })

  it('bends where the parent freezes out before it decays, and ends where its decays alone are too many', () => {
    const annihilation = { kind: 'partial-waves', sWaveCm3PerS: 1e-27 }
    const { line } = computeLaboratory({
      ...asked,
      measured: { ...measured, parentMassGeV: exact(300) },
      parent: { ...asked.parent, annihilation },
      measuredDensity: exact(0.12),
      samples: 10,
      line: { fromGeV: 1, toGeV: 100, points: 2 },
    })
    const [light, heavy] = line!
    expect(light!.lifetimes).toHaveLength(1)
    const { lifetimeS } = light!.lifetimes[0]!
    expect(relative(omegaAt(lifetimeS, 1, {}, { annihilation }), 0.12)).toBeLessThan(1e-6)
    // Not the straight line's: the frozen-out parents add theirs.
    expect(
      lifetimeS /
        computeLaboratory({ ...asked, measured: { ...measured, massGeV: exact(1) } }).needed.lifetimes[0]!
          .lifetimeS,
    ).toBeGreaterThan(1.03)
    expect(heavy!.lifetimes).toEqual([])
    expect(heavy!.closest!.omegaH2).toBeGreaterThan(0.12)
  }, 60_000)

  it('knows the mass of the candidate where inverse decays are kept', () => {
    const backReaction = { backReaction: true }
    const { line } = computeLaboratory({
      ...asked,
      candidate: backReaction,
      samples: 10,
      line: { fromGeV: 1e-7, toGeV: 1e-6, points: 2 },
    })
    for (const { massGeV, lifetimes } of line!)
      expect(relative(omegaAt(lifetimes[0]!.lifetimeS, massGeV, backReaction), 0.12)).toBeLessThan(1e-6)
    expect(relative(omegaAt(line![0]!.lifetimes[0]!.lifetimeS, 1e-7), 0.12)).toBeGreaterThan(1e-3)
  }, 60_000)
})

describe('a laboratory question with a fault', () => {
  const faults = (change: object): string => {
    try {
      computeLaboratory({ ...asked, ...change })
    } catch (error) {
      if (error instanceof InputError) return error.message
      throw error
    }
    return ''
  }

  it('is told where it was asked', () => {
    expect(faults({ measured: { ...measured, massGeV: exact(400) } })).toMatch(
      /^measured\.massGeV\.value: measured\.massGeV: allowed: at most the mass of the parent divided by perDecay \(found 400\)$/,
    )
    expect(faults({ measured: { ...measured, lifetimeS: exact(1e26) } })).toMatch(
      /^measured\.lifetimeS\.value: .* at most/,
    )
    expect(faults({ measured: { ...measured, lifetimeS: { value: 1, minus: -1, plus: 0 } } })).toMatch(
      /^measured\.lifetimeS\.minus: /,
    )
    expect(faults({ line: { fromGeV: 1, toGeV: 301 } })).toBe(
      'line.toGeV: allowed: at most 300, the mass of the parent divided by perDecay (found 301)',
    )
    expect(faults({ parent: { degreesOfFreedom: 1, statistics: 'boson', massGeV: 3 } })).toMatch(
      /^parent\.massGeV: not a name known here/,
    )
    expect(faults({ measuredDensity: { value: 0.1, minus: 0.1, plus: 0 } })).toMatch(
      /^measuredDensity\.minus: allowed: below the value/,
    )
  })

  it('says so when too many samples are impossible', () => {
    const wide = { value: 290, minus: 100, plus: 100 }
    expect(faults({ measured: { ...measured, massGeV: wide }, samples: 100 })).toMatch(
      /^measured: \d+ samples have no abundance.*measured\.massGeV: allowed: at most the mass/,
    )
    const { failures } = computeLaboratory({
      ...asked,
      measured: { ...measured, massGeV: wide },
      samples: 100,
      largestFailedShare: 0.9,
    })
    expect(failures[0]!.path).toBe('measured.massGeV')
  })
})
