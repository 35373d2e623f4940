/** The derived history as rows over temperature, each number from the exact treatment rather than its table. */
import { emptyPoint } from '../bath/bath.ts'
import { HBARC_GEV_CM, HBAR_GEV_S, SOLAR_MASS_GEV } from '../constants/natural.ts'
import type { HistoryRow } from '../wire/compute.ts'
import type { BathInput } from '../wire/history.ts'
import { ONE_TEMPERATURE_GEV } from '../wire/uploadedBath.ts'
import { complete, mapped, part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { LATE_GEV, lateUniverse } from './lateUniverse.ts'
import { agesSteps } from './time.ts'
import { emptyExpansion, hubbleOf, setRadiation } from './expansionPoint.ts'
import type { ExpansionPoint } from './expansionPoint.ts'
import type { ThermalHistory } from './thermalHistory.ts'

/** Entropy density today, cm⁻³. */
export const entropyTodayPerCm3 = (history: ThermalHistory): number =>
  history.entropyToday / HBARC_GEV_CM ** 3

/** Why some pressures are null, in words; undefined when the treatment defines them everywhere. */
export function pressureUndefinedBecause({ input: { bath } }: ThermalHistory): string | undefined {
  const because = (what: string): string =>
    `below 10^0.5 MeV ${what} gives ρ and s only, and p = Ts − ρ does not hold once neutrinos have their own temperature`
  if (bath.treatment === 'fit-2018') return because('the 2018 fit')
  if (bath.treatment === 'uploaded' && bath.points[0]!.temperatureGeV < ONE_TEMPERATURE_GEV)
    return because('the uploaded table')
  return undefined
}

/** Whether ρ and s come each for itself, so that nothing makes them obey dρ = T ds. */
const independentColumns = (bath: BathInput): boolean =>
  bath.treatment === 'fit-2018' ||
  bath.treatment === 'lattice-2016' ||
  (bath.treatment === 'uploaded' && bath.points[0]!.gRho !== undefined && bath.points[0]!.gS !== undefined)

/** Step in ln T of the derivative below; its error is of order step², 1e-8. */
const STEP = 1e-4

/**
 * (dρ/dT)/(T ds/dT) − 1: how far a fitted or tabulated whole bath is from dρ = T ds, which a bath of one temperature obeys
 * exactly. Zero for a treatment defined by a pressure, or by one of g_ρ and g_s; null where the bath has no single temperature.
 */
function identityResidual(history: ThermalHistory, temperatureGeV: number): number | null {
  const { bath } = history.radiation
  const point = emptyPoint()
  bath.evaluate(temperatureGeV, point)
  if (Number.isNaN(point.gP) || temperatureGeV < history.input.neutrinos.decouplingTemperatureGeV) return null
  if (!independentColumns(history.input.bath)) return 0
  const { gRho, gS, gSSlope } = point
  bath.evaluate(temperatureGeV * Math.exp(STEP), point)
  const hot = point.gRho
  bath.evaluate(temperatureGeV * Math.exp(-STEP), point)
  const gRhoSlope = (hot - point.gRho) / (2 * STEP)
  // In units of π²T⁴/90: ρ = 3 g_ρ and Ts = 4 g_s.
  return (3 * (4 * gRho + gRhoSlope)) / (4 * (3 * gS + gSSlope)) - 1
}

/** a/a₀ = (s₀/(s e^{lnDilution}))^{1/3}: entropy still to be released makes a smaller. */
export function scaleFactor(history: ThermalHistory, point: ExpansionPoint): number {
  return Math.cbrt(history.entropyToday / (Math.exp(point.lnDilution) * point.entropy))
}

/** What the radiation is made of, given the bath's g_s. */
function contributionsAt(
  { radiation: { bath, apart } }: ThermalHistory,
  temperatureGeV: number,
  bathGS: number,
): NonNullable<HistoryRow['contributions']> {
  return [...bath.contributions(temperatureGeV), ...apart.contributions(temperatureGeV, bathGS)].map(
    (part) => ({ ...part, gP: Number.isFinite(part.gP) ? part.gP : null }),
  )
}

/** Rows to a step: of the order of a millisecond. */
const ROWS_TO_A_STEP = 50

/** One row for each temperature, GeV, in the order given; with `contributions`, what each is made of. */
export function* historyRowSteps(
  history: ThermalHistory,
  temperaturesGeV: readonly number[],
  contributions = false,
): Steps<HistoryRow[]> {
  const times = yield* part(agesSteps(history, temperaturesGeV), 0, 1, 3)
  const late = lateUniverse(history)
  const { bath, apart } = history.radiation
  const point = emptyPoint()
  const other = { gRho: 0, gP: 0 }
  const state = emptyExpansion()
  const hasSpeciesApart = history.input.extraSpecies.some((species) => species.coupling.kind !== 'bath')
  const neutrinosDecouple = history.input.neutrinos.decouplingTemperatureGeV

  const rowAt = (temperature: number, i: number): HistoryRow => {
    bath.evaluate(temperature, point)
    apart.evaluate(temperature, point.gS, other)
    const logSlope = point.gSSlope / point.gS
    setRadiation(state, temperature, point.gRho + other.gRho, point.gS, logSlope)
    history.expansion.complete(Math.log(temperature), state)
    const matter = late.matter(state)
    const darkEnergy = late.darkEnergy(state)
    const energy = state.energy + matter + darkEnergy
    const hubble = hubbleOf(energy)
    const radiationPressure = (Math.PI ** 2 / 90) * (point.gP + other.gP) * temperature ** 4
    const pressure = radiationPressure + state.otherPressure - darkEnergy
    const defined = Number.isFinite(pressure)
    const oneTemperature = !hasSpeciesApart && temperature > Math.max(neutrinosDecouple, LATE_GEV)
    const barotropic = defined && oneTemperature && history.expansion.radiationOnly(temperature)
    const a = scaleFactor(history, state)
    return {
      temperatureGeV: temperature,
      gRho: state.gRho,
      gS: state.gS,
      gStarHalf: (state.gS / Math.sqrt(state.gRho)) * (1 + logSlope / 3),
      dLnGsDLnT: logSlope,
      energyDensityGeV4: energy,
      pressureGeV4: defined ? pressure : null,
      entropyDensityGeV3: state.entropy,
      hubbleGeV: hubble,
      timeS: times[i]!,
      scaleFactor: a,
      redshift: 1 / a - 1,
      equationOfState: defined ? pressure / energy : null,
      soundSpeedSquared: barotropic ? 1 / (3 + logSlope) : null,
      identityResidual: identityResidual(history, temperature),
      waveFrequencyHz: (a * hubble) / (2 * Math.PI) / HBAR_GEV_S,
      horizonMassSolar: ((4 * Math.PI) / 3) * (energy / hubble ** 3 / SOLAR_MASS_GEV),
      ...(contributions ? { contributions: contributionsAt(history, temperature, point.gS) } : {}),
      ...(temperature < LATE_GEV ? { matterDensityGeV4: matter, darkEnergyDensityGeV4: darkEnergy } : {}),
    }
  }
  return yield* part(mapped(temperaturesGeV, ROWS_TO_A_STEP, rowAt), 1, 2, 3)
}

/** The same at once. */
export const historyRows = (...asked: Parameters<typeof historyRowSteps>): HistoryRow[] =>
  complete(historyRowSteps(...asked))
