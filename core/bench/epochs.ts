import { ELECTRON } from '../bath/particles/standardModel.ts'
import type { HistoryInput } from '../wire/history.ts'
import type { EpochMark } from './types.ts'

/** Temperature of the electroweak crossover, GeV: D'Onofrio & Rummukainen, Phys. Rev. D 93 (2016) 025003, from memory. */
const ELECTROWEAK_CROSSOVER_GEV = 159.5

/** Temperature of the strong-interaction crossover, GeV, where the treatment has no parameter for it: HotQCD 2019. */
const QCD_CROSSOVER_GEV = 0.1565

const mark = (
  code: EpochMark['code'],
  label: string,
  temperatureGeV: number,
  importance: number,
): EpochMark => ({
  code,
  label,
  temperatureGeV,
  importance,
})

/** The temperatures of a history that carry a name, hottest first. */
export function epochsOf(history: HistoryInput): EpochMark[] {
  const { bath, neutrinos, expansion, maximumTemperatureGeV } = history
  const qcd = 'transitionTemperatureGeV' in bath ? bath.transitionTemperatureGeV : QCD_CROSSOVER_GEV
  const marks = [
    mark('electroweak-crossover', 'electroweak crossover', ELECTROWEAK_CROSSOVER_GEV, 3),
    mark('qcd-crossover', 'QCD crossover', qcd, 5),
    mark('neutrino-decoupling', 'neutrino decoupling', neutrinos.decouplingTemperatureGeV, 4),
    mark('electron-positron', 'e± annihilation', ELECTRON.massGeV, 2),
  ]
  if (expansion.kind === 'fluid')
    marks.push(mark('fluid-equality', 'fluid equals radiation', expansion.equalityTemperatureGeV, 6))
  if (expansion.kind === 'entropy-step')
    marks.push(mark('entropy-step', 'entropy release', expansion.temperatureGeV, 6))
  if (expansion.kind === 'early-matter') {
    marks.push(mark('matter-ends', 'matter era ends', expansion.reheatTemperatureGeV, 6))
    if (expansion.startTemperatureGeV !== undefined)
      marks.push(mark('matter-begins', 'matter equals radiation', expansion.startTemperatureGeV, 6))
  }
  if (maximumTemperatureGeV !== null)
    marks.push(mark('maximum-temperature', 'maximum temperature', maximumTemperatureGeV, 7))
  for (const { name, coupling } of history.extraSpecies)
    if (coupling.kind === 'decoupled')
      marks.push(mark('species-decoupling', `${name} decouples`, coupling.temperatureGeV, 1))
  return marks.sort((a, b) => b.temperatureGeV - a.temperatureGeV)
}
