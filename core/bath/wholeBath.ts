/** The two treatments that come with their own neutrinos: the 2018 fit and the 2016 table. */
import type { NeutrinosInput } from '../wire/history.ts'
import { emptyPoint } from './bath.ts'
import type { BathPart, BathPoint } from './bath.ts'
import { addGas, gasJet, pointOfJet, zeroJet } from './gas.ts'
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

export function fit2018Bath(band: number, others: readonly Particle[]): BathPart {
  const whole = emptyWhole()
  return {
    breaks: [FIT_JOIN_GEV, ...(band === 0 ? [] : BAND_BREAKS_GEV)],
    evaluate(temperatureGeV, out) {
      fitWithBand(temperatureGeV, band, whole)
      finishWhole(whole, others, temperatureGeV, out)
    },
  }
}

export function lattice2016Bath(neutrinos: NeutrinosInput, others: readonly Particle[]): BathPart {
  const coldPlasma: BathPart = {
    breaks: [],
    evaluate: (temperatureGeV, out) => pointOfJet(gasJet([PHOTON, ELECTRON, ...others], temperatureGeV), out),
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

  return {
    breaks: [...cold.breaks, ...LATTICE_2016_KNOTS_GEV],
    evaluate(temperatureGeV, out) {
      if (temperatureGeV < LATTICE_2016_LOWEST_GEV) {
        cold.evaluate(temperatureGeV, out)
        return
      }
      if (temperatureGeV <= last.temperatureGeV) lattice2016(temperatureGeV, whole)
      else {
        // Above the last row g_s is the ideal gas times the joining factor; g_ρ/g_s returns to the ideal one as (T_last/T)².
        idealGas(temperatureGeV)
        const fade = 1 + (joinRho / joinS - 1) * (last.temperatureGeV / temperatureGeV) ** 2
        whole.gRho = joinS * fade * ideal.gRho
        whole.gS = joinS * ideal.gS
        whole.logSlope = ideal.gSSlope / ideal.gS
      }
      finishWhole(whole, others, temperatureGeV, out)
    },
  }
}
