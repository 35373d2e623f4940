import { describe, expect, it } from 'vitest'
import { ladderDomain, ladderTicks, rungs } from '../../../../web/src/components/charts/ladder.ts'

describe('the factor ladder', () => {
  it('runs from product to product, each rung from where the last one ended', () => {
    const steps = rungs(0.0665, [
      { label: 'bath', factor: 0.941 },
      { label: 'expansion', factor: 1.925 },
    ])
    expect(steps[0]!.from).toBe(0.0665)
    expect(steps[1]!.from).toBe(steps[0]!.to)
    expect(steps[1]!.to).toBeCloseTo(0.1205, 4)
  })

  it('stays where it is at a factor that could not be computed, and says so', () => {
    const [unknown, known] = rungs(0.1, [
      { label: 'bath', factor: null },
      { label: 'today', factor: 2 },
    ])
    expect(unknown).toEqual({ label: 'bath', factor: null, from: 0.1, to: 0.1 })
    expect(known!.to).toBe(0.2)
  })

  it('has an axis that holds every value with room on both sides', () => {
    const [low, high] = ladderDomain([0.0665, 0.0626, 0.1205, 0.12])
    expect(low).toBeLessThanOrEqual(0.0626 / 1.25)
    expect(high).toBeGreaterThanOrEqual(0.1205 * 1.25)
  })

  it('has room about a single value, and an axis even when there is none to show', () => {
    expect(ladderDomain([0.12, 0.12])).toEqual([0.12 / 1.25, 0.12 * 1.25])
    expect(ladderDomain([0, NaN, Infinity])).toEqual([10 ** -0.5, 10 ** 0.5])
  })

  it('labels 1, 2 and 5 while they are few, and powers of ten when they are many', () => {
    expect(ladderTicks([0.04, 0.25], 5)).toEqual([0.05, 0.1, 0.2])
    expect(ladderTicks([1e-6, 1], 5)).toEqual([1e-6, 1e-4, 1e-2, 1])
  })

  it('still labels an axis with hardly a round number on it', () => {
    expect(ladderTicks([0.096, 0.15], 5).length).toBeGreaterThan(0)
    expect(ladderTicks([0.11, 0.17], 5).length).toBeGreaterThan(0)
  })
})
