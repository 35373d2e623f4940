/** Benchmarks of the core, with a fixed piece of arithmetic beside them so that ratios of one run can be compared. */
import type { Bench } from 'tinybench'
import { benchAnswer } from '#core/index'
import { addAbundanceBenchmarks } from './abundances.ts'
import { BASELINE, baselineWork } from './baseline.ts'
import { addHistoryBenchmarks } from './histories.ts'
import { KINATION, STEPS, S_WAVE } from './inputs.ts'
import { addManyHistoriesBenchmarks } from './manyHistories.ts'

/** Adds every benchmark of the core. */
export function addCoreBenchmarks(bench: Bench): void {
  bench.add(BASELINE, () => void baselineWork())
  addHistoryBenchmarks(bench)
  addAbundanceBenchmarks(bench)
  addManyHistoriesBenchmarks(bench)
  bench.add('everything the Bench shows', () => {
    benchAnswer({
      history: KINATION,
      baseline: STEPS,
      candidate: S_WAVE,
      window: { hotGeV: 1000, coldGeV: 1e-4 },
    })
  })
}
