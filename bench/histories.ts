/** How long a history takes: from nothing, and when only something outside the bath has changed. */
import type { Bench } from 'tinybench'
import { buildHistory } from '#core/index'
import { EARLY_MATTER, FIT, KINATION, history, newEarlyMatter } from './inputs.ts'
import { slightly } from './unused.ts'

/** A dark photon so light that it changes nothing but the key under which tables are kept. */
const newSpecies = () => ({
  name: 'dark photon',
  degreesOfFreedom: 3,
  statistics: 'boson',
  massGeV: slightly(0.1),
  coupling: { kind: 'bath' },
})

/** Baths that have never been asked for: with a parameter of their own moved where there is one, else with a new species. */
const NEW_BATHS: Record<string, () => object> = {
  thresholds: () => ({ bath: { treatment: 'thresholds', transitionTemperatureGeV: slightly(0.15) } }),
  'ideal-switch': () => ({ bath: { treatment: 'ideal-switch', transitionTemperatureGeV: slightly(0.15) } }),
  crossover: () => ({ bath: { treatment: 'crossover', transitionTemperatureGeV: slightly(0.15) } }),
  'crossover, long list of hadrons': () => ({
    bath: { treatment: 'crossover', transitionTemperatureGeV: slightly(0.15), hadrons: 'long' },
  }),
  'lattice-2014': () => ({ bath: { treatment: 'lattice-2014' }, extraSpecies: [newSpecies()] }),
  'lattice-2016': () => ({ bath: { treatment: 'lattice-2016' }, extraSpecies: [newSpecies()] }),
  'fit-2018': () => ({ bath: { treatment: 'fit-2018' }, extraSpecies: [newSpecies()] }),
  'fit-2018 with a band': () => ({ bath: { treatment: 'fit-2018', band: slightly(0.5) } }),
}

const withNEff = (treatment: string): object => ({
  bath: { treatment },
  neutrinos: { treatment: 'specified', nEff: slightly(3) },
})

export function addHistoryBenchmarks(bench: Bench): void {
  for (const [name, input] of Object.entries(NEW_BATHS))
    bench.add(`history, new bath: ${name}`, () => void buildHistory(history(input())))
  for (const treatment of ['crossover', 'lattice-2014'])
    bench.add(`history, other N_eff: ${treatment}`, () => void buildHistory(history(withNEff(treatment))))
  buildHistory(FIT)
  bench.add('history, same bath, other expansion', () => void buildHistory(KINATION))
  bench.add('history, same bath, new era of matter', () => {
    buildHistory(history({ expansion: newEarlyMatter() }))
  })
  const known = history({ expansion: EARLY_MATTER })
  bench.add('history, same era of matter', () => void buildHistory(known))
}
