import { readFileSync } from 'node:fs'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { latinHypercubeColumn } from '#core/numerics/sampling/latinHypercube'
import { philox } from '#core/numerics/sampling/philox'
import { RandomStream } from '#core/numerics/sampling/randomStream'
import { normalQuantile } from '#core/numerics/special/normalQuantile'
import { moments } from '#core/numerics/statistics/moments'
import { quantile } from '#core/numerics/statistics/quantile'
import { rankCorrelation, ranks } from '#core/numerics/statistics/rankCorrelation'
import { relative } from '../fixtures.ts'

interface SamplingFixture {
  philox: { counter: number[]; key: number[]; words: number[] }[]
  columns: { name: string; samples: number; seed: number; values: number[] }[]
  normalQuantiles: { p: number; quantile: number }[]
  statistics: {
    values: number[]
    others: number[]
    quantiles: { probability: number; value: number }[]
    mean: number
    standardDeviation: number
    rankCorrelation: number
    ranks: number[]
  }
}

const fixture = JSON.parse(
  readFileSync(new URL('../../reference/sampling.json', import.meta.url), 'utf8'),
) as SamplingFixture

describe('random words', () => {
  it('are those of the published generator, word for word', () => {
    for (const { counter, key, words } of fixture.philox) {
      const out = new Uint32Array(4)
      philox(Uint32Array.from(counter), Uint32Array.from(key), out)
      expect([...out]).toEqual(words)
    }
  })

  it('are spread evenly: 64 equal shares of 64,000 by χ²', () => {
    const stream = new RandomStream('evenly', 20261201)
    const counts = new Array<number>(64).fill(0)
    for (let i = 0; i < 64_000; i++) counts[stream.below(64)]!++
    const chiSquare = counts.reduce((sum, count) => sum + (count - 1000) ** 2 / 1000, 0)
    // 63 degrees of freedom: 63 ± 11.2, and the words are always these; five standard deviations.
    expect(Math.abs(chiSquare - 63)).toBeLessThan(56)
  })

  it('lie strictly between 0 and 1 as fractions', () => {
    const stream = new RandomStream('fraction', 0)
    for (let i = 0; i < 1000; i++) {
      const fraction = stream.fraction()
      expect(fraction > 0 && fraction < 1).toBe(true)
    }
  })
})

describe('a Latin hypercube', () => {
  it('has the columns made independently from the same names and seeds', () => {
    for (const { name, samples, seed, values } of fixture.columns)
      expect([...latinHypercubeColumn(name, samples, seed)]).toEqual(values)
  })

  it('has exactly one sample in each stratum, whatever the name, number and seed', () => {
    fc.assert(
      fc.property(fc.string(), fc.integer({ min: 1, max: 400 }), fc.maxSafeNat(), (name, samples, seed) => {
        const strata = [...latinHypercubeColumn(name, samples, seed)].map((u) => Math.floor(u * samples))
        expect(strata.sort((a, b) => a - b)).toEqual(strata.map((_, i) => i))
      }),
    )
  })

  it('has columns that do not follow each other', () => {
    const columns = ['a', 'b', 'c', 'd'].map((name) => latinHypercubeColumn(name, 4000, 5))
    columns.forEach((column, i) =>
      columns.slice(0, i).forEach((other) => {
        // Independent ranks correlate to 1/√4000 = 0.016; five standard deviations.
        expect(Math.abs(rankCorrelation(column, other)!)).toBeLessThan(0.08)
      }),
    )
    expect(latinHypercubeColumn('a', 50, 6)).not.toEqual(latinHypercubeColumn('a', 50, 5))
  })
})

describe('the normal quantile', () => {
  it('agrees with 400-digit arithmetic to 1e-15', () => {
    for (const { p, quantile: expected } of fixture.normalQuantiles)
      expect(relative(normalQuantile(p), expected), String(p)).toBeLessThan(1e-15)
  })

  it('is odd about a half and has infinite ends', () => {
    for (const p of [1e-3, 0.2, 0.4]) expect(normalQuantile(1 - p)).toBeCloseTo(-normalQuantile(p), 13)
    expect([0, 0.5, 1].map(normalQuantile)).toEqual([-Infinity, 0, Infinity])
    expect([-0.1, 1.1, NaN].map(normalQuantile)).toEqual([NaN, NaN, NaN])
  })
})

describe('statistics of samples', () => {
  const { values, others, ...expected } = fixture.statistics

  it('are those of numpy and SciPy', () => {
    const ascending = Float64Array.from(values).sort()
    for (const { probability, value } of expected.quantiles)
      expect(relative(quantile(ascending, probability), value)).toBeLessThan(1e-15)
    expect(relative(moments(values).mean, expected.mean)).toBeLessThan(1e-14)
    expect(relative(moments(values).standardDeviation, expected.standardDeviation)).toBeLessThan(1e-14)
    expect([...ranks(values)]).toEqual(expected.ranks)
    expect(relative(rankCorrelation(values, others)!, expected.rankCorrelation)).toBeLessThan(1e-13)
  })

  it('exist for one value and for equal ones', () => {
    expect(quantile([7], 0.3)).toBe(7)
    expect(moments([7])).toEqual({ mean: 7, standardDeviation: 0 })
    expect(rankCorrelation([1, 2, 3], [4, 4, 4])).toBeNull()
  })
})
