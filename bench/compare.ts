import { readFile } from 'node:fs/promises'
import type { BenchFile, BenchRow } from './table.ts'

const read = async (file: string): Promise<BenchFile> => JSON.parse(await readFile(file, 'utf8')) as BenchFile

/** Two written tables side by side: how each ratio to its own run's baseline has changed. */
export function comparisonText(before: readonly BenchRow[], after: readonly BenchRow[]): string {
  const width = Math.max(...[...before, ...after].map((row) => row.name.length))
  const line = (name: string, ...cells: readonly string[]): string =>
    [name.padEnd(width), ...cells.map((cell) => cell.padStart(9))].join('  ')
  const ratioOf = (row: BenchRow | undefined): string => row?.ratio.toFixed(3) ?? '–'
  const earlier = new Map(before.map((row) => [row.name, row]))
  const gone = before.filter((row) => !after.some((each) => each.name === row.name))
  return [
    line('', 'before', 'after', 'change'),
    ...after.map((row) => {
      const old = earlier.get(row.name)
      const change = old ? `× ${(row.ratio / old.ratio).toFixed(2)}` : 'new'
      return line(row.name, ratioOf(old), ratioOf(row), change)
    }),
    ...gone.map((row) => line(row.name, ratioOf(row), ratioOf(undefined), 'gone')),
  ].join('\n')
}

/** The same for two files. */
export async function comparison(before: string, after: string): Promise<string> {
  const [old, now] = await Promise.all([read(before), read(after)])
  return comparisonText(old.rows, now.rows)
}
