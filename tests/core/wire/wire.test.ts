import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { abundanceRequest, abundanceResult, digestOf, historyInput, historyResult } from '#core/wire/index'
import { computeAbundance, computeHistory } from '#core/index'
import { candidate, history } from '../arbitraries.ts'

/** The same value with the names of every object in another order. */
function reordered(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(reordered)
  if (value === null || typeof value !== 'object') return value
  const entries = Object.entries(value).map(([name, each]) => [name, reordered(each)] as const)
  return Object.fromEntries(entries.reverse())
}

const defaults = historyInput.parse({})

describe('the wire', () => {
  it('fills defaults in once: a parsed input parses to itself', () => {
    fc.assert(
      fc.property(history, candidate, (h, c) => {
        const once = abundanceRequest.parse({ history: h, candidate: c })
        expect(abundanceRequest.parse(once)).toEqual(once)
      }),
    )
  })

  it('survives JSON: a parsed input written and read again has the same digest', () => {
    fc.assert(
      fc.property(history, candidate, (h, c) => {
        const once = abundanceRequest.parse({ history: h, candidate: c })
        const again = abundanceRequest.parse(JSON.parse(JSON.stringify(once)))
        expect(digestOf(again)).toBe(digestOf(once))
      }),
    )
  })

  it('has the defaults that are documented', () => {
    expect(defaults).toEqual({
      bath: { treatment: 'fit-2018', band: 0 },
      neutrinos: {
        treatment: 'specified',
        nEff: 3.044,
        decouplingTemperatureGeV: 0.002,
        entropyScaling: 'heated',
      },
      extraSpecies: [],
      expansion: { kind: 'radiation' },
      maximumTemperatureGeV: null,
      today: { temperatureK: 2.7255, hubbleParameter: 0.674, omegaMatterH2: 0.143 },
    })
  })

  it('has results that fit their own schema and survive JSON', () => {
    const wimp = {
      mechanism: 'freeze-out',
      massGeV: 100,
      degreesOfFreedom: 2,
      statistics: 'fermion',
      annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
    }
    const result = computeAbundance({ history: {}, candidate: wimp })
    expect(abundanceResult.parse(JSON.parse(JSON.stringify(result)))).toEqual(result)
    const rows = computeHistory({ history: {}, temperaturesGeV: [1, 1e-3, 1e-9] })
    expect(historyResult.parse(JSON.parse(JSON.stringify(rows)))).toEqual(rows)
  })
})

describe('digests', () => {
  it('do not know the order of names', () => {
    fc.assert(
      fc.property(history, candidate, (h, c) => {
        const parsed = abundanceRequest.parse({ history: h, candidate: c })
        const other = abundanceRequest.parse(reordered({ history: h, candidate: c }))
        expect(digestOf(other)).toBe(digestOf(parsed))
        expect(digestOf(reordered(parsed))).toBe(digestOf(parsed))
      }),
    )
  })

  it('do not know whether a default was written', () => {
    fc.assert(
      fc.property(history, (h) => {
        const whole = historyInput.parse(h)
        // Any group that stands at its default may be left out.
        const short = Object.fromEntries(
          Object.entries(whole).filter(
            ([name, value]) =>
              JSON.stringify(value) !== JSON.stringify((defaults as Record<string, unknown>)[name]),
          ),
        )
        expect(digestOf(historyInput.parse(short))).toBe(digestOf(whole))
      }),
    )
  })

  it('differ whenever one number does', () => {
    const at = (temperatureK: number): string => digestOf(historyInput.parse({ today: { temperatureK } }))
    expect(at(2.7255)).toBe(digestOf(defaults))
    expect(at(2.7255 + 4e-16)).not.toBe(at(2.7255))
  })

  it('are SHA-256 of the canonical bytes: of the seven bytes {"a":1}, by a general-purpose tool', () => {
    expect(digestOf({ a: 1 })).toBe('015abd7f5cc57a2dd94b7590f04ad8084273905ee33ec5cebeae62276a97f862')
  })

  it('write numbers as RFC 8785 has them: 1e-27 and 1E-27, 100 and 1e2 are the same', () => {
    expect(digestOf(JSON.parse('[1e-27, 100, 0.0]'))).toBe(digestOf(JSON.parse('[1.0E-27, 1e2, -0]')))
  })

  it('are refused to what is no JSON', () => {
    expect(() => digestOf(undefined)).toThrow(TypeError)
  })
})
