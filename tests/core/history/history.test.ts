import { describe, expect, it } from 'vitest'
import { computeHistory } from '#core/index'
import {
  CRITICAL_DENSITY_GEV4,
  GEV_PER_KELVIN,
  HBARC_GEV_CM,
  PLANCK_MASS_GEV,
  ZETA_3,
} from '#core/constants/natural'
import { emptyExpansion } from '#core/history/expansionPoint'
import { isMatterEra } from '#core/history/expansions/earlyMatter'
import { buildHistory } from '#core/history/thermalHistory'
import { historyInput } from '#core/wire/index'
import { historyFixture, relative } from '../fixtures.ts'
import type { HistoryBlock } from '../fixtures.ts'

const nameOf = ({ history }: HistoryBlock): string =>
  `${history.bath.treatment}, ${JSON.stringify(history.expansion)}`
const accepted = ({ history }: HistoryBlock): boolean => historyInput.safeParse(history).success

/** Fields of a reference row that a row of ours does not repeat. */
const NOT_IN_ROWS = ['fieldDensityGeV4']

function worstDeviation(block: HistoryBlock): Record<string, number> {
  const rows = block.rows!
  const { rows: found } = computeHistory({
    history: block.history,
    temperaturesGeV: rows.map((row) => row.temperatureGeV),
  })
  const worst: Record<string, number> = {}
  rows.forEach((row, i) => {
    for (const [field, expected] of Object.entries(row)) {
      if (NOT_IN_ROWS.includes(field)) continue
      const value = (found[i] as unknown as Record<string, number | null>)[field]
      if (typeof value !== 'number') throw new Error(`${field} is missing at T = ${row.temperatureGeV}`)
      const deviation = field === 'dLnGsDLnT' ? Math.abs(value - expected) : relative(value, expected)
      worst[field] = Math.max(worst[field] ?? 0, deviation)
    }
  })
  return worst
}

