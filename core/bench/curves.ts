/** Curves of the Bench over its temperature window, hot to cold. */
import { emptyPoint } from '../bath/bath.ts'
import { logEquilibriumYield } from '../abundance/equilibrium.ts'
import { mechanismOf } from '../abundance/mechanisms/mechanisms.ts'
import { emptyExpansion } from '../history/expansionPoint.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import type { CandidateInput } from '../wire/candidate.ts'
import type { Curve } from './types.ts'

/** Points of a curve, before those on either side of a step. */
const POINTS = 260

/** Relative distance of the two points that show a step of the bath as a step. */
const BESIDE = 1e-9

/** Temperatures, GeV, evenly in ln T and on both sides of every break of the histories; descending. */
export function temperatureGrid(
  hotGeV: number,
  coldGeV: number,
  histories: readonly ThermalHistory[],
): Float64Array {
  const ratio = Math.log(coldGeV / hotGeV)
  const even = Array.from({ length: POINTS }, (_, i) => hotGeV * Math.exp((ratio * i) / (POINTS - 1)))
  const besides = histories
    .flatMap((history) => history.breaks)
    .filter((temperature) => temperature < hotGeV && temperature > coldGeV)
    .flatMap((temperature) => [temperature * (1 + BESIDE), temperature * (1 - BESIDE)])
  return Float64Array.from([...new Set([...even, ...besides])].sort((a, b) => b - a))
}

const curve = (temperatureGeV: Float64Array, valueAt: (temperatureGeV: number) => number): Curve => ({
  temperatureGeV,
  value: temperatureGeV.map(valueAt),
})

/** Y of the candidate; NaN where it does not exist yet. */
export function yieldCurve(
  history: ThermalHistory,
  candidate: CandidateInput,
  temperatureGeV: Float64Array,
): Curve {
  const mechanism = mechanismOf(candidate)
  const scale = mechanism.scaleGeV(history, candidate)
  const lnX = temperatureGeV.map((temperature) => Math.log(scale / temperature))
  return { temperatureGeV, value: mechanism.yields(history, candidate, lnX).lnYield.map(Math.exp) }
}

/** Y_eq of the candidate, or of the parent it comes from. */
export function equilibriumCurve(
  history: ThermalHistory,
  candidate: CandidateInput,
  temperatureGeV: Float64Array,
): Curve {
  const point = emptyExpansion()
  const { species } = mechanismOf(candidate).equilibrium(candidate)
  const mass = species[0]!.massGeV
  return curve(temperatureGeV, (temperature) => {
    history.at(Math.log(temperature), point)
    return Math.exp(logEquilibriumYield(species, mass, mass / temperature, point.gS))
  })
}

/** The rate that decides over H: n_eq⟨σv⟩/H, Γ_B/H, or production per candidate in equilibrium. */
export function rateOverHubbleCurve(
  history: ThermalHistory,
  candidate: CandidateInput,
  temperatureGeV: Float64Array,
): Curve {
  return curve(temperatureGeV, mechanismOf(candidate).rateOverHubble(history, candidate))
}

/** g_ρ of all radiation and g_s of the bath. */
export function effectiveNumberCurves(
  history: ThermalHistory,
  temperatureGeV: Float64Array,
): { gRho: Curve; gS: Curve } {
  const { bath, apart } = history.radiation
  const point = emptyPoint()
  const other = { gRho: 0, gP: 0 }
  const gRho = new Float64Array(temperatureGeV.length)
  const gS = new Float64Array(temperatureGeV.length)
  temperatureGeV.forEach((temperature, i) => {
    bath.evaluate(temperature, point)
    apart.evaluate(temperature, point.gS, other)
    gRho[i] = point.gRho + other.gRho
    gS[i] = point.gS
  })
  return { gRho: { temperatureGeV, value: gRho }, gS: { temperatureGeV, value: gS } }
}
