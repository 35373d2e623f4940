import { parse } from 'csv-parse/sync'
import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { csvText } from '../../../web/src/lib/csv.ts'

describe('CSV', () => {
  it('is read back as it was written by a reader of RFC 4180', () => {
    const cell = fc.string({ unit: 'grapheme' }).filter((text) => !/^[=+\-@\t\r]/.test(text))
    fc.assert(
      fc.property(fc.array(fc.tuple(cell, cell), { minLength: 1 }), (rows) => {
        expect(parse(csvText(rows), { record_delimiter: '\r\n', relax_column_count: false })).toEqual(
          rows.map((row) => [...row]),
        )
      }),
    )
  })

  it('keeps a spreadsheet from taking a cell for a formula', () => {
    expect(csvText([['=1+1', '@SUM(A1)', '-5', '+x']])).toBe("'=1+1,'@SUM(A1),'-5,'+x\r\n")
    expect(csvText([[-5, null, true]])).toBe('-5,,true\r\n')
  })
})
