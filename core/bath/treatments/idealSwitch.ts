/** Exact ideal-gas integrals for every species; free quarks and gluons above T_c, a gas of hadrons at and below it. */
import type { BathPart } from '../bath.ts'
import { gasContributions, gasJet, pointOfJet } from '../gas.ts'
import { WITHOUT_COLOUR, WITH_COLOUR } from '../particles/standardModel.ts'
import type { Particle } from '../particles/species.ts'

export function idealSwitch(
  transitionTemperatureGeV: number,
  hadrons: readonly Particle[],
  others: readonly Particle[],
): BathPart {
  const above = [...WITHOUT_COLOUR, ...WITH_COLOUR, ...others]
  const below = [...WITHOUT_COLOUR, ...hadrons, ...others]
  const speciesAt = (temperatureGeV: number) => (temperatureGeV > transitionTemperatureGeV ? above : below)
  return {
    breaks: [transitionTemperatureGeV],
    evaluate: (temperatureGeV, out) => pointOfJet(gasJet(speciesAt(temperatureGeV), temperatureGeV), out),
    contributions: (temperatureGeV) => gasContributions(speciesAt(temperatureGeV), temperatureGeV),
  }
}
