import { describe, expect, it } from 'vitest'
import { scaledIntegrals, speciesDensities } from '#core/bath/speciesIntegrals'
import { addSpeciesAt, decaySum, logNumberDensity } from '#core/bath/speciesTable'
import { besselK } from '#core/numerics/special/besselK'
import { relative, speciesFixture } from '../fixtures.ts'

const regimes = [
  ['relativistic', 0, 0.3],
  ['transition', 0.3, 10],
  ['non-relativistic', 10, 101],
] as const

describe('one species in equilibrium', () => {
  it.each(regimes)('agrees with 30-digit quadrature to 1e-10, %s', (_name, from, to) => {
    const rows = speciesFixture.species.filter(({ x }) => x >= from && x < to)
    expect(rows.length).toBeGreaterThan(5)
    for (const row of rows) {
      const found = speciesDensities(row.x, row.statistics)
      const pairs = [
        [found.number, row['n']],
        [found.energy, row['rho']],
        [found.pressure, row['p']],
        [found.entropy, row['s']],
        [found.gN, row['gN']],
        [found.gRho, row['gRho']],
        [found.gP, row['gP']],
        [found.gS, row['gS']],
      ] as const
      for (const [value, expected] of pairs)
        expect(relative(value, expected!), `${row.statistics} x = ${row.x}`).toBeLessThan(1e-10)
    }
  })

  it('is tabulated with the same digits', () => {
    for (const statistics of ['fermion', 'boson', 'maxwell-boltzmann'] as const) {
      for (let x = 1.1e-5; x < 650; x *= 1.61) {
        const exact = scaledIntegrals(x, statistics)
        const jet = { value: 0, first: 0, second: 0 }
        addSpeciesAt(jet, x, 1, statistics)
        expect(relative(jet.value, exact.pressure * Math.exp(-x))).toBeLessThan(1e-12)
        expect(relative(jet.first, x * x * exact.i1 * Math.exp(-x))).toBeLessThan(1e-10)
        expect(Math.abs(logNumberDensity(x, statistics) - Math.log(exact.number) + x)).toBeLessThan(1e-11)
      }
    }
  })

  it('goes over into the Maxwell–Boltzmann asymptotics beyond the table', () => {
    const [inside, outside] = [logNumberDensity(999.9, 'fermion'), logNumberDensity(1000.1, 'fermion')]
    // The slope of ln n in x is −1 + 3/(2x) up to 1/x².
    expect(Math.abs(outside - inside - 0.2 * (-1 + 1.5 / 1000))).toBeLessThan(1e-6)
  })

  it('has K₁ as its decay sum for Maxwell–Boltzmann, and more of it for bosons', () => {
    for (const x of [0.01, 1, 8]) {
      expect(relative(decaySum(x, 'maxwell-boltzmann'), besselK(1, x))).toBeLessThan(1e-12)
      expect(decaySum(x, 'boson')).toBeGreaterThan(besselK(1, x))
      expect(decaySum(x, 'fermion')).toBeLessThan(besselK(1, x))
    }
  })

  it('has the textbook massless limits: 7/8 for fermions in energy, 3/4 in number (Kolb & Turner §3.3)', () => {
    expect(speciesDensities(0, 'fermion').gRho).toBeCloseTo(7 / 8, 14)
    expect(speciesDensities(0, 'fermion').gN).toBeCloseTo(3 / 4, 14)
    expect(speciesDensities(0, 'boson').gS).toBeCloseTo(1, 14)
  })
})
