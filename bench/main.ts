/**
 * `npm run bench [-- FILE]` prints a table and writes it to FILE when one is named;
 * `npm run bench -- compare BEFORE AFTER` compares two written tables.
 */
import { writeFile } from 'node:fs/promises'
import { Bench } from 'tinybench'
import { CORE_VERSION } from '#core/index'
import { addApiBenchmarks } from './api.ts'
import { comparison } from './compare.ts'
import { BASELINE, addCoreBenchmarks } from './core.ts'
import { rowsOf, tableText } from './table.ts'

async function measure(file: string | undefined): Promise<void> {
  const bench = new Bench({ time: 400, warmupTime: 150 })
  addCoreBenchmarks(bench)
  const end = await addApiBenchmarks(bench)
  try {
    await bench.run()
  } finally {
    await end()
  }
  const rows = rowsOf(bench, BASELINE)
  process.stdout.write(`${tableText(rows)}\n`)
  if (file !== undefined)
    await writeFile(file, `${JSON.stringify({ coreVersion: CORE_VERSION, rows }, null, 2)}\n`)
}

/** Resolves to the exit status. */
export async function main(argv: readonly string[]): Promise<number> {
  const [first, before, after] = argv
  if (first !== 'compare') await measure(first)
  else if (before !== undefined && after !== undefined)
    process.stdout.write(`${await comparison(before, after)}\n`)
  else {
    process.stderr.write('usage: npm run bench -- compare BEFORE.json AFTER.json\n')
    return 2
  }
  return 0
}
