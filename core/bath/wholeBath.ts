/** The two treatments that come with their own neutrinos: the 2018 fit and the 2016 table. */
import type { NeutrinosInput } from '../wire/history.ts'
import { emptyPoint } from './bath.ts'
import type { BathPart, BathPoint, Contribution } from './bath.ts'
import { addGas, gasContributions, gasJet, pointOfJet, zeroJet } from './gas.ts'
import { withNeutrinos } from './neutrinos.ts'
import { ELECTRON, NEUTRINO_G, PHOTON, WITHOUT_COLOUR, WITH_COLOUR } from './particles/standardModel.ts'
import type { Particle } from './particles/species.ts'
import { FIT_JOIN_GEV } from './treatments/fit2018.ts'
import type { WholeBathPoint } from './treatments/fit2018.ts'
import { BAND_BREAKS_GEV, fitWithBand } from './treatments/fitBand.ts'
import {
  LATTICE_2016_KNOTS_GEV,
  LATTICE_2016_LAST,
  LATTICE_2016_LOWEST_GEV,
  lattice2016,
} from './treatments/lattice2016.ts'

const emptyWhole = (): WholeBathPoint => ({ gRho: 0, gS: 0, logSlope: 0 })

/**
 * Writes a whole-bath point, with further species of the bath added, into `out`. The pressure Ts − ρ holds only while all
 * share one temperature, so below 10^0.5 MeV it is undefined.
 */
export function finishWhole(
  whole: WholeBathPoint,
  others: readonly Particle[],
  temperatureGeV: number,
  out: BathPoint,
): void {
  out.gRho = out.gS = out.gSSlope = 0
  if (others.length > 0) {
    const jet = zeroJet()
    addGas(jet, others, temperatureGeV)
    pointOfJet(jet, out)
  }
  out.gRho += whole.gRho
  out.gS += whole.gS
  out.gSSlope += whole.gS * whole.logSlope
  out.gP = temperatureGeV >= LATTICE_2016_LOWEST_GEV ? 4 * out.gS - 3 * out.gRho : NaN
}

/** A whole bath, which is one, and further species beside it. */
export function wholeContributions(
  whole: WholeBathPoint,
  others: readonly Particle[],
  temperatureGeV: number,
): Contribution[] {
  const point = emptyPoint()
  finishWhole(whole, [], temperatureGeV, point)
  const { gRho, gS, gP } = point
  return [{ name: 'whole bath', temperatureGeV, gRho, gS, gP }, ...gasContributions(others, temperatureGeV)]
}

export function fit2018Bath(band: number, others: readonly Particle[]): BathPart {
  const whole = emptyWhole()
  return {
    breaks: [FIT_JOIN_GEV, ...(band === 0 ? [] : BAND_BREAKS_GEV)],
    evaluate(temperatureGeV, out) {
      fitWithBand(temperatureGeV, band, whole)
      finishWhole(whole, others, temperatureGeV, out)
    },
    contributions(temperatureGeV) {
      fitWithBand(temperatureGeV, band, whole)
      return wholeContributions(whole, others, temperatureGeV)
    },
  }
}

export function lattice2016Bath(neutrinos: NeutrinosInput, others: readonly Particle[]): BathPart {
  const coldSpecies = [PHOTON, ELECTRON, ...others]
  const coldPlasma: BathPart = {
    breaks: [],
    evaluate: (temperatureGeV, out) => pointOfJet(gasJet(coldSpecies, temperatureGeV), out),
    contributions: (temperatureGeV) => gasContributions(coldSpecies, temperatureGeV),
  }
  // With this treatment N_eff sets only today's entropy: below the table neutrinos keep the entropy they had.
  const cold = withNeutrinos(coldPlasma, {
    treatment: 'instantaneous',
    decouplingTemperatureGeV: neutrinos.decouplingTemperatureGeV,
  })
  const ideal = emptyPoint()
  const all = [...WITHOUT_COLOUR, ...WITH_COLOUR]
  const idealGas = (temperatureGeV: number): void => {
    pointOfJet(gasJet(all, temperatureGeV), ideal)
    ideal.gRho += NEUTRINO_G
    ideal.gS += NEUTRINO_G
  }
  const last = LATTICE_2016_LAST
  idealGas(last.temperatureGeV)
  const joinRho = last.gRho / ideal.gRho
  const joinS = last.gS / ideal.gS
  const whole = emptyWhole()

  /** From the lowest row used on. */
  const setWhole = (temperatureGeV: number): void => {
    if (temperatureGeV <= last.temperatureGeV) {
      lattice2016(temperatureGeV, whole)
      return
    }
    // Above the last row g_s is the ideal gas times the joining factor; g_ρ/g_s returns to the ideal one as (T_last/T)².
    idealGas(temperatureGeV)
    const fade = 1 + (joinRho / joinS - 1) * (last.temperatureGeV / temperatureGeV) ** 2
    whole.gRho = joinS * fade * ideal.gRho
    whole.gS = joinS * ideal.gS
    whole.logSlope = ideal.gSSlope / ideal.gS
  }

  return {
    breaks: [...cold.breaks, ...LATTICE_2016_KNOTS_GEV],
    evaluate(temperatureGeV, out) {
      if (temperatureGeV < LATTICE_2016_LOWEST_GEV) {
        cold.evaluate(temperatureGeV, out)
        return
      }
      setWhole(temperatureGeV)
      finishWhole(whole, others, temperatureGeV, out)
    },
    contributions(temperatureGeV) {
      if (temperatureGeV < LATTICE_2016_LOWEST_GEV) return cold.contributions(temperatureGeV)
      setWhole(temperatureGeV)
      return wholeContributions(whole, others, temperatureGeV)
    },
  }
}
