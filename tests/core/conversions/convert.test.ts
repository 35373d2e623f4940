import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ConvergenceError, computeConversion, computeHistory } from '#core/index'
import { EPOCH_QUANTITIES, InputError, NOT_INVERTIBLE, PARTICLE_QUANTITIES } from '#core/wire/index'
import type { EpochQuantity, HistoryRow, Quantity } from '#core/wire/index'
import { between, history as anyHistory } from '../arbitraries.ts'
import { historyFixture, relative } from '../fixtures.ts'

const INVERTIBLE = EPOCH_QUANTITIES.filter((name) => !NOT_INVERTIBLE.includes(name))

function convert(quantity: Quantity, values: number[], to: readonly Quantity[], history: unknown = {}) {
  return computeConversion({ history, from: { quantity, values }, to }).rows
}

function messageOf(input: unknown): string {
  try {
    computeConversion(input)
  } catch (error) {
    if (error instanceof InputError) return error.message
    throw error
  }
  return ''
}

describe('a moment of the history', () => {
  it('is told as in the derived history, column by column', () => {
    const temperatures = [1e9, 200, 0.15, 1e-3, 1e-4, 3e-7, 2.5e-10]
    const histories = [
      {},
      {
        bath: { treatment: 'lattice-2016' },
        expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 0.1 },
      },
    ]
    for (const history of histories)
      // Each temperature by itself: hotter than the start of the ages, they begin at the hottest of all asked for.
      for (const temperature of temperatures) {
        const [row] = computeHistory({ history, temperaturesGeV: [temperature] }).rows as [HistoryRow]
        const [told] = convert('temperatureGeV', [temperature], EPOCH_QUANTITIES, history) as [
          Record<EpochQuantity, number>,
        ]
        for (const name of EPOCH_QUANTITIES.filter((each) => each in row))
          // ln T and back is good to a few units in the last place, T⁴ to a dozen; ages to the panels of their quadrature.
          expect(relative(told[name], row[name as keyof HistoryRow] as number), name).toBeLessThan(
            name === 'timeS' ? 1e-10 : 1e-13,
          )
      }
  })

  it('is found again from any of its quantities, to 1e-10', () => {
    fc.assert(
      fc.property(
        anyHistory,
        between(1e-13, 1e12),
        fc.constantFrom(...INVERTIBLE),
        (history, temperature, quantity) => {
          let known: Partial<Record<Quantity, number>>
          try {
            ;[known] = convert('temperatureGeV', [temperature], [quantity], history) as [typeof known]
          } catch (error) {
            // Some drawn eras of matter are refused, or cannot be followed through a bath of steps.
            if (error instanceof InputError || error instanceof ConvergenceError) return
            throw error
          }
          // Today's acceleration brings waves back out; only those that enter are told by their frequency.
          if (quantity === 'waveFrequencyHz' && temperature < 1e-12) return
          const value = known[quantity]!
          const [back] = convert(quantity, [value], ['temperatureGeV', quantity], history) as [
            Record<Quantity, number>,
          ]
          expect(back[quantity]).toBe(value)
          const [again] = convert('temperatureGeV', [back.temperatureGeV], [quantity], history) as [
            Record<Quantity, number>,
          ]
          const offset = quantity === 'redshift' ? 1 : 0
          expect(relative(again[quantity] + offset, value + offset)).toBeLessThan(1e-10)
        },
      ),
      { numRuns: 150 },
    )
  }, 60_000)

  it('has the ages found independently', () => {
    for (const { history, temperatureAtZ1100GeV, ageAtZ1100Years } of historyFixture.ages) {
      const [row] = convert('temperatureGeV', [temperatureAtZ1100GeV], ['timeYears', 'redshift'], history)
      expect(relative(row!.timeYears!, ageAtZ1100Years)).toBeLessThan(1e-9)
      expect(relative(row!.redshift!, 1100)).toBeLessThan(1e-9)
      const [back] = convert('timeYears', [ageAtZ1100Years], ['temperatureGeV'], history)
      expect(relative(back!.temperatureGeV!, temperatureAtZ1100GeV)).toBeLessThan(1e-9)
    }
  })

  it('has 410.73 photons per cubic centimetre today', () => {
    // PDG 2024, Astrophysical constants: 410.73 (T/2.7255)³ cm⁻³.
    const [row] = convert('temperatureK', [2.7255], ['photonDensityPerCm3', 'temperatureGeV'])
    expect(relative(row!.photonDensityPerCm3!, 410.73)).toBeLessThan(2e-5)
    // k_B = 8.617333262e-5 eV/K (CODATA 2018, exact).
    expect(relative(row!.temperatureGeV!, 2.7255 * 8.617333262145179e-14)).toBeLessThan(1e-14)
  })

  it('answers in the order asked, and keeps the given numbers as they are', () => {
    const values = [1e-3, 1e10, 1]
    const rows = convert('timeS', values, ['temperatureGeV'])
    expect(rows.map(({ timeS }) => timeS)).toEqual(values)
    const [first, late, second] = rows.map(({ temperatureGeV }) => temperatureGeV!)
    expect(first! > second! && second! > late!).toBe(true)
  })
})

