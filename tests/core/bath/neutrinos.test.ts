import { describe, expect, it } from 'vitest'
import { emptyPoint } from '#core/bath/bath'
import type { BathPoint } from '#core/bath/bath'
import { buildBath } from '#core/bath/buildBath'
import { entropyNumberToday } from '#core/bath/neutrinos'
import { historyInput } from '#core/wire/index'
import { ownValue, relative } from '../fixtures.ts'

const TEXTBOOK = Math.cbrt(4 / 11)

/** An ideal bath with these neutrinos at temperature T, GeV. */
function bathAt(neutrinos: object, temperatureGeV: number): BathPoint {
  const parsed = historyInput.parse({ bath: { treatment: 'ideal-switch' }, neutrinos })
  const point = emptyPoint()
  buildBath(parsed.bath, parsed.neutrinos, []).evaluate(temperatureGeV, point)
  return point
}

/** N_eff of a late bath: g_ρ = 2[1 + (7/8)(4/11)^{4/3} N_eff]. */
const effectiveNumber = ({ gRho }: BathPoint): number => (gRho / 2 - 1) / ((7 / 8) * (4 / 11) ** (4 / 3))

/** Colder than this no electron is left: m_e/T > 500. */
const COLD_GEV = 1e-6

describe('neutrinos', () => {
  it('share the temperature of all else down to their decoupling', () => {
    for (const treatment of ['instantaneous', 'specified']) {
      const above = bathAt({ treatment, decouplingTemperatureGeV: 0.002 }, 0.002)
      const sharing = bathAt({ treatment, decouplingTemperatureGeV: 1e-4 }, 0.002)
      expect(relative(above.gRho, sharing.gRho)).toBeLessThan(1e-14)
      expect(relative(above.gS, sharing.gS)).toBeLessThan(1e-14)
    }
  })

  it('are continuous where they decouple, however they are treated', () => {
    for (const treatment of ['instantaneous', 'specified']) {
      const neutrinos = { treatment, decouplingTemperatureGeV: 0.002 }
      const [warm, cold] = [bathAt(neutrinos, 0.002), bathAt(neutrinos, 0.002 * (1 - 1e-9))]
      // The slope of g is below one, so neighbours 1e-9 apart differ by less.
      expect(relative(warm.gRho, cold.gRho)).toBeLessThan(1e-9)
      expect(relative(warm.gS, cold.gS)).toBeLessThan(1e-9)
    }
  })

  it('end at (4/11)^(1/3) of the photons’ temperature, g_ρ = 3.363 and g_s = 3.909, when they let go early (PDG)', () => {
    const point = bathAt({ treatment: 'instantaneous', decouplingTemperatureGeV: 0.01 }, COLD_GEV)
    const ratio = ((point.gRho - 2) / 5.25) ** 0.25
    // At 10 MeV electrons lack 4e-4 of their entropy, and a few muons and pions are there.
    expect(relative(ratio, TEXTBOOK)).toBeLessThan(1e-3)
    expect(relative(point.gRho, 3.363)).toBeLessThan(2e-3)
    expect(relative(point.gS, 3.909)).toBeLessThan(2e-3)
  })

  it('end with N_eff = 3.018 when they let go instantly at 2 MeV, where electrons have begun to go', () => {
    const point = bathAt({ treatment: 'instantaneous', decouplingTemperatureGeV: 0.002 }, COLD_GEV)
    expect(Math.abs(effectiveNumber(point) - 3.018)).toBeLessThan(5e-4)
  })

  it.each([1, 3, 3.044, 4.5])(
    'end with exactly the N_eff that is specified, %f, and heated entropy',
    (nEff) => {
      const point = bathAt({ treatment: 'specified', nEff }, COLD_GEV)
      expect(relative(effectiveNumber(point), nEff)).toBeLessThan(1e-12)
      expect(relative(point.gS, 2 + (21 / 11) * (nEff / 3) ** 0.75)).toBeLessThan(1e-12)
    },
  )

  it('have today’s g_s of 3.909 for three, 3.930 for 3.044 heated, and 3.937 linear, as independent code has', () => {
    const today = (neutrinos: object): number =>
      entropyNumberToday(historyInput.parse({ neutrinos }).neutrinos)
    const pairs = [
      [{ treatment: 'instantaneous' }, 3.909, 'g_s today, N_eff=3'],
      [{ treatment: 'specified' }, 3.93, 'g_s today, N_eff=3.044'],
      [{ treatment: 'specified', entropyScaling: 'linear' }, 3.937, 'g_s today, N_eff=3.044, linear'],
    ] as const
    for (const [neutrinos, published, name] of pairs) {
      expect(Math.abs(today(neutrinos) - published)).toBeLessThan(5e-4)
      expect(relative(today(neutrinos), ownValue(name))).toBeLessThan(1e-14)
    }
  })
})