describe('a derived history', () => {
  const blocks = historyFixture.expansions
    .filter((block) => block.rows)
    .map((block) => [nameOf(block), block] as const)

  it.each(blocks)('agrees with independent rows to 1e-10, ages to 1e-9: %s', (_name, block) => {
    for (const [field, deviation] of Object.entries(worstDeviation(block)))
      expect(deviation, field).toBeLessThan(field === 'timeS' ? 1e-9 : 1e-10)
  })

  const eras = historyFixture.earlyMatter.filter(accepted).map((block) => [nameOf(block), block] as const)

  it.each(eras)('agrees with an independent era of matter to 1e-8, its own accuracy: %s', (_name, block) => {
    const { expansion } = buildHistory(historyInput.parse(block.history))
    if (!isMatterEra(expansion)) throw new Error('not an era of matter')
    expect(relative(expansion.dilution, block.outputs['dilution']!)).toBeLessThan(1e-8)
    expect(relative(expansion.startTemperatureGeV, block.outputs['startTemperatureGeV']!)).toBeLessThan(1e-8)
    expect(relative(expansion.widthGeV, block.outputs['gammaPhiGeV']!)).toBeLessThan(1e-10)
    if (block.rows)
      for (const deviation of Object.values(worstDeviation(block))) expect(deviation).toBeLessThan(1e-8)
  })

  it('dilutes as Scherrer & Turner (1985) estimate, within their few per cent', () => {
    for (const block of historyFixture.earlyMatter.filter(accepted)) {
      const estimate = block.outputs['scherrerTurnerEstimate']
      if (estimate === undefined || estimate < 20) continue
      const { expansion } = buildHistory(historyInput.parse(block.history))
      if (isMatterEra(expansion)) expect(relative(expansion.dilution, estimate)).toBeLessThan(0.05)
    }
  })

  it('is 365,567 years old at z = 1100 and 13.793 Gyr today (independent integration with matter and Λ)', () => {
    const year = 365.25 * 86_400
    const history = { bath: { treatment: 'ideal-switch' } }
    const today = 2.7255 * GEV_PER_KELVIN
    const { rows } = computeHistory({ history, temperaturesGeV: [1101 * today, today] })
    // a/a₀ = 1/1101 at T = 1101 T₀ up to the late drift of g_s, far below the digits asked for.
    expect(Math.abs(rows[0]!.timeS / year - 365_567)).toBeLessThan(5)
    expect(Math.abs(rows[1]!.timeS / year / 1e9 - 13.793)).toBeLessThan(0.001)
  })

  it('has s₀ = 2891.2 cm⁻³ for three neutrinos (PDG, Astrophysical constants)', () => {
    const { entropyTodayPerCm3 } = computeHistory({
      history: { neutrinos: { treatment: 'instantaneous' } },
      temperaturesGeV: [1],
    })
    expect(Math.abs(entropyTodayPerCm3 - 2891.2)).toBeLessThan(0.1)
  })

  it('has n_γ = 410.73 cm⁻³ and ρ_c = 1.053672e-5 h² GeV cm⁻³ (PDG)', () => {
    const T = 2.7255 * GEV_PER_KELVIN
    const photons = ((2 * ZETA_3) / Math.PI ** 2) * (T / HBARC_GEV_CM) ** 3
    expect(Math.abs(photons - 410.73)).toBeLessThan(0.005)
    expect(relative(CRITICAL_DENSITY_GEV4 / HBARC_GEV_CM ** 3, 1.053672e-5)).toBeLessThan(1e-6)
    expect(relative(PLANCK_MASS_GEV, 1.22089e19)).toBeLessThan(1e-6)
  })

  it('has t ≈ 2.42 g^(−1/2) (T/MeV)⁻² s while g is constant (Kolb & Turner §3.4)', () => {
    const { rows } = computeHistory({
      history: { bath: { treatment: 'thresholds' } },
      temperaturesGeV: [0.01],
    })
    // The coefficient is given to three digits; g changed 12-fold in steps before, which leaves per cents.
    expect(relative(rows[0]!.timeS, 2.42 / Math.sqrt(10.75) / 100)).toBeLessThan(0.02)
  })

  it('conserves energy, d(ρa³) = −p d(a³), by differences of its own rows', () => {
    for (const T of [0.05, 0.3, 30]) {
      const h = 1e-4
      const { rows } = computeHistory({
        history: { bath: { treatment: 'crossover' } },
        temperaturesGeV: [T * (1 + h), T, T * (1 - h)],
      })
      const volume = (i: number): number => rows[i]!.scaleFactor ** 3
      const energy =
        (rows[0]!.energyDensityGeV4 * volume(0) - rows[2]!.energyDensityGeV4 * volume(2)) / volume(1)
      const work = (-rows[1]!.pressureGeV4! * (volume(0) - volume(2))) / volume(1)
      // Central differences: h² of the fastest change.
      expect(relative(energy, work)).toBeLessThan(1e-6)
    }
  })

  it('reports what the fit misses of thermodynamics: up to 4 % near 150 MeV, nothing for a bath defined by its pressure', () => {
    const residuals = (treatment: string, temperaturesGeV: number[]): (number | null)[] =>
      computeHistory({ history: { bath: { treatment } }, temperaturesGeV }).rows.map(
        (row) => row.identityResidual,
      )
    const grid = Array.from({ length: 60 }, (_, i) => 0.13 + i * 0.001)
    const largest = Math.max(...residuals('fit-2018', grid).map((residual) => Math.abs(residual!)))
    expect(largest).toBeGreaterThan(0.01)
    expect(largest).toBeLessThan(0.05)
    expect(residuals('crossover', [0.15, 1])).toEqual([0, 0])
    expect(residuals('fit-2018', [1e-3])).toEqual([null])
  })

  it('says why a pressure is missing, and null stands where it is', () => {
    const result = computeHistory({ history: {}, temperaturesGeV: [1e-3, 1] })
    expect(result.rows[0]!.pressureGeV4).toBeNull()
    expect(result.rows[1]!.pressureGeV4).toBeGreaterThan(0)
    expect(result.pressureUndefinedBecause).toContain('2018 fit')
  })

  it('answers in the order asked', () => {
    const temperaturesGeV = [1, 100, 0.01]
    expect(computeHistory({ history: {}, temperaturesGeV }).rows.map((row) => row.temperatureGeV)).toEqual(
      temperaturesGeV,
    )
  })

  it('expands as T^(2 + n/2) when a fluid dominates (D’Eramo, Fernandez, Profumo 2017)', () => {
    const history = buildHistory(
      historyInput.parse({
        bath: { treatment: 'thresholds' },
        expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 0.01 },
      }),
    )
    const point = emptyExpansion()
    const hubbleAt = (T: number): number => {
      history.at(Math.log(T), point)
      return point.hubble
    }
    // Between two temperatures without a step of the bath; radiation is (0.01/300)² of the fluid.
    expect(Math.log(hubbleAt(600) / hubbleAt(300)) / Math.LN2).toBeCloseTo(3, 6)
  })
})
