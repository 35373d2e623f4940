import { describe, expect, it } from 'vitest'
import { LATTICE_2016_ROWS } from '#core/bath/treatments/lattice2016Table'
import { computeHistory } from '#core/index'
import type { HistoryRow } from '#core/wire/index'
import { bathFixture, relative, speciesFixture } from '../fixtures.ts'
import type { BathBlock } from '../fixtures.ts'

type Contribution = NonNullable<HistoryRow['contributions']>[number]

const rowsOf = (history: object, temperaturesGeV: number[]): HistoryRow[] =>
  computeHistory({ history, temperaturesGeV, contributions: true }).rows

const sum = (parts: readonly Contribution[], of: 'gRho' | 'gS'): number =>
  parts.reduce((total, part) => total + part[of], 0)

const named = (row: HistoryRow, name: string): Contribution | undefined =>
  row.contributions!.find((part) => part.name === name)

const blocks: readonly BathBlock[] = [
  ...bathFixture.blocks,
  ...bathFixture.extraSpeciesBlocks,
  { ...bathFixture.extraSpeciesBlocks[0]!, bath: { treatment: 'uploaded', points: LATTICE_2016_ROWS } },
]
const nameOf = ({ bath, neutrinos, extraSpecies }: BathBlock): string =>
  `${(bath as { treatment: string }).treatment}, ${(neutrinos as { treatment: string }).treatment}${extraSpecies ? ', extra species' : ''}`

