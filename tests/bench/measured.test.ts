/** That the measurements measure what they say. */
import { Bench } from 'tinybench'
import { describe, expect, it } from 'vitest'
import { abundance, buildHistory } from '#core/index'
import { plainTables } from '../../bench/abundances.ts'
import { addCoreBenchmarks } from '../../bench/core.ts'
import { FIT, S_WAVE } from '../../bench/inputs.ts'
import { growthPerMillion } from '../../bench/memory.ts'
import { plainFreezeOut } from '../../bench/plainFreezeOut.ts'
import { rowsOf, tableText } from '../../bench/table.ts'
import { slightly } from '../../bench/unused.ts'
import { relative } from '../core/fixtures.ts'

describe('the plain solver beside the core’s', () => {
  it('is right to 1e-6, as a quarter of its step shows', () => {
    // Of order two: the difference is 15/16 of the error.
    expect(relative(plainFreezeOut(plainTables()), plainFreezeOut(plainTables(48_000)))).toBeLessThan(1e-6)
  })

  it('gives the same yield, but for the 6e-6 annihilated after its tables end', () => {
    const { yieldToday } = abundance(buildHistory(FIT), S_WAVE)
    const excess = plainFreezeOut(plainTables()) / yieldToday - 1
    expect(excess).toBeGreaterThan(3e-6)
    expect(excess).toBeLessThan(8e-6)
  })
})

describe('the measurements', () => {
  const bench = new Bench({ time: 0, iterations: 1, warmup: false })
  addCoreBenchmarks(bench)

  it('have names of their own', () => {
    const names = bench.tasks.map((task) => task.name)
    expect(new Set(names).size).toBe(names.length)
  })

  it('make rows over the baseline of their run, one a line', async () => {
    const few = new Bench({ time: 1, iterations: 2, warmup: false })
    few.add('unit', () => void Math.sqrt(2)).add('thing', () => void Math.hypot(slightly(1), 2))
    await few.run()
    const rows = rowsOf(few, 'unit')
    expect(rows.map((row) => row.name)).toEqual(['unit', 'thing'])
    expect(rows[0]!.ratio).toBe(1)
    expect(rows[1]!.ratio).toBe(rows[1]!.minMs / rows[0]!.minMs)
    expect(tableText(rows).split('\n')).toHaveLength(3)
  })
})

it('growth of the heap is told for a million solves', () => {
  const rows = [
    { solves: 100, heapMB: 10 },
    { solves: 200, heapMB: 12 },
    { solves: 300, heapMB: 11 },
  ]
  expect(growthPerMillion(rows)).toBe(5000)
})
