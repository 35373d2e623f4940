import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { abundance, buildHistory, computeAbundance, computeAttribution } from '#core/index'
import { attribute } from '#core/sensitivity/attribution'
import { shapleyValues } from '#core/sensitivity/shapley'
import { candidateInput, historyInput } from '#core/wire/index'
import { attributionFixture } from '../fixtures.ts'

/** A game of four players by its sixteen values. */
const game = fc.array(fc.double({ min: -5, max: 5, noNaN: true }), { minLength: 16, maxLength: 16 })

describe('Shapley values', () => {
  it('add up to the whole change (efficiency)', () => {
    fc.assert(
      fc.property(game, (values) => {
        const sum = shapleyValues(4, (subset) => values[subset]!).reduce((total, part) => total + part, 0)
        expect(Math.abs(sum - (values[15]! - values[0]!))).toBeLessThan(1e-12)
      }),
    )
  })

  it('give a player that never matters nothing (dummy)', () => {
    fc.assert(
      fc.property(game, (values) => {
        const parts = shapleyValues(4, (subset) => values[subset & 0b0111]!)
        expect(Math.abs(parts[3]!)).toBeLessThan(1e-13)
      }),
    )
  })

  it('treat interchangeable players alike, and follow a renaming (symmetry)', () => {
    const swap = (subset: number): number => (subset & 0b1100) | ((subset & 1) << 1) | ((subset & 2) >> 1)
    fc.assert(
      fc.property(game, (values) => {
        const parts = shapleyValues(4, (subset) => values[subset]!)
        const swapped = shapleyValues(4, (subset) => values[swap(subset)]!)
        expect(swapped[0]).toBeCloseTo(parts[1]!, 12)
        expect(swapped[1]).toBeCloseTo(parts[0]!, 12)
      }),
    )
  })

  it('are the mean marginal effects over all orders', () => {
    const values = [0, 1, 3, 7, 2, 2, 9, 20]
    const orders = [
      [0, 1, 2],
      [0, 2, 1],
      [1, 0, 2],
      [1, 2, 0],
      [2, 0, 1],
      [2, 1, 0],
    ]
    const mean = [0, 0, 0]
    for (const order of orders) {
      let subset = 0
      for (const player of order) {
        mean[player]! += (values[subset | (1 << player)]! - values[subset]!) / orders.length
        subset |= 1 << player
      }
    }
    shapleyValues(3, (subset) => values[subset]!).forEach((part, i) => expect(part).toBeCloseTo(mean[i]!, 13))
  })
})

describe('attribution between two histories', () => {
  it('the other way round has the same parts with the other sign', () => {
    const { input } = attributionFixture.cases[0]!
    const there = computeAttribution(input)
    const back = computeAttribution({ ...input, baseline: input.variant, variant: input.baseline })
    there.parts.forEach((part, i) => {
      expect(back.parts[i]!.group).toBe(part.group)
      expect(Math.abs(back.parts[i]!.lnFactor + part.lnFactor)).toBeLessThan(1e-12)
    })
    expect(Math.abs(back.ratio * there.ratio - 1)).toBeLessThan(1e-12)
  })

  it('of a history with itself has factors of one', () => {
    const { input } = attributionFixture.cases[0]!
    const { ratio, parts, oneAtATime } = computeAttribution({ ...input, variant: input.baseline })
    expect(ratio).toBe(1)
    for (const part of [...parts, ...oneAtATime]) expect([part.lnFactor, part.factor]).toEqual([0, 1])
  })

  it('has the two abundances, their ratio, and factors whose product is the ratio, from the wire', () => {
    for (const { input, outputs } of attributionFixture.cases) {
      const { baselineOmegaH2, variantOmegaH2, ratio, parts } = computeAttribution(input)
      // Two abundances good to 1e-8 or so each; 1e-7 is what is promised of the factors.
      expect(Math.abs(ratio / outputs.ratio - 1)).toBeLessThan(1e-7)
      expect(Math.abs(variantOmegaH2 / baselineOmegaH2 / ratio - 1)).toBeLessThan(1e-12)
      const product = parts.reduce((total, part) => total * part.factor, 1)
      expect(Math.abs(product / ratio - 1)).toBeLessThan(1e-12)
      const { omegaH2 } = computeAbundance({ history: input.variant, candidate: input.candidate })
      expect(Math.abs(variantOmegaH2 / omegaH2 - 1)).toBeLessThan(1e-12)
    }
  })

  const cases = attributionFixture.cases.map((each) => [each.name, each] as const)

  it.each(cases)('agrees with independent factors to 1e-7: %s', (_name, { input, outputs }) => {
    const candidate = candidateInput.parse(input.candidate)
    const { lnRatio, lnFactors, oneAtATime } = attribute(
      historyInput.parse(input.baseline),
      historyInput.parse(input.variant),
      (history) => abundance(buildHistory(history), candidate).omegaH2,
    )
    const find = (parts: Record<string, number>, group: string): number =>
      parts[group === 'maximumTemperature' ? 'maximumTemperatureGeV' : group]!
    expect(Math.abs(lnRatio - Math.log(outputs.ratio))).toBeLessThan(1e-7)
    for (const { group, lnFactor } of outputs.parts)
      expect(Math.abs(find(lnFactors, group) - lnFactor), group).toBeLessThan(1e-7)
    for (const { group, lnFactor } of outputs.oneAtATime)
      expect(Math.abs(find(oneAtATime, group) - lnFactor), group).toBeLessThan(1e-7)
    const sum = Object.values(lnFactors).reduce((total, part) => total + part, 0)
    expect(Math.abs(sum - lnRatio)).toBeLessThan(1e-12)
  })
})