describe('a moment there is not', () => {
  const ask = (quantity: string, values: number[], history: unknown = {}) => ({
    history,
    from: { quantity, values },
    to: ['temperatureGeV'],
  })

  it('is refused with the range of the history', () => {
    expect(messageOf(ask('timeS', [1, -1, 1e300]))).toMatch(
      /^from\.values\[1\]: allowed: \S+ to \S+ in this history \(found -1\)\nfrom\.values\[2\]: allowed: .* \(found 1e\+300\)$/,
    )
    expect(messageOf(ask('redshift', [-1]))).toMatch(/^from\.values\[0\]: allowed: -0\.\d+ to /)
    expect(messageOf(ask('temperatureGeV', [1e17]))).toMatch(
      /allowed: 1\.00000e-14 to 1\.00000e\+16 in this history/,
    )
    // Nothing has entered the horizon below this frequency, and nothing will: the expansion accelerates.
    expect(messageOf(ask('waveFrequencyHz', [1e-19]))).toMatch(/allowed: 3\.0\d+e-19 to /)
  })

  it('is refused where a bath steps over it', () => {
    const thresholds = { bath: { treatment: 'thresholds' } }
    // At 4.183 GeV the bottom quark is counted or not (PDG 2024): a leaps by (g_hot/g_cold)^(1/3).
    const [hot, cold] = convert('temperatureGeV', [4.183001, 4.182999], ['scaleFactor'], thresholds).map(
      (row) => row.scaleFactor!,
    )
    expect(cold! / hot!).toBeGreaterThan(1.03)
    expect(messageOf(ask('scaleFactor', [Math.sqrt(cold! * hot!)], thresholds))).toMatch(
      /^from\.values\[0\]: allowed: a value the history passes through; at 4\.18300 GeV it steps from /,
    )
    // Time goes on there.
    const [before, after] = convert('temperatureGeV', [4.183001, 4.182999], ['timeS'], thresholds).map(
      (row) => row.timeS!,
    )
    expect(
      relative(
        convert('timeS', [(before! + after!) / 2], ['temperatureGeV'], thresholds)[0]!.temperatureGeV!,
        4.183,
      ),
    ).toBeLessThan(1e-6)
  })

  it('is refused for numbers that are the same at many', () => {
    expect(messageOf(ask('gRho', [10]))).toMatch(
      /^from\.quantity: allowed: a quantity that rises or falls throughout/,
    )
    expect(messageOf(ask('colour', [10]))).toMatch(/^from\.quantity: allowed: "temperatureGeV"/)
  })
})

