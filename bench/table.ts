import type { Bench } from 'tinybench'

/** One line of the table. */
export interface BenchRow {
  name: string
  /** The least disturbed sample, and the middle one. */
  minMs: number
  medianMs: number
  p99Ms: number
  /** Minimum over the minimum of the baseline of the same run. */
  ratio: number
  samples: number
}

/** A written table. */
export interface BenchFile {
  coreVersion: string
  rows: BenchRow[]
}

export function rowsOf(bench: Bench, baseline: string): BenchRow[] {
  const latencies = bench.tasks.map((task) => {
    const { result, name } = task
    if (!result || !('latency' in result)) throw new Error(`${name}: no result`)
    return { name, latency: result.latency }
  })
  const unit = latencies.find((each) => each.name === baseline)!.latency.min
  return latencies.map(({ name, latency: { min, p50, p99, samplesCount } }) => ({
    name,
    minMs: min,
    medianMs: p50,
    p99Ms: p99,
    ratio: min / unit,
    samples: samplesCount,
  }))
}

const HEADINGS = ['min ms', 'median ms', 'p99 ms', 'ratio', 'samples']

/** The rows as aligned text. */
export function tableText(rows: readonly BenchRow[]): string {
  const width = Math.max(...rows.map((row) => row.name.length))
  const line = (name: string, cells: readonly string[]): string =>
    [name.padEnd(width), ...cells.map((cell) => cell.padStart(10))].join('  ')
  return [
    line('', HEADINGS),
    ...rows.map((row) =>
      line(row.name, [
        row.minMs.toFixed(4),
        row.medianMs.toFixed(4),
        row.p99Ms.toFixed(4),
        row.ratio.toFixed(3),
        String(row.samples),
      ]),
    ),
  ].join('\n')
}
