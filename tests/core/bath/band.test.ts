import { describe, expect, it } from 'vitest'
import { emptyPoint } from '#core/bath/bath'
import type { BathPoint } from '#core/bath/bath'
import { buildBath } from '#core/bath/buildBath'
import { LATTICE_2016_TABLE } from '#core/bath/treatments/lattice2016Table'
import { historyInput } from '#core/wire/index'
import { relative } from '../fixtures.ts'

function bathAt(bath: object, temperatureGeV: number): BathPoint {
  const parsed = historyInput.parse({ bath })
  const point = emptyPoint()
  buildBath(parsed.bath, parsed.neutrinos, []).evaluate(temperatureGeV, point)
  return point
}
const fit = (band: number, T: number): BathPoint => bathAt({ treatment: 'fit-2018', band }, T)

/** 10^0.5 MeV and 10^5.45 MeV, the rows between which the table is used. */
const [LOWEST, LAST] = [10 ** -2.5, 10 ** 2.45]
const inside = [0.004, 0.05, 0.13, 0.16, 1, 30, 250]

describe('the band of the 2018 fit', () => {
  it('is the 2016 table at +1 and its mirror image at −1, inside the table', () => {
    for (const T of inside) {
      const table = bathAt({ treatment: 'lattice-2016' }, T)
      const [centre, up, down] = [fit(0, T), fit(1, T), fit(-1, T)]
      for (const name of ['gRho', 'gS'] as const) {
        expect(relative(up[name], table[name]), `${name} at ${T}`).toBeLessThan(1e-14)
        expect(relative((up[name] + down[name]) / 2, centre[name]), `${name} at ${T}`).toBeLessThan(1e-14)
      }
    }
  })

  it('fades out over a decade beyond each end of the table, as 1 − (10z³ − 15z⁴ + 6z⁵)', () => {
    for (const [end, sign] of [
      [LOWEST, -1],
      [LAST, 1],
    ] as const) {
      const widthAt = (decades: number): number => {
        const T = end * 10 ** (sign * decades)
        return fit(1, T).gS / fit(0, T).gS - 1
      }
      // The table is read at its end, where the fit differs from itself by rounding.
      for (const z of [0.1, 0.5, 0.75, 0.95]) {
        const fade = 1 - (10 * z ** 3 - 15 * z ** 4 + 6 * z ** 5)
        expect(Math.abs(widthAt(z) / widthAt(0) - fade), `z = ${z}`).toBeLessThan(1e-10)
      }
      expect(widthAt(1.0001)).toBe(0)
    }
  })

  it('says how the bath is known: the table lies 2.5 to 5.5 % above the fit between 0.5 and 40 GeV', () => {
    for (let T = 0.5; T <= 40; T *= 1.2) {
      const width = fit(1, T).gRho / fit(0, T).gRho - 1
      expect(width, `T = ${T}`).toBeGreaterThan(0.024)
      expect(width, `T = ${T}`).toBeLessThan(0.056)
    }
  })
})

describe('the 2016 table', () => {
  it('is met at every row it is used at (Borsanyi et al. 2016, Table S2)', () => {
    for (const [logMeV, gRho, ratio] of LATTICE_2016_TABLE.slice(1)) {
      const point = bathAt({ treatment: 'lattice-2016' }, 10 ** (logMeV - 3))
      expect(relative(point.gRho, gRho), `10^${logMeV} MeV`).toBeLessThan(1e-12)
      expect(relative(point.gRho / point.gS, ratio), `10^${logMeV} MeV`).toBeLessThan(1e-12)
    }
  })

  it('goes over into the exact content of photons, electrons and neutrinos with a step of 0.03 %', () => {
    const [warm, cold] = [1 + 1e-9, 1 - 1e-9].map((side) =>
      bathAt({ treatment: 'lattice-2016' }, LOWEST * side),
    )
    expect(relative(cold!.gRho, warm!.gRho)).toBeLessThan(4e-4)
    expect(relative(cold!.gRho, warm!.gRho)).toBeGreaterThan(1e-5)
  })

  it('is continuous above its last row, and ends as an ideal gas', () => {
    const [below, above] = [1 - 1e-9, 1 + 1e-9].map((side) =>
      bathAt({ treatment: 'lattice-2016' }, LAST * side),
    )
    expect(relative(above!.gRho, below!.gRho)).toBeLessThan(1e-8)
    const late = bathAt({ treatment: 'lattice-2016' }, 1e8)
    // (T_last/T)² = 8e-12, and the top quark’s mass is gone as (m/T)².
    expect(relative(late.gRho, late.gS)).toBeLessThan(1e-9)
  })
})

describe('the whole baths', () => {
  it('need not obey dρ = T ds: the fit’s two numbers disagree by 2.5 % near 145 MeV, and nowhere by 4', () => {
    let worst = { residual: 0, T: 0 }
    for (let T = 0.05; T < 1; T *= 1.01) {
      // The fit itself steps at 120 MeV.
      if (Math.abs(T / 0.12 - 1) < 0.01) continue
      const h = 1e-4
      const perLnT = (f: (t: number) => number): number => (f(T * (1 + h)) - f(T * (1 - h))) / (2 * h)
      const energy = (3 / 4) * perLnT((t) => fit(0, t).gRho * t ** 4)
      const residual = Math.abs(energy / (T * perLnT((t) => fit(0, t).gS * t ** 3)) - 1)
      if (residual > worst.residual) worst = { residual, T }
    }
    expect(Math.abs(worst.T - 0.145)).toBeLessThan(0.005)
    expect(worst.residual).toBeGreaterThan(0.02)
    expect(worst.residual).toBeLessThan(0.04)
  })
})