it('is looked for only where the history has it, and never told as no number', () => {
  // A keV fermion apart weighs more today than a flat universe holds: Λ would be negative, and H ends.
  const hidden = { name: 'hidden', degreesOfFreedom: 1, statistics: 'fermion', massGeV: 1e-6 }
  const history = { extraSpecies: [{ ...hidden, coupling: { kind: 'decoupled', temperatureGeV: 0.01 } }] }
  expect(
    messageOf({ history, from: { quantity: 'temperatureGeV', values: [1e-13] }, to: ['hubbleGeV'] }),
  ).toBe(
    'from.values[0]: allowed: a moment at which hubbleGeV is a finite number in this history (found 1e-13)',
  )
  const [row] = convert('temperatureGeV', [1e-9], ['hubblePerS'], history)
  const [back] = convert('hubblePerS', [row!.hubblePerS!], ['temperatureGeV'], history)
  expect(relative(back!.temperatureGeV!, 1e-9)).toBeLessThan(1e-10)
})

describe('numbers of a particle', () => {
  it('are the published ones in other units', () => {
    // PDG 2024: muon τ = 2.1969811e-6 s, cτ = 658.6384 m; charged pion τ = 2.6033e-8 s, cτ = 7.8045 m.
    const lengths = convert('lifetimeS', [2.1969811e-6, 2.6033e-8], ['decayLengthM']).map(
      (row) => row.decayLengthM!,
    )
    expect(relative(lengths[0]!, 658.6384)).toBeLessThan(1e-7)
    expect(relative(lengths[1]!, 7.8045)).toBeLessThan(1e-5)
    // ħ = 6.582119569e-25 GeV s (CODATA 2018, exact).
    expect(
      relative(convert('widthGeV', [2.085], ['lifetimeS'])[0]!.lifetimeS!, 6.582119569e-25 / 2.085),
    ).toBeLessThan(1e-9)
    // 1 GeV⁻² = 0.3893793721 mb (PDG 2024), times c.
    const [sigma] = convert('sigmaVGeVMinus2', [1], ['sigmaVCm3PerS', 'sigmaVPicobarnC'])
    expect(relative(sigma!.sigmaVCm3PerS!, 0.3893793721e-27 * 2.99792458e10)).toBeLessThan(1e-9)
    expect(relative(sigma!.sigmaVPicobarnC!, 0.3893793721e9)).toBeLessThan(1e-9)
  })

  it('come back', () => {
    fc.assert(
      fc.property(
        between(1e-30, 1e30),
        fc.constantFrom(...PARTICLE_QUANTITIES),
        fc.constantFrom(...PARTICLE_QUANTITIES),
        (value, from, to) => {
          fc.pre(from.startsWith('sigma') === to.startsWith('sigma'))
          const there = convert(from, [value], [to])[0]![to]!
          expect(relative(convert(to, [there], [from])[0]![from]!, value)).toBeLessThan(1e-14)
        },
      ),
    )
  })

  it('are refused when they say something else, or nothing', () => {
    const ask = (quantity: string, values: number[], to: string[]) => ({ from: { quantity, values }, to })
    expect(messageOf(ask('lifetimeS', [1], ['widthGeV', 'sigmaVCm3PerS', 'timeS']))).toBe(
      'to[1]: allowed: what can be told from lifetimeS (found "sigmaVCm3PerS")\nto[2]: allowed: what can be told from lifetimeS (found "timeS")',
    )
    expect(messageOf(ask('timeS', [1], ['widthGeV']))).toMatch(
      /^to\[0\]: allowed: what can be told from timeS/,
    )
    expect(messageOf(ask('lifetimeS', [0], ['widthGeV']))).toBe('from.values[0]: allowed: above 0 (found 0)')
    expect(messageOf(ask('sigmaVCm3PerS', [1e300], ['sigmaVPicobarnC']))).toMatch(
      /conversions are finite numbers/,
    )
  })
})
