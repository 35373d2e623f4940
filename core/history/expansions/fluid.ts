/**
 * A fluid that thins out faster than radiation, ρ_η ∝ a^{−(4+n)} with n > 0 (n = 2: kination), in units of the bath's T:
 *
 *   ρ_η = ρ_R(T_r) [g_s(T)/g_s(T_r)]^{(4+n)/3} (T/T_r)^{4+n},
 *
 * equal to the radiation, extra species included, at T_r. Its pressure is (1 + n)/3 of its energy density.
 * Source: D'Eramo, Fernandez, Profumo, JCAP 05 (2017) 012, eq. 2.4.
 */
import { emptyPoint } from '../../bath/bath.ts'
import type { ExpansionInput } from '../../wire/history.ts'
import { ENERGY_FACTOR, hubbleOf } from '../expansionPoint.ts'
import type { Radiation } from '../radiation.ts'
import { RADIATION } from './expansion.ts'
import type { Expansion } from './expansion.ts'

export function fluid(
  expansion: Extract<ExpansionInput, { kind: 'fluid' }>,
  radiation: Radiation,
): Expansion {
  const { index, equalityTemperatureGeV: equality } = expansion
  const there = emptyPoint()
  const apart = { gRho: 0, gP: 0 }
  radiation.bath.evaluate(equality, there)
  radiation.apart.evaluate(equality, there.gS, apart)
  const density = ENERGY_FACTOR * (there.gRho + apart.gRho) * equality ** 4
  return {
    ...RADIATION,
    earlyIndex: index,
    radiationOnly: () => false,
    complete(_lnT, out) {
      out.otherEnergy =
        density * (out.gS / there.gS) ** ((4 + index) / 3) * (out.temperature / equality) ** (4 + index)
      out.otherPressure = ((1 + index) / 3) * out.otherEnergy
      out.energy += out.otherEnergy
      out.hubble = hubbleOf(out.energy)
    },
  }
}
