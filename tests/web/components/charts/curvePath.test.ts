import { describe, expect, it } from 'vitest'
import {
  pathData,
  stretches,
  thinned,
  valueAtTemperature,
} from '../../../../web/src/components/charts/curvePath.ts'
import type { Stretch } from '../../../../web/src/components/charts/curvePath.ts'
import type { AxisScale } from '../../../../web/src/components/charts/scale.ts'

const x: AxisScale = { kind: 'log', domain: [1e2, 1e-2], range: [0, 400] }
const y: AxisScale = { kind: 'linear', domain: [0, 10], range: [100, 0] }
const curve = (points: readonly (readonly [number, number])[]) => ({
  temperatureGeV: Float64Array.from(points, ([temperature]) => temperature),
  value: Float64Array.from(points, ([, value]) => value),
})

describe('a curve', () => {
  it('is interrupted where it is not defined', () => {
    const parts = stretches(
      curve([
        [1e2, 1],
        [10, 2],
        [1, NaN],
        [0.1, 4],
        [0.01, 5],
      ]),
      x,
      y,
    )
    expect(parts.map((part) => part.length)).toEqual([2, 2])
    expect(pathData(parts)).toBe('M0.0 90.0L100.0 80.0M300.0 60.0L400.0 50.0')
  })

  it('draws a step as a step', () => {
    const [part] = stretches(
      curve([
        [1e2, 8],
        [1, 8],
        [1, 3],
        [1e-2, 3],
      ]),
      x,
      y,
    )
    const rounded = part!.map((point) => point.map((pixels) => Number(pixels.toFixed(9))))
    expect(rounded).toEqual([
      [0, 20],
      [200, 20],
      [200, 70],
      [400, 70],
    ])
  })

  it('leaves the frame at the bottom where a logarithmic value falls to nothing', () => {
    const log: AxisScale = { kind: 'log', domain: [1e-16, 1], range: [100, 0] }
    const [part] = stretches(
      curve([
        [1e2, 1e-8],
        [1, 0],
      ]),
      x,
      log,
    )
    expect(part![0]![1]).toBeCloseTo(50)
    expect(part![1]![1]).toBeGreaterThan(100)
  })

  it('is nothing when no value is known', () => {
    expect(
      pathData(
        stretches(
          curve([
            [10, NaN],
            [1, NaN],
          ]),
          x,
          y,
        ),
      ),
    ).toBe('')
  })
})

describe('thinning', () => {
  const column = (at: number, heights: readonly number[]): Stretch =>
    heights.map((height, i) => [at + i / (heights.length + 1), height])

  it('keeps first, lowest, highest and last of a pixel column, in their order', () => {
    const kept = thinned(column(7, [5, 1, 3, 9, 4, 6]))
    expect(kept.map(([, height]) => height)).toEqual([5, 1, 9, 6])
  })

  it('leaves at most four points a column and every extreme', () => {
    const heights = Array.from({ length: 5000 }, (_, i) => Math.sin(i * 12.9898) * 40)
    const points = heights.map((height, i): [number, number] => [i / 500, height])
    const kept = thinned(points)
    expect(kept.length).toBeLessThanOrEqual(4 * 10)
    expect(Math.max(...kept.map((point) => point[1]))).toBe(Math.max(...heights))
    expect(Math.min(...kept.map((point) => point[1]))).toBe(Math.min(...heights))
  })

  it('leaves a sparse curve as it is', () => {
    const points: Stretch = [
      [0, 1],
      [3, 2],
      [9, 4],
    ]
    expect(thinned(points)).toEqual(points)
  })
})

describe('the value at the cursor', () => {
  const line = curve([
    [100, 0],
    [1, 2],
    [0.01, 8],
  ])

  it('lies on the line between the neighbours in ln T', () => {
    expect(valueAtTemperature(line, 10)).toBeCloseTo(1)
    expect(valueAtTemperature(line, 0.1)).toBeCloseTo(5)
    expect(valueAtTemperature(line, 1)).toBeCloseTo(2)
  })

  it('is not made up outside of the curve', () => {
    expect(valueAtTemperature(line, 101)).toBeNaN()
    expect(valueAtTemperature(line, 0.009)).toBeNaN()
  })
})
