/** `npm run bench`: prints a table and, with a path given, writes it there as JSON for `npm run bench:compare`. */
import { writeFile } from 'node:fs/promises'
import { Bench } from 'tinybench'
import { CORE_VERSION } from '#core/index'
import { BASELINE, addCoreBenchmarks } from './core.ts'
import { rowsOf, tableText } from './table.ts'

/** Runs every benchmark; resolves to the exit status. */
export async function main(argv: readonly string[]): Promise<number> {
  const bench = new Bench({ time: 400, warmupTime: 150 })
  addCoreBenchmarks(bench)
  await bench.run()
  const rows = rowsOf(bench, BASELINE)
  process.stdout.write(`${tableText(rows)}\n`)
  const file = argv[0]
  if (file !== undefined)
    await writeFile(file, `${JSON.stringify({ coreVersion: CORE_VERSION, rows }, null, 2)}\n`)
  return 0
}
