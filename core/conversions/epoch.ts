/**
 * Moments in the history of the universe by any number that tells them: a temperature, a time, a redshift, a density. All are
 * functions of the bath's temperature, from the exact treatment rather than its table.
 */
import { emptyPoint } from '../bath/bath.ts'
import {
  GEV_PER_KELVIN,
  HBARC_GEV_CM,
  HBAR_GEV_S,
  HUBBLE_100_GEV,
  SOLAR_MASS_GEV,
  ZETA_3,
} from '../constants/natural.ts'
import { emptyExpansion, hubbleOf, setRadiation } from '../history/expansionPoint.ts'
import type { ExpansionPoint } from '../history/expansionPoint.ts'
import { lateUniverse } from '../history/lateUniverse.ts'
import { scaleFactor } from '../history/rows.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import type { EpochQuantity } from '../wire/convert.ts'
import { clockOf } from './clock.ts'

/** Julian year, s. */
const YEAR_S = 365.25 * 86_400

/** Everything at one temperature that a quantity may be made of; natural units, GeV. */
interface Moment {
  lnT: number
  state: ExpansionPoint
  /** Of everything, matter and Λ included. */
  energy: number
  hubble: number
  /** a/a₀. */
  scale: number
  /** Age, s; computed when asked for. */
  time(): number
}

/** Of the bath's temperature, each number in the unit of its name. */
const VALUES: Record<EpochQuantity, (moment: Moment) => number> = {
  temperatureGeV: ({ state }) => state.temperature,
  temperatureK: ({ state }) => state.temperature / GEV_PER_KELVIN,
  timeS: ({ time }) => time(),
  timeYears: ({ time }) => time() / YEAR_S,
  scaleFactor: ({ scale }) => scale,
  redshift: ({ scale }) => 1 / scale - 1,
  hubbleGeV: ({ hubble }) => hubble,
  hubblePerS: ({ hubble }) => hubble / HBAR_GEV_S,
  hubbleKmPerSPerMpc: ({ hubble }) => (100 * hubble) / HUBBLE_100_GEV,
  energyDensityGeV4: ({ energy }) => energy,
  entropyDensityGeV3: ({ state }) => state.entropy,
  entropyDensityPerCm3: ({ state }) => state.entropy / HBARC_GEV_CM ** 3,
  // n = 2ζ(3)T³/π²: Kolb & Turner, The Early Universe (1990), §3.3.
  photonDensityPerCm3: ({ state }) => ((2 * ZETA_3) / Math.PI ** 2) * (state.temperature / HBARC_GEV_CM) ** 3,
  waveFrequencyHz: ({ scale, hubble }) => (scale * hubble) / (2 * Math.PI) / HBAR_GEV_S,
  horizonMassSolar: ({ energy, hubble }) => ((4 * Math.PI) / 3) * (energy / hubble ** 3 / SOLAR_MASS_GEV),
  gRho: ({ state }) => state.gRho,
  gS: ({ state }) => state.gS,
}

/** Reads quantities at ln(T/GeV). */
export type EpochReader = (quantity: EpochQuantity, lnT: number) => number

export function epochReader(history: ThermalHistory): EpochReader {
  const { bath, apart } = history.radiation
  const late = lateUniverse(history)
  const clock = clockOf(history)
  const point = emptyPoint()
  const other = { gRho: 0, gP: 0 }
  const state = emptyExpansion()
  const moment: Moment = { lnT: NaN, state, energy: 0, hubble: 0, scale: 0, time: () => clock(moment.lnT) }
  const moveTo = (lnT: number): void => {
    if (lnT === moment.lnT) return
    const temperature = Math.exp(lnT)
    bath.evaluate(temperature, point)
    apart.evaluate(temperature, point.gS, other)
    setRadiation(state, temperature, point.gRho + other.gRho, point.gS, point.gSSlope / point.gS)
    history.expansion.complete(lnT, state)
    moment.lnT = lnT
    const energy = state.energy + late.matter(state) + late.darkEnergy(state)
    // A Λ so negative that nothing is left is no expanding universe.
    moment.energy = energy > 0 ? energy : NaN
    moment.hubble = hubbleOf(moment.energy)
    moment.scale = scaleFactor(history, state)
  }
  return (quantity, lnT) => {
    moveTo(lnT)
    return VALUES[quantity](moment)
  }
}
