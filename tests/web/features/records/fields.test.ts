import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { differences, fieldsOf, unitOf } from '../../../../web/src/features/records/fields.ts'
import { aCandidate, aHistory } from './support.tsx'

describe('fieldsOf', () => {
  it('gives every field the path by which the document is read', () => {
    expect(fieldsOf({ a: { b: [{ c: 1 }, { c: null }] }, d: 'x', none: [] })).toEqual([
      { path: 'a.b[0].c', value: 1 },
      { path: 'a.b[1].c', value: null },
      { path: 'd', value: 'x' },
    ])
  })
  it('keeps a row of a table together', () => {
    expect(
      fieldsOf({
        points: [
          [1, 2],
          [3, 4],
        ],
      }),
    ).toEqual([
      { path: 'points[0]', value: [1, 2] },
      { path: 'points[1]', value: [3, 4] },
    ])
  })
  it('keeps a row of a table together when its columns have names', () => {
    const points = [
      { temperatureGeV: 0.1, gS: 17 },
      { temperatureGeV: 1, gS: 75 },
    ]
    expect(fieldsOf({ points })).toEqual([
      { path: 'points[0]', value: points[0] },
      { path: 'points[1]', value: points[1] },
    ])
    expect(differences({ points }, { points: [points[0], { temperatureGeV: 1, gS: 76 }] })).toEqual([
      { path: 'points[1]', before: points[1], after: { temperatureGeV: 1, gS: 76 } },
    ])
  })
})

describe('differences', () => {
  it('finds the one number that was changed', () => {
    const before = aCandidate()
    const after = aCandidate({ annihilation: { kind: 'partial-waves', sWaveCm3PerS: 3e-26 } })
    expect(differences(before, after)).toEqual([
      { path: 'annihilation.sWaveCm3PerS', before: 2.2e-26, after: 3e-26 },
    ])
  })
  it('names the fields that only one side has', () => {
    const after = aHistory({ expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1 } })
    expect(differences(aHistory(), after)).toEqual([
      { path: 'expansion.kind', before: 'radiation', after: 'fluid' },
      { path: 'expansion.index', before: undefined, after: 2 },
      { path: 'expansion.equalityTemperatureGeV', before: undefined, after: 1 },
    ])
  })
  it('tells a bound that was taken away from one that never was', () => {
    expect(differences(aHistory({ maximumTemperatureGeV: 5 }), aHistory())).toEqual([
      { path: 'maximumTemperatureGeV', before: 5, after: null },
    ])
  })
  it('compares rows of a table by their numbers', () => {
    expect(
      differences(
        {
          points: [
            [1, 2],
            [3, 4],
          ],
        },
        {
          points: [
            [1, 2],
            [3, 5],
          ],
        },
      ),
    ).toEqual([{ path: 'points[1]', before: [3, 4], after: [3, 5] }])
  })
  it('finds none between a value and its copy', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(differences(value, structuredClone(value))).toEqual([])
      }),
    )
  })
  it('finds the same fields when the sides are exchanged', () => {
    fc.assert(
      fc.property(
        fc.dictionary(fc.string(), fc.integer()),
        fc.dictionary(fc.string(), fc.integer()),
        (a, b) => {
          const back = differences(b, a).map(({ path, before, after }) => ({
            path,
            before: after,
            after: before,
          }))
          const byPath = (one: { path: string }, other: { path: string }) => (one.path < other.path ? -1 : 1)
          expect(back.sort(byPath)).toEqual(differences(a, b).sort(byPath))
        },
      ),
    )
  })
})

describe('unitOf', () => {
  it.each([
    ['annihilation.sWaveCm3PerS', 'cm³/s'],
    ['scattering.crossSectionGeVMinus2', '1/GeV²'],
    ['massGeV', 'GeV'],
    ['parent.lifetimeS', 's'],
    ['today.temperatureK', 'K'],
    ['neutrinos.nEff', undefined],
    ['degreesOfFreedom', undefined],
  ])('reads the unit of %s from its name', (path, unit) => {
    expect(unitOf(path)).toBe(unit)
  })
})
