/** From the wire's words to a bath. */
import type { BathInput, ExtraSpeciesInput, NeutrinosInput } from '../wire/history.ts'
import type { BathPart } from './bath.ts'
import { withNeutrinos } from './neutrinos.ts'
import { HADRON_LISTS } from './particles/hadrons.ts'
import type { Particle } from './particles/species.ts'
import { crossover } from './treatments/crossover.ts'
import { idealSwitch } from './treatments/idealSwitch.ts'
import { lattice2014 } from './treatments/lattice2014.ts'
import { thresholds } from './treatments/thresholds.ts'
import { uploadedBath } from './uploadedBath.ts'
import { fit2018Bath, lattice2016Bath } from './wholeBath.ts'

/** Extra species that share the bath's temperature and entropy. */
const speciesInBath = (extraSpecies: readonly ExtraSpeciesInput[]): Particle[] =>
  extraSpecies.filter((species) => species.coupling.kind === 'bath')

/** The bath of a history: its treatment, its neutrinos, and the extra species that share its temperature. */
export function buildBath(
  bath: BathInput,
  neutrinos: NeutrinosInput,
  extraSpecies: readonly ExtraSpeciesInput[],
): BathPart {
  const others = speciesInBath(extraSpecies)
  switch (bath.treatment) {
    case 'thresholds':
      return withNeutrinos(thresholds(bath.transitionTemperatureGeV, others), neutrinos)
    case 'ideal-switch':
      return withNeutrinos(
        idealSwitch(bath.transitionTemperatureGeV, HADRON_LISTS[bath.hadrons], others),
        neutrinos,
      )
    case 'crossover': {
      const hadrons = HADRON_LISTS[bath.hadrons]
      return withNeutrinos(
        crossover(bath.transitionTemperatureGeV, bath.transitionWidthGeV, hadrons, others),
        neutrinos,
      )
    }
    case 'lattice-2014':
      return withNeutrinos(lattice2014(HADRON_LISTS[bath.hadrons], others), neutrinos)
    case 'lattice-2016':
      return lattice2016Bath(neutrinos, others)
    case 'fit-2018':
      return fit2018Bath(bath.band, others)
    case 'uploaded':
      return uploadedBath(bath, neutrinos, others)
  }
}
