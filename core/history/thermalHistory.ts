/**
 * A thermal history: entropy density and expansion rate as functions of the bath's temperature.
 *
 *   s = (2π²/45) g_s T³,   ρ_R = (π²/30) g_ρ T⁴,   H = √(8πρ/3)/M_Pl,   δ_s = (1/3) d ln g_s/d ln T.
 *
 * Source: Kolb & Turner, The Early Universe (1990), §3.3–3.5.
 */
import { entropyNumberToday } from '../bath/neutrinos.ts'
import { GEV_PER_KELVIN, PLANCK_MASS_GEV } from '../constants/natural.ts'
import { evaluate } from '../numerics/interpolation/chebyshev.ts'
import type { HistoryInput } from '../wire/history.ts'
import { fluidDensity } from './fluid.ts'
import type { FluidDensity } from './fluid.ts'
import { G_RHO, G_S, LOG_SLOPE, radiationOf } from './radiation.ts'
import type { Radiation } from './radiation.ts'

/** s/(g_s T³). */
export const ENTROPY_FACTOR = (2 * Math.PI ** 2) / 45
/** ρ/(g_ρ T⁴). */
export const ENERGY_FACTOR = Math.PI ** 2 / 30

/** H of an energy density, both in powers of GeV. */
export const hubbleOf = (energyDensity: number): number =>
  Math.sqrt((8 * Math.PI * energyDensity) / 3) / PLANCK_MASS_GEV

/** What the expansion is doing at one temperature; natural units, GeV. */
export interface ExpansionPoint {
  temperature: number
  gRho: number
  gS: number
  /** −d ln a/d ln T: 1 + δ_s with δ_s = (1/3) d ln g_s/d ln T while entropy is conserved, more while it grows. */
  stretch: number
  entropy: number
  /** Of radiation and fluid; matter and Λ are left out, as the abundance solver leaves them out. */
  energy: number
  hubble: number
  /** ln of what s a³ still grows by until today: zero when entropy is conserved from here on. */
  lnDilution: number
  /** Candidates that a decaying matter field makes per volume and time, GeV⁴. */
  candidatesPerTime: number
}

export const emptyExpansion = (): ExpansionPoint => ({
  temperature: 0,
  gRho: 0,
  gS: 0,
  stretch: 0,
  entropy: 0,
  energy: 0,
  hubble: 0,
  lnDilution: 0,
  candidatesPerTime: 0,
})

export interface ThermalHistory {
  readonly input: HistoryInput
  readonly radiation: Radiation
  /** Photon temperature today, GeV. */
  readonly temperatureToday: number
  /** Entropy density today, GeV³. */
  readonly entropyToday: number
  /** Temperatures, GeV, ascending, where integrators must restart. */
  readonly breaks: readonly number[]
  /** The sudden entropy release, if the history has one. */
  readonly entropyStep: { temperature: number; factor: number } | null
  /** Present when a fluid drives the expansion for a while. */
  readonly fluid: FluidDensity | null
  /** Temperature, GeV, down to which a decaying field makes candidates; null when none does. */
  readonly producesUntil: number | null
  /** Relative error of the tabulated numbers. */
  readonly tableError: number
  /** Writes the state at ln(T/GeV) into `out`; no allocation. */
  at(lnT: number, out: ExpansionPoint): void
}

/** Builds the history of a parsed input. The bath's tables are shared with other histories of the same bath. */
export function buildHistory(input: HistoryInput): ThermalHistory {
  const radiation = radiationOf(input)
  const columns = new Float64Array(3)
  const { table } = radiation

  const at = (lnT: number, out: ExpansionPoint): void => {
    const temperature = Math.exp(lnT)
    evaluate(table, lnT, columns)
    out.temperature = temperature
    out.gRho = columns[G_RHO]!
    out.gS = columns[G_S]!
    out.stretch = 1 + columns[LOG_SLOPE]! / 3
    const cubed = temperature * temperature * temperature
    out.entropy = ENTROPY_FACTOR * out.gS * cubed
    out.energy = ENERGY_FACTOR * out.gRho * cubed * temperature
    if (fluid) out.energy += fluid.energy(temperature, out.gS)
    out.hubble = hubbleOf(out.energy)
    out.lnDilution = lnT > lnStep ? lnReleased : 0
  }

  const fluid = input.expansion.kind === 'fluid' ? fluidDensity(input.expansion, radiation) : null
  const step = input.expansion.kind === 'entropy-step' ? input.expansion : null
  const entropyStep = step && { temperature: step.temperatureGeV, factor: step.factor }
  const lnReleased = Math.log(entropyStep?.factor ?? 1)
  const lnStep = Math.log(entropyStep?.temperature ?? Infinity)
  const temperatureToday = input.today.temperatureK * GEV_PER_KELVIN
  return {
    input,
    radiation,
    temperatureToday,
    entropyToday: ENTROPY_FACTOR * entropyNumberToday(input.neutrinos) * temperatureToday ** 3,
    breaks: entropyStep
      ? [...new Set([...radiation.breaks, entropyStep.temperature])].sort((a, b) => a - b)
      : radiation.breaks,
    entropyStep,
    fluid,
    producesUntil: null,
    tableError: table.error,
    at,
  }
}
