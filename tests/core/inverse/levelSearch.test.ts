import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { levelSearch } from '#core/inverse/levelSearch'
import type { LevelAnswer } from '#core/inverse/levelSearch'
import { complete } from '#core/steps/steps'

const search = (f: (x: number) => number, low = 0, high = 10): LevelAnswer =>
  complete(levelSearch({ f, low, high, stretches: 40, tolerance: 1e-12, reached: 1e-9, noise: 1e-12 }))

describe('the search for a level', () => {
  it('finds all roots of a polynomial that are two stretches apart', () => {
    fc.assert(
      fc.property(
        fc.uniqueArray(fc.integer({ min: 0, max: 18 }), { minLength: 1, maxLength: 4 }),
        (halves) => {
          const expected = halves.map((half) => 0.2 + half / 2).sort((a, b) => a - b)
          const { roots, leaps } = search((x) => expected.reduce((product, root) => product * (x - root), 1))
          expect(leaps).toEqual([])
          expect(roots).toHaveLength(expected.length)
          roots.forEach((root, i) => expect(Math.abs(root - expected[i]!)).toBeLessThan(1e-11))
        },
      ),
    )
  })

  it('finds a root beside a sample that is one itself', () => {
    expect(search((x) => (x - 0.3) * (x - 0.5)).roots).toHaveLength(2)
  })

  it('finds two roots closer together than the scan', () => {
    const { roots } = search((x) => (x - 3.11) ** 2 - 1e-6)
    expect(roots).toHaveLength(2)
    expect(Math.abs(roots[0]! - 3.109)).toBeLessThan(1e-9)
    expect(Math.abs(roots[1]! - 3.111)).toBeLessThan(1e-9)
  })

  it('finds a root between the scan and the edge of what is defined', () => {
    const { roots } = search((x) => (x > 7.6001 ? NaN : x - 7.6))
    expect(roots).toHaveLength(1)
    expect(Math.abs(roots[0]! - 7.6)).toBeLessThan(1e-9)
    expect(search((x) => (x < 2.3999 ? NaN : 2.4 - x)).roots).toHaveLength(1)
  })

  it('tells leaps from roots', () => {
    const { roots, leaps } = search((x) => (x < 5.03 ? -1 : x < 8 ? 1 : 9 - x))
    expect(leaps).toHaveLength(1)
    expect(Math.abs(leaps[0]! - 5.03)).toBeLessThan(1e-9)
    expect(roots).toHaveLength(1)
    expect(Math.abs(roots[0]! - 9)).toBeLessThan(1e-9)
  })

  it('takes roots at the ends, and no level within the noise for a turn', () => {
    expect(search((x) => x).roots).toEqual([0])
    expect(search((x) => x - 10).roots).toEqual([10])
    let calls = 0
    search((x) => {
      calls++
      return 1 + 1e-14 * Math.sin(1e5 * x)
    })
    expect(calls).toBe(41)
  })

  it('keeps what it saw, ascending, with what is undefined', () => {
    const { samples } = search((x) => (x > 5 ? NaN : x + 1))
    expect(samples.length).toBeGreaterThanOrEqual(42)
    samples.forEach(({ at }, i) => expect(at).toBeGreaterThanOrEqual(samples[i - 1]?.at ?? 0))
    expect(samples.at(-1)).toEqual({ at: 10, value: NaN })
  })
})
