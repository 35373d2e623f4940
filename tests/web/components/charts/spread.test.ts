import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { spread } from '../../../../web/src/components/charts/spread.ts'

const FRAME = [6, 296] as const
const GAP = 12

describe('labels at the ends of curves', () => {
  it('stay where they are when none is near another', () => {
    expect(spread([20, 200, 100], GAP, FRAME)).toEqual([20, 200, 100])
  })

  it('move apart when they would collide', () => {
    expect(spread([100, 103], GAP, FRAME)).toEqual([100, 112])
  })

  it('move up from the foot of the frame', () => {
    expect(spread([295, 294, 296], GAP, FRAME)).toEqual([284, 272, 296])
  })

  it('never stand closer than the gap, keep their order and stay in the frame', () => {
    const heights = fc.array(fc.double({ min: -500, max: 800, noNaN: true }), { minLength: 1, maxLength: 20 })
    fc.assert(
      fc.property(heights, (wanted) => {
        const order = wanted.map((_, i) => i).sort((a, b) => wanted[a]! - wanted[b]!)
        const placed = spread(wanted, GAP, FRAME)
        const sorted = order.map((i) => placed[i]!)
        expect(sorted[0]!).toBeGreaterThanOrEqual(FRAME[0])
        expect(sorted.at(-1)!).toBeLessThanOrEqual(FRAME[1])
        for (let i = 1; i < sorted.length; i++)
          expect(sorted[i]! - sorted[i - 1]!).toBeGreaterThanOrEqual(GAP - 1e-9)
      }),
    )
  })
})
