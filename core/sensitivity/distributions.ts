/** Distributions of inputs by their quantile functions, so that a stratum of probability is a stratum of values. */
import { normalQuantile } from '../numerics/special/normalQuantile.ts'
import type { MeasuredNumber } from '../wire/measured.ts'
import type { DistributionInput } from '../wire/propagation.ts'

export type DiscreteInput = Extract<DistributionInput, { kind: 'discrete' }>

/**
 * Quantile of the two-piece normal distribution: halves of two normal distributions of different width that join at the mode,
 * so that below it lies the share minus/(minus + plus).
 * Source: Wallis, Statistical Science 29 (2014) 106.
 */
export function twoPieceNormalQuantile({ value, minus, plus }: MeasuredNumber, probability: number): number {
  const both = minus + plus
  if (both === 0) return value
  if (probability * both < minus) return value + minus * normalQuantile((probability * both) / (2 * minus))
  return value - plus * normalQuantile(((1 - probability) * both) / (2 * plus))
}

/** Index of the choice that a probability falls on. */
export function choiceAt({ values, weights }: DiscreteInput, probability: number): number {
  if (!weights) return Math.floor(probability * values.length)
  const total = weights.reduce((sum, weight) => sum + weight, 0)
  let left = probability * total
  for (const [i, weight] of weights.entries()) {
    if (left < weight) return i
    left -= weight
  }
  return values.length - 1
}

/** The number, or the index of the choice, below which lies the given probability, strictly between 0 and 1. */
export function quantileOf(distribution: DistributionInput, probability: number): number {
  switch (distribution.kind) {
    case 'normal':
      return distribution.mean + distribution.standardDeviation * normalQuantile(probability)
    case 'two-piece-normal':
      return twoPieceNormalQuantile(distribution, probability)
    case 'log-normal':
      return distribution.median * Math.exp(distribution.standardDeviationOfLn * normalQuantile(probability))
    case 'uniform':
      return distribution.low + probability * (distribution.high - distribution.low)
    case 'log-uniform':
      return distribution.low * (distribution.high / distribution.low) ** probability
    case 'discrete':
      return choiceAt(distribution, probability)
  }
}
