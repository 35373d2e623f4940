import { describe, expect, it } from 'vitest'
import { emptyPoint } from '#core/bath/bath'
import { buildBath } from '#core/bath/buildBath'
import { latticePressure2014 } from '#core/bath/treatments/lattice2014'
import { emptyExpansion } from '#core/history/expansionPoint'
import { computeHistory } from '#core/index'
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

/** 1e-8, here and below, is what the product promises of its baths; the reference itself is good to 1e-12. */
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

  it.each(blocks)(
    'agrees in g_*^(1/2) and pressure, which is missing in the same places: %s',
    (_name, block) => {
      const { rows } = computeHistory({
        history: historyOf(block),
        temperaturesGeV: block.rows.map((row) => row.temperatureGeV),
      })
      rows.forEach((row, i) => {
        const expected = block.rows[i]!
        const at = `T = ${row.temperatureGeV} GeV`
        expect(relative(row.gStarHalf, expected['gStarHalf']!), at).toBeLessThan(1e-8)
        if (expected['pressureGeV4'] === undefined) expect(row.pressureGeV4, at).toBeNull()
        else expect(relative(row.pressureGeV4!, expected['pressureGeV4']), at).toBeLessThan(1e-8)
      })
    },
  )

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

  it('has the 2014 lattice pressure of 3.79 T⁴ at 400 MeV and the ideal 5.209 T⁴ in the end (HotQCD 2014)', () => {
    expect(latticePressure2014(0.4).value).toBeCloseTo(3.79, 2)
    expect(latticePressure2014(1e5).value).toBeCloseTo((95 * Math.PI ** 2) / 180, 4)
  })
})
