/** Curves of the Bench over its temperature window, hot to cold. */
import { emptyPoint } from '../bath/bath.ts'
import { freezeInDecayYields, widthOf } from '../abundance/freezeInDecayCandidate.ts'
import { annihilatingState, freezeOutYields } from '../abundance/freezeOutCandidate.ts'
import { logEquilibriumYield } from '../abundance/equilibrium.ts'
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

/** The mass whose ratio to T is the candidate's x. */
const scaleOf = (candidate: CandidateInput): number =>
  candidate.mechanism === 'freeze-out' ? candidate.massGeV : candidate.parent.massGeV

/** Y of the candidate; NaN above the maximum temperature. */
export function yieldCurve(
  history: ThermalHistory,
  candidate: CandidateInput,
  temperatureGeV: Float64Array,
): Curve {
  const lnX = temperatureGeV.map((temperature) => Math.log(scaleOf(candidate) / temperature))
  const samples =
    candidate.mechanism === 'freeze-out'
      ? freezeOutYields(history, candidate, lnX)
      : freezeInDecayYields(history, candidate, lnX)
  return { temperatureGeV, value: samples.lnYield.map(Math.exp) }
}

/** Y_eq of the candidate in freeze-out, of the parent in freeze-in by decay. */
export function equilibriumCurve(
  history: ThermalHistory,
  candidate: CandidateInput,
  temperatureGeV: Float64Array,
): Curve {
  const point = emptyExpansion()
  const species =
    candidate.mechanism === 'freeze-out'
      ? {
          ...candidate,
          statistics:
            candidate.equilibriumStatistics === 'exact'
              ? candidate.statistics
              : ('maxwell-boltzmann' as const),
        }
      : candidate.parent
  return curve(temperatureGeV, (temperature) => {
    history.at(Math.log(temperature), point)
    return Math.exp(logEquilibriumYield([species], species.massGeV, species.massGeV / temperature, point.gS))
  })
}

/** n_eq⟨σv⟩/H for freeze-out, Γ_B/H for freeze-in by decay. */
export function rateOverHubbleCurve(
  history: ThermalHistory,
  candidate: CandidateInput,
  temperatureGeV: Float64Array,
): Curve {
  if (candidate.mechanism === 'freeze-out') {
    const state = annihilatingState(history, candidate)
    return curve(temperatureGeV, (temperature) =>
      state.rateOverHubble(Math.log(candidate.massGeV / temperature)),
    )
  }
  const point = emptyExpansion()
  const width = widthOf(candidate)
  return curve(temperatureGeV, (temperature) => {
    history.at(Math.log(temperature), point)
    return width / point.hubble
  })
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
