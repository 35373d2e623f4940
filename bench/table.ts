import type { Bench } from 'tinybench'

/** One line of the table. */
export interface BenchRow {
  name: string
  medianMs: number
  p99Ms: number
  /** Median over the median of the baseline of the same run. */
  ratio: number
  samples: number
}

export function rowsOf(bench: Bench, baseline: string): BenchRow[] {
  const reference = bench.tasks.find((task) => task.name === baseline)?.result
  const unit = reference && 'latency' in reference ? reference.latency.p50 : NaN
  return bench.tasks.map((task) => {
    const result = task.result
    if (!result || !('latency' in result)) throw new Error(`${task.name}: no result`)
    const { p50, p99, samplesCount } = result.latency
    return { name: task.name, medianMs: p50, p99Ms: p99, ratio: p50 / unit, samples: samplesCount }
  })
}

/** The rows as aligned text. */
export function tableText(rows: readonly BenchRow[]): string {
  const width = Math.max(...rows.map((row) => row.name.length))
  const lines = rows.map(
    (row) =>
      `${row.name.padEnd(width)}  ${row.medianMs.toFixed(4).padStart(10)}  ${row.p99Ms.toFixed(4).padStart(10)}  ${row.ratio.toFixed(3).padStart(8)}  ${String(row.samples).padStart(7)}`,
  )
  return [
    `${''.padEnd(width)}  ${'median ms'.padStart(10)}  ${'p99 ms'.padStart(10)}  ${'ratio'.padStart(8)}  ${'samples'.padStart(7)}`,
    ...lines,
  ].join('\n')
}
