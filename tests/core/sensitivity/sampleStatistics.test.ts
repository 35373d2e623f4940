import { describe, expect, it } from 'vitest'
import { twoPieceNormalQuantile } from '#core/sensitivity/distributions'
import { comparedWith, logHistogram, sampledNumber } from '#core/sensitivity/sampleStatistics'

/** ln of the samples follows a two-piece normal distribution, a third as wide below as above. */
const LN = { value: 0, minus: 0.3, plus: 0.9 }
const SAMPLES = 4000
const ascending = Float64Array.from({ length: SAMPLES }, (_, i) =>
  Math.exp(twoPieceNormalQuantile(LN, (i + 0.5) / SAMPLES)),
)
const lnAt = (probability: number): number => twoPieceNormalQuantile(LN, probability)

describe('the pull', () => {
  it('counts the sides that face each other', () => {
    // Strata of 1/4000 at the 16 and 84 % quantiles: 1e-3 of a width.
    const pullAt = (value: number, minus = 0, plus = 0): number =>
      comparedWith({ value, minus, plus }, ascending).pull!
    const median = lnAt(0.5)
    const [below, above] = [median - lnAt(0.16), lnAt(0.84) - median]
    expect(pullAt(Math.exp(-1))).toBeCloseTo((median + 1) / below, 2)
    expect(pullAt(Math.exp(2))).toBeCloseTo((median - 2) / above, 2)
    const low = Math.exp(-1)
    expect(pullAt(low, 0.3 * low, 0.5 * low)).toBeCloseTo((median + 1) / Math.hypot(below, Math.log(1.5)), 2)
    const high = Math.exp(2)
    expect(pullAt(high, 0.3 * high, 0.5 * high)).toBeCloseTo(
      (median - 2) / Math.hypot(above, Math.log(0.7)),
      2,
    )
  })

  it('is null where nothing has a width', () => {
    const alike = new Float64Array(20).fill(0.1)
    expect(comparedWith({ value: 0.12, minus: 0, plus: 0 }, alike).pull).toBeNull()
    expect(logHistogram(alike, 4).counts.reduce((sum, count) => sum + count, 0)).toBe(20)
    expect(sampledNumber(alike)).toMatchObject({ standardDeviation: 0, smallest: 0.1, largest: 0.1 })
  })
})

describe('a histogram', () => {
  it('has every sample in the bin whose edges hold it', () => {
    const { edges, counts } = logHistogram(ascending, 13)
    expect(edges).toHaveLength(14)
    const own = counts.map(
      (_, i) => ascending.filter((value) => value >= edges[i]! && (value < edges[i + 1]! || i === 12)).length,
    )
    // The outermost edges are the outermost samples, up to the rounding of exp(ln).
    counts.forEach((count, i) => expect(Math.abs(count - own[i]!)).toBeLessThanOrEqual(1))
    expect(counts.reduce((sum, count) => sum + count, 0)).toBe(SAMPLES)
  })
})
