import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { comparison, comparisonText } from '../../bench/compare.ts'
import type { BenchRow } from '../../bench/table.ts'

const row = (name: string, ratio: number): BenchRow => ({
  name,
  minMs: ratio,
  medianMs: ratio,
  p99Ms: ratio,
  ratio,
  samples: 10,
})

const before = [row('baseline', 1), row('freeze-out', 2), row('an old line', 7)]
const after = [row('baseline', 1), row('freeze-out', 0.5), row('a new line', 3)]

/** The cells of the line that begins with a name. */
const cells = (text: string, name: string): string[] =>
  text
    .split('\n')
    .find((line) => line.startsWith(name))!
    .slice(name.length)
    .trim()
    .split(/ {2,}/)

describe('two tables of measurements', () => {
  const text = comparisonText(before, after)

  it('are compared by the ratio of each line to the baseline of its own run', () => {
    expect(cells(text, 'baseline')).toEqual(['1.000', '1.000', '× 1.00'])
    expect(cells(text, 'freeze-out')).toEqual(['2.000', '0.500', '× 0.25'])
  })

  it('keep a line that only one of them has', () => {
    expect(cells(text, 'a new line')).toEqual(['–', '3.000', 'new'])
    expect(cells(text, 'an old line')).toEqual(['7.000', '–', 'gone'])
  })
})

describe('two written tables', () => {
  let folder: string
  beforeAll(async () => void (folder = await mkdtemp(join(tmpdir(), 'emberline-bench-'))))
  afterAll(() => rm(folder, { recursive: true }))

  it('are compared as they were written', async () => {
    const files = [join(folder, 'before.json'), join(folder, 'after.json')] as const
    await writeFile(files[0], JSON.stringify({ coreVersion: '1', rows: before }))
    await writeFile(files[1], JSON.stringify({ coreVersion: '2', rows: after }))
    expect(await comparison(...files)).toBe(comparisonText(before, after))
  })
})
