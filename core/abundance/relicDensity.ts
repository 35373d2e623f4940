import { CRITICAL_DENSITY_GEV4 } from '../constants/natural.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'

/** Ωh² = m Y₀ s₀/(ρ_c/h²), for a mass in GeV; s₀ is the history's entropy density today. */
export function relicDensity(history: ThermalHistory, massGeV: number, yieldToday: number): number {
  return (massGeV * yieldToday * history.entropyToday) / CRITICAL_DENSITY_GEV4
}
