import { describe, expect, it } from 'vitest'
import { emptyPoint } from '#core/bath/bath'
import { buildBath } from '#core/bath/buildBath'
import { historyInput } from '#core/wire/index'
import { relative } from '../fixtures.ts'

/** Where the treatment is one pressure, and all else follows from it. */
const PRESSURE_DEFINED = ['thresholds', 'ideal-switch', 'crossover', 'lattice-2014'] as const

/** f′(T) by central differences, extrapolated twice (Richardson), with the change of the last extrapolation as its relative error. */
function derivative(f: (T: number) => number, T: number): { value: number; error: number } {
  const central = (h: number): number => (f(T * (1 + h)) - f(T * (1 - h))) / (2 * h * T)
  const [wide, middle, narrow] = [central(4e-3), central(2e-3), central(1e-3)]
  const once = [(4 * middle - wide) / 3, (4 * narrow - middle) / 3] as const
  const value = (16 * once[1] - once[0]) / 15
  return { value, error: Math.abs(value / once[1] - 1) }
}

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
        const pressure = derivative((t) => at(t).p, T)
        const entropy = derivative((t) => at(t).s, T)
        // Where the difference of two extrapolations is the larger part of the allowance, the bath changes within 1 %.
        expect(Math.abs(pressure.value / at(T).s - 1), `T = ${T}`).toBeLessThan(1e-9 + pressure.error)
        expect(Math.abs(entropy.value / at(T).ds - 1), `T = ${T}`).toBeLessThan(1e-8 + entropy.error)
        expect(pressure.error, `T = ${T}`).toBeLessThan(1e-7)
        expect(entropy.error, `T = ${T}`).toBeLessThan(1e-5)
      }
    },
  )
})
