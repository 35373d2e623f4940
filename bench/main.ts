/**
 * `npm run bench [-- FILE]` prints a table and writes it to FILE when one is named; `npm run bench -- core [FILE]` leaves the
 * server out; `npm run bench -- compare BEFORE AFTER` compares two written tables; `npm run bench -- memory [SOLVES]` shows
 * the heap over a million solves, or as many as said.
 */
import { writeFile } from 'node:fs/promises'
import { Bench } from 'tinybench'
import { CORE_VERSION } from '#core/index'
import { addApiBenchmarks } from './api.ts'
import { BASELINE } from './baseline.ts'
import { comparison } from './compare.ts'
import { addCoreBenchmarks } from './core.ts'
import { heapOver, heapText } from './memory.ts'
import { rowsOf, tableText } from './table.ts'
import type { BenchFile } from './table.ts'

const USAGE = `usage: npm run bench -- [FILE.json]
       npm run bench -- core [FILE.json]
       npm run bench -- compare BEFORE.json AFTER.json
       npm run bench -- memory [SOLVES]
`

const print = (text: string): boolean => process.stdout.write(`${text}\n`)

async function measure(file: string | undefined, { server }: { server: boolean }): Promise<void> {
  const bench = new Bench({ time: 400, iterations: 10, warmupTime: 150, warmupIterations: 3 })
  addCoreBenchmarks(bench)
  const end = server ? await addApiBenchmarks(bench) : async () => undefined
  try {
    await bench.run()
  } finally {
    await end()
  }
  const table: BenchFile = { coreVersion: CORE_VERSION, rows: rowsOf(bench, BASELINE) }
  print(tableText(table.rows))
  if (file !== undefined) await writeFile(file, `${JSON.stringify(table, null, 2)}\n`)
}

/** Resolves to the exit status. */
export async function main(argv: readonly string[]): Promise<number> {
  const [first, second, third] = argv
  if (first === 'compare' && second !== undefined && third !== undefined)
    print(await comparison(second, third))
  else if (first === 'memory') print(heapText(heapOver(Number(second ?? 1_000_000))))
  else if (first === 'core') await measure(second, { server: false })
  else if (first !== 'compare') await measure(first, { server: true })
  else {
    process.stderr.write(USAGE)
    return 2
  }
  return 0
}
