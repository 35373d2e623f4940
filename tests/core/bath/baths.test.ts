import { describe, expect, it } from 'vitest'
import { emptyPoint } from '#core/bath/bath'
import { buildBath } from '#core/bath/buildBath'
import { latticePressure2014 } from '#core/bath/treatments/lattice2014'
import { emptyExpansion } from '#core/history/expansionPoint'
import { buildHistory } from '#core/history/thermalHistory'
import { historyInput } from '#core/wire/index'
import type { HistoryInput } from '#core/wire/index'
import { bathFixture, relative } from '../fixtures.ts'
import type { BathBlock } from '../fixtures.ts'

const historyOf = ({ bath, neutrinos, extraSpecies = [] }: BathBlock): HistoryInput =>
  historyInput.parse({ bath, neutrinos, extraSpecies })

function nameOf(block: BathBlock): string {
  const { bath, neutrinos, extraSpecies } = historyOf(block)
  const species = extraSpecies.map((each) => each.coupling.kind).join(' and ')
  return `${bath.treatment}${'band' in bath ? ` band ${bath.band}` : ''}${'hadrons' in bath ? ` ${bath.hadrons} hadrons` : ''}, ${neutrinos.treatment} neutrinos${species ? `, with a species: ${species}` : ''}`
}

const blocks = [...bathFixture.blocks, ...bathFixture.extraSpeciesBlocks].map(
  (block) => [nameOf(block), block] as const,
)

describe('every treatment of the bath', () => {
  it.each(blocks)('agrees with independent numbers to 1e-8: %s', (_name, block) => {
    const history = buildHistory(historyOf(block))
    const { bath, apart } = history.radiation
    const point = emptyPoint()
    const other = { gRho: 0, gP: 0 }
    const tabulated = emptyExpansion()
    for (const row of block.rows) {
      const T = row.temperatureGeV
      const at = `T = ${T} GeV`
      bath.evaluate(T, point)
      apart.evaluate(T, point.gS, other)
      expect(relative(point.gRho + other.gRho, row['gRho']!), at).toBeLessThan(1e-8)
      expect(relative(point.gS, row['gS']!), at).toBeLessThan(1e-8)
      // A slope that can vanish is compared as it stands.
      expect(Math.abs(point.gSSlope / point.gS - row['dLnGsDLnT']!), at).toBeLessThan(1e-8)
      history.at(Math.log(T), tabulated)
      expect(relative(tabulated.gRho, row['gRho']!), at).toBeLessThan(1e-8)
      expect(relative(tabulated.gS, row['gS']!), at).toBeLessThan(1e-8)
      apart
        .temperatures(T, point.gS)
        .forEach((own, i) =>
          expect(relative(own, row.temperaturesOfSpeciesApartGeV![i]!), at).toBeLessThan(1e-8),
        )
    }
  })

  it('counts what the handbooks count: 106.75, 96.25, 86.25, 75.75, 72.25, 61.75, 17.25, 14.25, 10.75 (PDG, Kolb & Turner fig. 3.5)', () => {
    const { bath, neutrinos } = historyInput.parse({ bath: { treatment: 'thresholds' } })
    const steps = buildBath(bath, neutrinos, [])
    const point = emptyPoint()
    const count = (T: number): number => {
      steps.evaluate(T, point)
      return point.gRho
    }
    const handbook = [
      [200, 106.75],
      [150, 96.25],
      [50, 86.25],
      [3, 75.75],
      [1.5, 72.25],
      [0.5, 61.75],
      [0.15, 17.25],
      [0.12, 14.25],
      [0.05, 10.75],
    ] as const
    for (const [T, g] of handbook) expect(count(T), `T = ${T} GeV`).toBeCloseTo(g, 10)
  })

  it('ends at today’s textbook numbers 3.363 and 3.909 for three instantly decoupled neutrinos far below their decoupling (PDG)', () => {
    const { bath, neutrinos } = historyInput.parse({
      bath: { treatment: 'ideal-switch' },
      neutrinos: { treatment: 'instantaneous', decouplingTemperatureGeV: 0.01 },
    })
    const point = emptyPoint()
    buildBath(bath, neutrinos, []).evaluate(1e-6, point)
    // At 10 MeV electrons are relativistic to 4e-4 of their share and muons add 1e-3: less than the third decimal's neighbour.
    expect(Math.abs(point.gRho - 3.363)).toBeLessThan(0.01)
    expect(Math.abs(point.gS - 3.909)).toBeLessThan(0.01)
  })

  it('has exactly N_eff late, when N_eff is specified', () => {
    const { bath, neutrinos } = historyInput.parse({
      bath: { treatment: 'ideal-switch' },
      neutrinos: { treatment: 'specified', nEff: 3.3 },
    })
    const point = emptyPoint()
    buildBath(bath, neutrinos, []).evaluate(1e-7, point)
    expect(point.gRho).toBeCloseTo(2 * (1 + (7 / 8) * (4 / 11) ** (4 / 3) * 3.3), 9)
    expect(point.gS).toBeCloseTo(2 + (21 / 11) * (3.3 / 3) ** 0.75, 9)
  })

  it('has the 2014 lattice pressure of 3.79 T⁴ at 400 MeV and the ideal 5.209 T⁴ in the end (HotQCD 2014)', () => {
    expect(latticePressure2014(0.4).value).toBeCloseTo(3.79, 2)
    expect(latticePressure2014(1e5).value).toBeCloseTo((95 * Math.PI ** 2) / 180, 4)
  })
})

