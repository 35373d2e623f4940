import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { Guard } from '../../wire/compute.ts'
import { COMMON_PRACTICE, raise } from './guard.ts'

/** Temperature, GeV, above which whatever disturbs the expansion must be over for nucleosynthesis to be left alone. */
const NUCLEOSYNTHESIS_GEV = 4e-3
const NUCLEOSYNTHESIS_SOURCE =
  'Hannestad, Phys. Rev. D 70 (2004) 043506; de Salas et al., Phys. Rev. D 92 (2015) 123534; from memory'

/** Guards on the expansion. */
function expansionGuards({ expansion }: ThermalHistory['input']): Guard[] {
  if (expansion.kind === 'fluid') {
    const limit = 1e-3 * 15.4 ** (1 / expansion.index)
    const found = expansion.equalityTemperatureGeV
    const message = 'The fluid still drives the expansion when the light elements form.'
    return found < limit
      ? [
          raise(
            'fluid-too-late',
            message,
            found,
            limit,
            'GeV',
            "D'Eramo, Fernandez, Profumo, JCAP 05 (2017) 012",
          ),
        ]
      : []
  }
  if (
    expansion.kind === 'entropy-step' &&
    expansion.factor > 1 &&
    expansion.temperatureGeV < NUCLEOSYNTHESIS_GEV
  ) {
    const message = 'Entropy is released while the light elements form.'
    return [
      raise(
        'entropy-too-late',
        message,
        expansion.temperatureGeV,
        NUCLEOSYNTHESIS_GEV,
        'GeV',
        NUCLEOSYNTHESIS_SOURCE,
      ),
    ]
  }
  if (expansion.kind === 'early-matter' && expansion.reheatTemperatureGeV < NUCLEOSYNTHESIS_GEV) {
    const message = 'The matter era ends while the light elements form.'
    return [
      raise(
        'reheating-too-late',
        message,
        expansion.reheatTemperatureGeV,
        NUCLEOSYNTHESIS_GEV,
        'GeV',
        NUCLEOSYNTHESIS_SOURCE,
      ),
    ]
  }
  return []
}

/** Guards on the history alone. */
export function historyGuards({ input, temperatureToday }: ThermalHistory): Guard[] {
  const massless = input.extraSpecies
    .filter((species) => species.massGeV < temperatureToday && species.coupling.kind === 'bath')
    .map((species) => {
      const message = `${species.name} is still relativistic today and shares the bath's temperature: today's entropy leaves it out.`
      return raise('massless-today', message, species.degreesOfFreedom, 0, 'g', COMMON_PRACTICE)
    })
  return [...expansionGuards(input), ...massless]
}