describe('contributions', () => {
  it.each(blocks.map((block) => [nameOf(block), block] as const))(
    'add up to the numbers of their row, and to its pressure: %s',
    (_name, { rows, ...history }) => {
      const { bath, neutrinos, extraSpecies = [] } = history
      const temperatures = rows.map((row) => row.temperatureGeV)
      for (const row of rowsOf({ bath, neutrinos, extraSpecies }, temperatures)) {
        const parts = row.contributions!
        const at = `T = ${row.temperatureGeV} GeV`
        // Rounding of up to a hundred terms.
        expect(relative(sum(parts, 'gRho'), row.gRho), at).toBeLessThan(1e-13)
        expect(relative(sum(parts, 'gS'), row.gS), at).toBeLessThan(1e-13)
        expect(
          parts.every((part) => part.gRho >= 0 && part.gS >= 0),
          at,
        ).toBe(true)
        const known = parts.every((part) => part.gP !== null)
        expect(known, at).toBe(row.pressureGeV4 !== null)
        if (!known) continue
        const pressure = parts.reduce((total, part) => total + part.gP!, 0)
        expect(
          relative((Math.PI ** 2 / 90) * pressure * row.temperatureGeV ** 4, row.pressureGeV4!),
          at,
        ).toBeLessThan(1e-12)
      }
    },
  )

  it.each(bathFixture.extraSpeciesBlocks.map((block) => [nameOf(block), block] as const))(
    'give a species apart its own temperature and no entropy of the bath: %s',
    (_name, { rows, bath, neutrinos, extraSpecies }) => {
      const species = extraSpecies as { name: string; coupling: { kind: string } }[]
      const apart = species.filter(({ coupling }) => coupling.kind !== 'bath')
      const found = rowsOf(
        { bath, neutrinos, extraSpecies },
        rows.map((row) => row.temperatureGeV),
      )
      found.forEach((row, i) => {
        for (const { name, coupling } of species) {
          const part = named(row, name)
          if (coupling.kind === 'bath') {
            // Left out where nothing is left of it.
            if (part) expect(part.temperatureGeV).toBe(row.temperatureGeV)
          } else expect(part!.gS).toBe(0)
        }
        apart.forEach(({ name }, k) =>
          expect(
            relative(named(row, name)!.temperatureGeV, rows[i]!.temperaturesOfSpeciesApartGeV![k]!),
          ).toBeLessThan(1e-8),
        )
      })
    },
  )

  it('of an electron and of a W are those of one species in equilibrium, by independent quadrature', () => {
    for (const [name, statistics, mass, g] of [
      ['e', 'fermion', 0.51099895e-3, 4],
      ['W', 'boson', 80.3692, 6],
    ] as const)
      for (const point of speciesFixture.species) {
        if (point.statistics !== statistics || point.x === 0 || point.x > 50) continue
        const [row] = rowsOf({ bath: { treatment: 'ideal-switch' } }, [mass / point.x])
        const part = named(row!, name)!
        expect(relative(part.gRho, g * point['gRho']!), `x = ${point.x}`).toBeLessThan(1e-10)
        expect(relative(part.gS, g * point['gS']!), `x = ${point.x}`).toBeLessThan(1e-10)
        expect(relative(part.gP!, g * point['gP']!), `x = ${point.x}`).toBeLessThan(1e-10)
      }
  })

  it('of neutrinos are theirs, at a temperature of their own: (4/11)^(1/3) of the photons’ in the end (Kolb & Turner §3.5)', () => {
    // They let go while electrons count fully, so that the textbook's number is met.
    const history = {
      bath: { treatment: 'thresholds' },
      neutrinos: { treatment: 'instantaneous', decouplingTemperatureGeV: 0.01 },
    }
    const [hot, late] = rowsOf(history, [1, 1e-5])
    expect(named(hot!, 'ν')).toEqual({ name: 'ν', temperatureGeV: 1, gRho: 5.25, gS: 5.25, gP: 5.25 })
    const ratio = named(late!, 'ν')!.temperatureGeV / 1e-5
    expect(ratio).toBeCloseTo(Math.cbrt(4 / 11), 12)
    expect(named(late!, 'ν')!.gRho).toBeCloseTo(5.25 * ratio ** 4, 12)
    expect(late!.contributions!.map(({ name }) => name)).toEqual(['γ', 'ν'])
  })

  it('count the textbook’s species one by one: g = 2 of photons, 7/8 · 4 of each lepton, 16 of gluons', () => {
    const [row] = rowsOf({ bath: { treatment: 'thresholds' } }, [0.5])
    const weights = row!.contributions!.map(({ name, gRho }) => [name, gRho])
    expect(weights).toEqual([
      ['γ', 2],
      ['e', 3.5],
      ['μ', 3.5],
      ['u', 10.5],
      ['d', 10.5],
      ['s', 10.5],
      ['g', 16],
      ['ν', 5.25],
    ])
  })

  it('tell the strong part by its species wherever it is not a blend', () => {
    const names = (treatment: string, T: number): string[] =>
      rowsOf({ bath: { treatment } }, [T])[0]!.contributions!.map(({ name }) => name)
    expect(names('lattice-2014', 0.12)).toEqual(expect.arrayContaining(['π±', 'Δ(1232)']))
    expect(names('lattice-2014', 0.14)).toContain('strongly interacting')
    expect(names('lattice-2014', 0.3)).toEqual(expect.arrayContaining(['u, d, s, g', 'c', 'b']))
    expect(names('crossover', 0.005)).toContain('π±')
    expect(names('crossover', 0.15)).toEqual(['γ', 'e', 'μ', 'τ', 'strongly interacting', 'ν'])
    expect(names('fit-2018', 0.15)).toEqual(['whole bath'])
    expect(names('lattice-2016', 1e-3)).toEqual(['γ', 'e', 'ν'])
  })

  it('make the strong part of a crossover that of hadrons far below and of free quarks and gluons far above', () => {
    const strong = (T: number): number =>
      named(
        rowsOf({ bath: { treatment: 'crossover', transitionWidthGeV: 0.005 } }, [T])[0]!,
        'strongly interacting',
      )!.gS
    const hadrons = rowsOf({ bath: { treatment: 'ideal-switch' } }, [0.13])[0]!.contributions!
    const free = rowsOf({ bath: { treatment: 'ideal-switch' } }, [5])[0]!.contributions!
    const light = new Set(['γ', 'e', 'μ', 'τ', 'W', 'Z', 'H', 'ν'])
    const others = (parts: readonly Contribution[]): number =>
      sum(
        parts.filter(({ name }) => !light.has(name)),
        'gS',
      )
    // w = ½[1 + tanh(ln(T/T_c)/δ)] is 3e-3 at 130 MeV times ten times as many quarks, and 1 − 1e-93 at 5 GeV.
    expect(relative(strong(0.13), others(hadrons))).toBeLessThan(0.06)
    expect(relative(strong(5), others(free))).toBeLessThan(1e-12)
  })
})
