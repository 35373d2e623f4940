/** How far a parent flies before it decays: cτ at rest frame's clock, L = βγcτ on average, and where that is seen. */
import { HBARC_GEV_CM, HBAR_GEV_S } from '../constants/natural.ts'
import type { LaboratoryRequest, LaboratoryResult, Reach, ReachBand } from '../wire/laboratory.ts'
import type { MeasuredNumber } from '../wire/measured.ts'

const CM_PER_M = 100

/** Speed of light, m/s. */
const LIGHT_M_PER_S = HBARC_GEV_CM / HBAR_GEV_S / CM_PER_M

/** cτ, m, of a lifetime, s. */
export const decayLength = (lifetimeS: number): number => LIGHT_M_PER_S * lifetimeS

/** βγcτ, m. */
export const meanFlight = (lifetimeS: number, betaGamma: number): number => betaGamma * decayLength(lifetimeS)

interface Mean {
  meanFlightM: number
  lifetimeS: number
}

const holds = ({ from, to, quantity }: ReachBand, mean: Mean): boolean =>
  mean[quantity] >= (from ?? 0) && mean[quantity] < (to ?? Infinity)

/** Names of the bands that hold the mean. */
export const bandsThatHold = (bands: readonly ReachBand[], mean: Mean): string[] =>
  bands.filter((band) => holds(band, mean)).map(({ name }) => name)

/** Decays are exponential: the share between `from` and `to` is e^(−from/mean) − e^(−to/mean). */
function reachOf(band: ReachBand, mean: Mean): Reach {
  const scale = mean[band.quantity]
  const [from, to] = [(band.from ?? 0) / scale, (band.to ?? Infinity) / scale]
  // Written so that a thin band far below the mean keeps its digits.
  const decayShare = Math.exp(-from) * -Math.expm1(from - to)
  return { ...band, holdsMean: holds(band, mean), decayShare }
}

const times = ({ value, minus, plus }: MeasuredNumber, factor: number): MeasuredNumber => ({
  value: value * factor,
  minus: minus * factor,
  plus: plus * factor,
})

export function flightOf({
  measured: { lifetimeS },
  betaGamma,
  reachBands,
}: LaboratoryRequest): LaboratoryResult['flight'] {
  const mean = { meanFlightM: meanFlight(lifetimeS.value, betaGamma), lifetimeS: lifetimeS.value }
  return {
    decayLengthM: times(lifetimeS, LIGHT_M_PER_S),
    betaGamma,
    meanFlightM: times(lifetimeS, betaGamma * LIGHT_M_PER_S),
    bands: reachBands.map((band) => reachOf(band, mean)),
  }
}
