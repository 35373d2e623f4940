/** What is asked of many histories at once: Shapley's attribution over all subsets, and samples of uncertain inputs. */
import type { Bench } from 'tinybench'
import { abundance, buildHistory } from '#core/index'
import { shapleyValues } from '#core/sensitivity/shapley'
import { ASSUMPTION_GROUPS } from '#core/wire/index'
import type { CandidateInput, HistoryInput } from '#core/wire/index'
import { EARLY_MATTER, FIT, S_WAVE, history } from './inputs.ts'
import { slightly } from './unused.ts'

const omegaH2 = (input: HistoryInput, candidate: CandidateInput): number =>
  abundance(buildHistory(input), candidate).omegaH2

/** Two histories apart in all six groups, and two masses: seven groups, 128 subsets. */
function attributeSeven(expansion: object): number[] {
  const baseline = history({ bath: { treatment: 'thresholds' }, neutrinos: { treatment: 'instantaneous' } })
  const variant = history({
    bath: { treatment: 'crossover' },
    extraSpecies: [
      { name: 'partner', degreesOfFreedom: 2, statistics: 'boson', massGeV: 5, coupling: { kind: 'bath' } },
    ],
    expansion,
    maximumTemperatureGeV: 1e4,
    today: { temperatureK: 2.726 },
  })
  const groups = ASSUMPTION_GROUPS
  return shapleyValues(groups.length + 1, (subset) => {
    const mixed = { ...baseline }
    groups.forEach((group, i) => {
      if ((subset >> i) & 1) Object.assign(mixed, { [group]: variant[group] })
    })
    const heavier = (subset >> groups.length) & 1
    return Math.log(omegaH2(mixed, heavier ? { ...S_WAVE, massGeV: 150 } : S_WAVE))
  })
}

/** Samples a run; the product's limit speaks of ten thousand. */
const SAMPLES = 100

/** One sample of an uncertain input: parsed, as a sample from the wire is. */
type Sample = (share: number) => [input: HistoryInput, candidate: CandidateInput]

const SAMPLED: Record<string, Sample> = {
  'no bath parameter varies': (share) => [
    { ...FIT, today: { ...FIT.today, temperatureK: 2.7 + 0.01 * share } },
    { ...S_WAVE, massGeV: slightly(90 + 20 * share) },
  ],
  'the band varies': (share) => [
    history({ bath: { treatment: 'fit-2018', band: slightly(share) - 0.5 } }),
    S_WAVE,
  ],
  'T_c and ΔT vary': (share) => [
    history({
      bath: {
        treatment: 'crossover',
        transitionTemperatureGeV: slightly(0.15 + 0.01 * share),
        transitionWidthGeV: 0.015 + 0.01 * share,
      },
    }),
    S_WAVE,
  ],
  'N_eff varies': (share) => [
    history({
      bath: { treatment: 'crossover' },
      neutrinos: { treatment: 'specified', nEff: slightly(2.9 + share) },
    }),
    S_WAVE,
  ],
  'the mass of a species of the bath varies': (share) => [
    history({
      extraSpecies: [
        {
          name: 'partner',
          degreesOfFreedom: 2,
          statistics: 'boson',
          massGeV: slightly(1 + 10 * share),
          coupling: { kind: 'bath' },
        },
      ],
    }),
    S_WAVE,
  ],
  'the mass of a decoupled species varies': (share) => [
    history({
      extraSpecies: [
        {
          name: 'hidden',
          degreesOfFreedom: 2,
          statistics: 'fermion',
          massGeV: slightly(1e-3 + 1e-3 * share),
          coupling: { kind: 'decoupled', temperatureGeV: 10 },
        },
      ],
    }),
    S_WAVE,
  ],
}

export function addManyHistoriesBenchmarks(bench: Bench): void {
  const fluid = { kind: 'fluid', index: 2, equalityTemperatureGeV: 1.15 }
  bench.add('Shapley over 7 groups, 128 subsets', () => void attributeSeven(fluid))
  bench.add(
    'Shapley over 7 groups, 128 subsets, one an era of matter',
    () => void attributeSeven(EARLY_MATTER),
  )
  for (const [name, sample] of Object.entries(SAMPLED))
    bench.add(`${SAMPLES} samples, ${name}`, () => {
      for (let i = 0; i < SAMPLES; i++) omegaH2(...sample(i / SAMPLES))
    })
}
