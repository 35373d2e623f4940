import { readFile } from 'node:fs/promises'
import type { BenchRow } from './table.ts'

interface BenchFile {
  coreVersion: string
  rows: BenchRow[]
}

const read = async (file: string): Promise<BenchFile> => JSON.parse(await readFile(file, 'utf8')) as BenchFile

/** Two written tables side by side: how each ratio to its own run's baseline has changed. */
export async function comparison(before: string, after: string): Promise<string> {
  const [old, now] = [await read(before), await read(after)]
  const width = Math.max(...now.rows.map((row) => row.name.length))
  const lines = now.rows.map((row) => {
    const earlier = old.rows.find((each) => each.name === row.name)
    const change = earlier ? `× ${(row.ratio / earlier.ratio).toFixed(2)}` : 'new'
    return `${row.name.padEnd(width)}  ${(earlier?.ratio.toFixed(3) ?? '–').padStart(9)}  ${row.ratio.toFixed(3).padStart(9)}  ${change.padStart(8)}`
  })
  return [
    `${''.padEnd(width)}  ${'before'.padStart(9)}  ${'after'.padStart(9)}  ${'change'.padStart(8)}`,
    ...lines,
  ].join('\n')
}
