import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  ageAt,
  ageText,
  extent,
  placeLabels,
  spanOf,
} from '../../../../web/src/components/ember-line/layout.ts'
import type { Label } from '../../../../web/src/components/ember-line/layout.ts'

const label = (text: string, x: number, importance: number): Label => ({ id: text, text, x, importance })

describe('the labels of the ember line', () => {
  it('all stand when they have room, from hot to cold', () => {
    const placed = placeLabels([label('QCD crossover', 700, 8), label('electroweak', 150, 9)], 1200)
    expect(placed.map(({ text }) => text)).toEqual(['electroweak', 'QCD crossover'])
  })

  it('yield to the more important when they would collide', () => {
    const labels = [label('neutrino decoupling', 600, 5), label('freeze-out, 4.35 GeV', 610, 100)]
    expect(placeLabels(labels, 1200).map(({ text }) => text)).toEqual(['freeze-out, 4.35 GeV'])
  })

  it('begin or end at what they name where that is how they have room', () => {
    const labels = [label('neutrino decoupling', 1000, 7), label('e± annihilation', 1105, 5)]
    const placed = placeLabels(labels, 1300)
    expect(placed.map(({ anchor }) => anchor)).toEqual(['middle', 'start'])
  })

  it('stay inside the page at its edges', () => {
    const placed = placeLabels([label('electroweak crossover', 4, 1), label('e± annihilation', 796, 1)], 800)
    expect(placed.map(({ anchor }) => anchor)).toEqual(['start', 'end'])
  })

  it('never overlap, and the most important one that fits always stands', () => {
    const labels = fc.array(
      fc.record({
        id: fc.uuid(),
        text: fc.string({ minLength: 3, maxLength: 24 }),
        x: fc.integer({ min: 0, max: 1000 }),
        importance: fc.integer({ min: 0, max: 9 }),
      }),
      { minLength: 1, maxLength: 15 },
    )
    fc.assert(
      fc.property(labels, (all) => {
        const placed = placeLabels(all, 1000).sort((a, b) => extent(a)[0] - extent(b)[0])
        for (let i = 1; i < placed.length; i++)
          expect(extent(placed[i]!)[0]).toBeGreaterThan(extent(placed[i - 1]!)[1])
        const most = Math.max(...all.map(({ importance }) => importance))
        expect(placed.some(({ importance }) => importance === most)).toBe(true)
      }),
    )
  })
})

describe('ages', () => {
  it('stand in the unit that suits, from attoseconds to years', () => {
    expect([2.3e-17, 1.5e-13, 1.9e-10, 1.7e-7, 6e-5, 7.4e-3].map(ageText)).toEqual([
      '23 as',
      '150 fs',
      '190 ps',
      '170 ns',
      '60 µs',
      '7.4 ms',
    ])
    expect([0.75, 180, 7200, 1.8e5, 1.6e12].map(ageText)).toEqual([
      '750 ms',
      '3 min',
      '2 h',
      '2.1 d',
      '51000 yr',
    ])
  })

  it('are powers of ten below every unit', () => {
    expect(ageText(2e-21)).toBe('2 × 10⁻²¹ s')
  })

  it('are given only at temperatures that have one', () => {
    const times = [{ temperatureGeV: 0.1, timeS: 6e-5 }]
    expect(ageAt(times, 0.1)).toBe('60 µs')
    expect(ageAt(times, 1)).toBe('')
  })
})

describe('the span of the ember line', () => {
  it('is its range, and more where the window reaches farther', () => {
    expect(spanOf({ hotGeV: 1e4, coldGeV: 1e-4 }, { hotGeV: 1e6, coldGeV: 1 })).toEqual({
      hotGeV: 1e6,
      coldGeV: 1e-4,
    })
  })
})
