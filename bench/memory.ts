/** Whether memory grows: the heap after the collector has run, again and again over many different solves. */
import { setFlagsFromString } from 'node:v8'
import { runInNewContext } from 'node:vm'
import { abundance, buildHistory } from '#core/index'
import { S_WAVE, history, resonant } from './inputs.ts'

export interface HeapRow {
  solves: number
  /** Megabytes in use after collection. */
  heapMB: number
}

function collector(): () => void {
  setFlagsFromString('--expose-gc')
  return runInNewContext('gc') as () => void
}

/** A different candidate each time, a different bath every hundredth and a different resonance every thousandth. */
function solve(i: number): void {
  const band = (Math.floor(i / 100) % 2000) / 1000 - 1
  const built = buildHistory(history({ bath: { treatment: 'fit-2018', band } }))
  const candidate = i % 1000 === 0 ? resonant(1e-3) : S_WAVE
  abundance(built, { ...candidate, massGeV: 50 + (i % 997) * 0.1 })
}

/** The heap after each tenth of the solves. The first tenth fills the memos; from there on it should not grow. */
export function heapOver(solves: number): HeapRow[] {
  const collect = collector()
  const rows: HeapRow[] = []
  for (let i = 1; i <= solves; i++) {
    solve(i)
    if (i % Math.ceil(solves / 10) !== 0 && i !== solves) continue
    collect()
    rows.push({ solves: i, heapMB: process.memoryUsage().heapUsed / 1e6 })
  }
  return rows
}

/** Growth of the heap from the first row to the last, megabytes for a million solves. */
export function growthPerMillion(rows: readonly HeapRow[]): number {
  const [first, last] = [rows[0]!, rows.at(-1)!]
  return ((last.heapMB - first.heapMB) / (last.solves - first.solves)) * 1e6
}

export function heapText(rows: readonly HeapRow[]): string {
  const lines = rows.map((row) => `${String(row.solves).padStart(9)} solves  ${row.heapMB.toFixed(2)} MB`)
  return [...lines, `growth: ${growthPerMillion(rows).toFixed(2)} MB for a million solves`].join('\n')
}
