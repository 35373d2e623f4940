import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Dimension } from '#core/units/units'
import { inputText } from '../../../web/src/lib/number.ts'
import { parseQuantity, stepLastDigit } from '../../../web/src/lib/quantity.ts'

const BASE: Record<Dimension, string> = { energy: 'GeV', time: 's', crossSection: 'cm3/s', pure: '' }

const valueOf = (text: string, dimension: Dimension, unit = BASE[dimension]): number => {
  const parsed = parseQuantity(text, dimension, unit)
  if (!parsed.ok) throw new Error(`${text}: ${parsed.message}`)
  return parsed.value
}

const refusalOf = (text: string, dimension: Dimension): string => {
  const parsed = parseQuantity(text, dimension, BASE[dimension])
  return parsed.ok ? `taken as ${parsed.value}` : parsed.message
}

describe('parseQuantity', () => {
  it.each([
    ['2.2e-26', 'crossSection', 2.2e-26],
    ['2.2E-26', 'crossSection', 2.2e-26],
    ['2.2×10^-26', 'crossSection', 2.2e-26],
    ['2.2 × 10^−26', 'crossSection', 2.2e-26],
    ['2.2 x 10^-26 cm3/s', 'crossSection', 2.2e-26],
    ['2.2·10⁻²⁶ cm^3 s^-1', 'crossSection', 2.2e-26],
    ['2.2e-26 cm3/s', 'crossSection', 2.2e-26],
    ['2.2*10^-26', 'crossSection', 2.2e-26],
    ['3 keV', 'energy', 3e-6],
    ['3keV', 'energy', 3e-6],
    ['156.5 MeV', 'energy', 0.1565],
    ['  100 ', 'energy', 100],
    ['.5 TeV', 'energy', 500],
    ['1e3 GeV', 'energy', 1000],
    ['30 d', 'time', 2_592_000],
    ['5 us', 'time', 5e-6],
    ['5 μs', 'time', 5e-6],
    ['2 min', 'time', 120],
    ['−0.5', 'pure', -0.5],
    ['+4', 'pure', 4],
  ] as const)('reads “%s” as a quantity of %s', (text, dimension, value) => {
    expect(valueOf(text, dimension)).toBe(value)
  })

  it('takes a bare number in the unit of the field', () => {
    expect(valueOf('156.5', 'energy', 'MeV')).toBe(0.1565)
  })

  it.each([
    ['', 'energy', /Nothing is entered/],
    ['heavy', 'energy', /“heavy” does not begin with a number/],
    ['3 kg', 'energy', /“kg” is not a unit of this quantity.*GeV/],
    ['3 keV', 'time', /“keV” is not a unit/],
    ['3 GeV', 'pure', /has no unit/],
    ['1/3', 'pure', /“\/3”/],
    ['1e999', 'energy', /too large/],
  ] as const)('refuses “%s” as a quantity of %s and says what is wrong', (text, dimension, words) => {
    expect(refusalOf(text, dimension)).toMatch(words)
  })

  it('says what would do', () => {
    expect(refusalOf('', 'energy')).toMatch(/2\.5e-3 or 2\.5 GeV/)
  })

  it('reads back every number it writes into a field', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        // A negative zero is written 0.
        expect(valueOf(inputText(value), 'energy')).toBe(value + 0)
      }),
    )
  })
})

describe('stepLastDigit', () => {
  it.each([
    ['2.20', 1, '2.21'],
    ['100', -1, '99'],
    ['2.2e-26 cm3/s', 1, '2.3e-26 cm3/s'],
    ['no number', 1, 'no number'],
  ])('moves the last digit of “%s” by %d', (text, step, moved) => {
    expect(stepLastDigit(text, step)).toBe(moved)
  })
})
