import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { inputText, meaningfulDigits, numberParts, plainText } from '../../../web/src/lib/number.ts'

describe('numberParts', () => {
  it.each([
    [0.12051, 4, '0.1205', null],
    [100, 4, '100', null],
    [99_999, 5, '99999', null],
    [100_000, 4, '1', 5],
    [2.2e-26, 4, '2.2', -26],
    [-4.366e-12, 3, '-4.37', -12],
    [0.001, 4, '0.001', null],
    [0.000999, 2, '1.0', -3],
    [0.12003, 4, '0.1200', null],
    [4.9999e-12, 3, '5.00', -12],
    [0.1565, 15, '0.1565', null],
    [0, 4, '0', null],
  ])('writes %d with %d digits', (value, digits, mantissa, exponent) => {
    expect(numberParts(value, digits)).toEqual({ mantissa, exponent })
  })

  it('writes a number of two digits with two, whatever its power of ten', () => {
    fc.assert(
      fc.property(fc.integer({ min: 11, max: 99 }), fc.integer({ min: -60, max: 60 }), (tenths, power) => {
        fc.pre(tenths % 10 !== 0 && (power < -3 || power > 4))
        const written = numberParts(Number(`${tenths / 10}e${power}`), 6)
        expect(written).toEqual({ mantissa: String(tenths / 10), exponent: power })
      }),
    )
  })
})

describe('meaningfulDigits', () => {
  it.each([
    [4e-8, 4, 4],
    [2e-3, 4, 2],
    [0.3, 4, 2],
    [0, 4, 4],
  ])('of a relative error %d leaves, of at most %d, %d', (error, most, digits) => {
    expect(meaningfulDigits(error, most)).toBe(digits)
  })
})

describe('texts', () => {
  it('writes a number so that it can be read back', () => {
    expect(Number(plainText(-1.2345678901234567e-20))).toBe(-1.2345678901234567e-20)
  })
  it.each([
    [2.2e-26, '2.2e-26'],
    [1e16, '1e16'],
    [100, '100'],
    [0.1565, '0.1565'],
    [0.1 + 0.2, '0.30000000000000004'],
    [0, '0'],
  ])('puts %d into a field as “%s”', (value, text) => {
    expect(inputText(value)).toBe(text)
  })
})