const PRESSURE_DEFINED = ['thresholds', 'ideal-switch', 'crossover', 'lattice-2014'] as const

describe('thermodynamic identities', () => {
  /** p/T⁴ as a function, for a numerical derivative. */
  const partsOf = (treatment: string) => {
    const { bath, neutrinos } = historyInput.parse({
      bath: { treatment },
      neutrinos: { treatment: 'instantaneous' },
    })
    const part = buildBath(bath, neutrinos, [])
    return (T: number) => {
      const point = emptyPoint()
      part.evaluate(T, point)
      return {
        p: (Math.PI ** 2 / 90) * point.gP * T ** 4,
        rho: (Math.PI ** 2 / 30) * point.gRho * T ** 4,
        s: ((2 * Math.PI ** 2) / 45) * point.gS * T ** 3,
        ds: ((2 * Math.PI ** 2) / 45) * (3 * point.gS + point.gSSlope) * T ** 2,
      }
    }
  }
  const temperatures = [0.011, 0.07, 0.14, 0.16, 0.3, 2.2, 40, 700]

  it.each(PRESSURE_DEFINED)(
    'ρ + p = Ts holds to rounding where all share one temperature: %s',
    (treatment) => {
      const at = partsOf(treatment)
      for (const T of temperatures) {
        const { p, rho, s } = at(T)
        expect(relative(rho + p, T * s), `T = ${T}`).toBeLessThan(1e-13)
      }
    },
  )

  it.each(PRESSURE_DEFINED.filter((treatment) => treatment !== 'thresholds'))(
    's = dp/dT and its own slope is its derivative: %s',
    (treatment) => {
      const at = partsOf(treatment)
      for (const T of temperatures) {
        // Central differences extrapolated once: error of order h⁴ ≈ 1e-10 of the fastest change, a 13 % wide crossover.
        const derivative = (f: (T: number) => number): number => {
          const central = (h: number): number => (f(T * (1 + h)) - f(T * (1 - h))) / (2 * h * T)
          return (4 * central(1e-3) - central(2e-3)) / 3
        }
        expect(
          relative(
            derivative((T) => at(T).p),
            at(T).s,
          ),
          `T = ${T}`,
        ).toBeLessThan(2e-8)
        expect(
          relative(
            derivative((T) => at(T).s),
            at(T).ds,
          ),
          `T = ${T}`,
        ).toBeLessThan(2e-6)
      }
    },
  )
})
