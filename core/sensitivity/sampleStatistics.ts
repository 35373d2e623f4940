/** What samples of an abundance are like, and how they stand to a measured one. */
import { moments } from '../numerics/statistics/moments.ts'
import { quantile } from '../numerics/statistics/quantile.ts'
import type { MeasuredNumber } from '../wire/measured.ts'
import type { Comparison, Histogram, SampledNumber } from '../wire/propagation.ts'

/** 95 and 68 % between the outer and the inner two. */
const PROBABILITIES = [0.025, 0.16, 0.5, 0.84, 0.975] as const
const [LOW, MIDDLE, HIGH] = [0.16, 0.5, 0.84]

/** @param ascending positive numbers, at least one */
export function sampledNumber(ascending: Float64Array): SampledNumber {
  const plain = moments(ascending)
  const ln = moments(ascending.map(Math.log))
  return {
    quantiles: PROBABILITIES.map((probability) => ({ probability, value: quantile(ascending, probability) })),
    mean: plain.mean,
    standardDeviation: plain.standardDeviation,
    meanOfLn: ln.mean,
    standardDeviationOfLn: ln.standardDeviation,
    smallest: ascending[0]!,
    largest: ascending.at(-1)!,
  }
}

/** Half the width in ln of a histogram of values that are all alike. */
const NARROWEST = 1e-9

/** Counts in bins equally wide in the logarithm, from the smallest to the largest. */
export function logHistogram(ascending: Float64Array, bins: number): Histogram {
  const [lowest, highest] = [Math.log(ascending[0]!), Math.log(ascending.at(-1)!)]
  const spread = highest - lowest < 2 * NARROWEST ? NARROWEST : 0
  const from = lowest - spread
  const width = (highest + spread - from) / bins
  const counts = new Array<number>(bins).fill(0)
  for (const value of ascending) counts[Math.min(bins - 1, Math.floor((Math.log(value) - from) / width))]!++
  return { edges: Array.from({ length: bins + 1 }, (_, i) => Math.exp(from + i * width)), counts }
}

/**
 * Samples beside a measured value. The pull is taken in ln, in which abundances spread evenly; there each side of the median and
 * of the measurement has its own width, of which those that face each other count.
 */
export function comparedWith(measured: MeasuredNumber, ascending: Float64Array): Comparison {
  const { value, minus, plus } = measured
  const median = quantile(ascending, MIDDLE)
  const above = median > value
  const ownWidth = Math.log(quantile(ascending, above ? LOW : HIGH) / median)
  const measuredWidth = Math.log1p((above ? plus : -minus) / value)
  const width = Math.hypot(ownWidth, measuredWidth)
  return {
    measured,
    pull: width > 0 ? Math.log(median / value) / width : null,
    probabilityBelow: ascending.filter((sample) => sample < value).length / ascending.length,
    share: sampledNumber(ascending.map((sample) => sample / value)),
  }
}
