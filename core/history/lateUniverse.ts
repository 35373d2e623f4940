/**
 * Matter and the cosmological constant, which enter times and redshifts below 1e-6 GeV:
 *
 *   ρ_m = ω_m (ρ_c/h²) s/s₀,   ω_Λ = h² − ω_m − ω_r (flat), ω_r that of the bath at T₀.
 *
 * They begin at 1e-6 GeV, where H steps by about 4e-4. The abundance solver leaves them out.
 */
import { CRITICAL_DENSITY_GEV4 } from '../constants/natural.ts'
import { emptyExpansion } from './expansionPoint.ts'
import type { ExpansionPoint } from './expansionPoint.ts'
import type { ThermalHistory } from './thermalHistory.ts'

/** Below this temperature, GeV, matter and Λ count. */
export const LATE_GEV = 1e-6

export interface LateUniverse {
  /** Density of matter, GeV⁴, at that point of the history; zero above 1e-6 GeV. */
  matter(point: ExpansionPoint): number
  /** Density of the cosmological constant, GeV⁴; zero above 1e-6 GeV. */
  darkEnergy(point: ExpansionPoint): number
}

export function lateUniverse(history: ThermalHistory): LateUniverse {
  const { hubbleParameter, omegaMatterH2 } = history.input.today
  const today = emptyExpansion()
  history.at(Math.log(history.temperatureToday), today)
  const lambda = (hubbleParameter ** 2 - omegaMatterH2) * CRITICAL_DENSITY_GEV4 - today.energy
  const late = (point: ExpansionPoint) => point.temperature < LATE_GEV
  return {
    matter: (point) =>
      late(point) ? (omegaMatterH2 * CRITICAL_DENSITY_GEV4 * point.entropy) / history.entropyToday : 0,
    darkEnergy: (point) => (late(point) ? lambda : 0),
  }
}
