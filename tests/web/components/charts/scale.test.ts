import { describe, expect, it } from 'vitest'
import { barDomain } from '../../../../web/src/components/charts/barDomain.ts'
import { linearTicks, logTicks, position, valueAt } from '../../../../web/src/components/charts/scale.ts'
import type { AxisScale, Tick } from '../../../../web/src/components/charts/scale.ts'

const labelled = (ticks: readonly Tick[]): number[] =>
  ticks.filter((tick) => tick.major).map((tick) => tick.value)

describe('the axis of temperature', () => {
  const x: AxisScale = { kind: 'log', domain: [1e3, 1e-3], range: [40, 640] }

  it('runs from hot at the left to cold at the right, a decade as wide as any other', () => {
    expect([1e3, 1e2, 1, 1e-3].map((value) => Math.round(position(x, value) * 1e6) / 1e6)).toEqual([
      40, 140, 340, 640,
    ])
  })

  it('finds the temperature at a position', () => {
    for (const temperature of [700, 4.35, 1.565e-1, 2e-3])
      expect(valueAt(x, position(x, temperature))).toBeCloseTo(temperature, 10)
  })

  it('has no position for what a logarithm does not know', () => {
    expect(position(x, -1)).toBeNaN()
    expect(Number.isFinite(position(x, 0))).toBe(false)
  })
})

describe('ticks', () => {
  it('label every power of ten while they have room, with the digits between unlabelled', () => {
    const ticks = logTicks([1e2, 1e-3], 8)
    expect(labelled(ticks)).toEqual([1e-3, 1e-2, 0.1, 1, 10, 100])
    expect(ticks.filter((tick) => !tick.major)).toHaveLength(5 * 8)
  })

  it('thin the powers of ten evenly when there are more than fit', () => {
    expect(labelled(logTicks([1e-16, 1e-2], 8))).toEqual([1e-16, 1e-14, 1e-12, 1e-10, 1e-8, 1e-6, 1e-4, 1e-2])
  })

  it('label 2 and 5 too where hardly a power of ten fits', () => {
    expect(labelled(logTicks([0.04, 0.6], 8))).toEqual([0.05, 0.1, 0.2, 0.5])
  })

  it('label round values in a domain narrower still', () => {
    const ticks = labelled(logTicks([0.21, 0.34], 8))
    expect(ticks.length).toBeGreaterThanOrEqual(2)
    expect(ticks).toContain(0.25)
  })

  it('are round on a linear axis', () => {
    expect(labelled(linearTicks([0, 115], 5))).toEqual([0, 20, 40, 60, 80, 100])
    expect(labelled(linearTicks([0.78, 1.22], 3))).toEqual([0.8, 1, 1.2])
  })

  it('end, with none, for a domain that has no extent or no logarithm', () => {
    expect(logTicks([0, 10], 5)).toEqual([])
    expect(logTicks([NaN, 10], 5)).toEqual([])
    expect(logTicks([1, Infinity], 5)).toEqual([])
    expect(linearTicks([2, 2], 5)).toEqual([])
    expect(linearTicks([0, NaN], 5)).toEqual([])
  })
})

describe('the abundance bar', () => {
  it('reaches from 0.001 to 10, and by whole decades as far as the answer', () => {
    expect(barDomain(0.12)).toEqual([1e-3, 10])
    expect(barDomain(3e-6)).toEqual([1e-6, 10])
    expect(barDomain(4.2e8)).toEqual([1e-3, 1e9])
  })

  it('keeps its usual ends for an answer it cannot show', () => {
    expect(barDomain(0)).toEqual([1e-3, 10])
    expect(barDomain(NaN)).toEqual([1e-3, 10])
  })
})
