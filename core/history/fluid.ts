/**
 * A fluid that thins out faster than radiation, ρ_η ∝ a^{−(4+n)} with n > 0 (n = 2: kination), in units of the bath's T:
 *
 *   ρ_η = ρ_R(T_r) [g_s(T)/g_s(T_r)]^{(4+n)/3} (T/T_r)^{4+n},
 *
 * equal to the radiation, extra species included, at T_r. Its pressure is (1 + n)/3 of its energy density.
 * Source: D'Eramo, Fernandez, Profumo, JCAP 05 (2017) 012, eq. 2.4.
 */
import { emptyPoint } from '../bath/bath.ts'
import type { ExpansionInput } from '../wire/history.ts'
import type { Radiation } from './radiation.ts'

export interface FluidDensity {
  /** n. */
  readonly index: number
  /** Energy density, GeV⁴, at temperature T, GeV, where the bath has that g_s. */
  energy(temperatureGeV: number, gS: number): number
}

export function fluidDensity(
  expansion: Extract<ExpansionInput, { kind: 'fluid' }>,
  radiation: Radiation,
): FluidDensity {
  const { index, equalityTemperatureGeV: equality } = expansion
  const point = emptyPoint()
  const apart = { gRho: 0, gP: 0 }
  radiation.bath.evaluate(equality, point)
  radiation.apart.evaluate(equality, point.gS, apart)
  const density = (Math.PI ** 2 / 30) * (point.gRho + apart.gRho) * equality ** 4
  const { gS: gSThere } = point
  return {
    index,
    energy: (temperatureGeV, gS) =>
      density * (gS / gSThere) ** ((4 + index) / 3) * (temperatureGeV / equality) ** (4 + index),
  }
}
