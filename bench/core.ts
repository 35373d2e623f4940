/** Benchmarks of the core, with a fixed piece of arithmetic beside them so that ratios of one run can be compared. */
import type { Bench } from 'tinybench'
import { abundance, buildHistory } from '#core/index'
import { benchAnswer } from '#core/index'
import { candidateInput, historyInput } from '#core/wire/index'

/** One millisecond or so of exponentials and square roots: how fast this machine is just now. */
export function baselineWork(): number {
  let sum = 0
  for (let i = 1; i <= 40_000; i++) sum += Math.exp(-i / 40_000) * Math.sqrt(i)
  return sum
}

export const BASELINE = 'baseline: 40,000 exp and sqrt'

const fit = historyInput.parse({ bath: { treatment: 'fit-2018' } })
const kination = historyInput.parse({ expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1.15 } })
const steps = historyInput.parse({ bath: { treatment: 'thresholds' } })

const freezeOut = candidateInput.parse({
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
})
const freezeIn = candidateInput.parse({
  mechanism: 'freeze-in-decay',
  massGeV: 1e-5,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  parent: { massGeV: 300, degreesOfFreedom: 1, statistics: 'boson', lifetimeS: 1e-9 },
})

/** A number no earlier run has used, so that no table is found ready. */
let unused = 0
const coldHistory = (treatment: string): void => {
  unused++
  const neutrinos = { treatment: 'specified', nEff: 3 + unused * 1e-7 }
  buildHistory(historyInput.parse({ bath: { treatment }, neutrinos }))
}

/** Adds every benchmark of the core. */
export function addCoreBenchmarks(bench: Bench): void {
  const history = buildHistory(fit)
  bench.add(BASELINE, () => void baselineWork())
  for (const treatment of [
    'thresholds',
    'ideal-switch',
    'crossover',
    'lattice-2014',
    'lattice-2016',
    'fit-2018',
  ])
    bench.add(`history, cold: ${treatment}`, () => coldHistory(treatment))
  bench.add('history, same bath, other expansion', () => void buildHistory(kination))
  bench.add('freeze-out, partial waves', () => void abundance(history, freezeOut))
  bench.add('freeze-in by decay', () => void abundance(history, freezeIn))
  bench.add('everything the Bench shows', () => {
    benchAnswer({
      history: kination,
      baseline: steps,
      candidate: freezeOut,
      window: { hotGeV: 1000, coldGeV: 1e-4 },
    })
  })
}
