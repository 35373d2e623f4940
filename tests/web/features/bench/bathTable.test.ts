import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bathTableText, readBathTable, recalled } from '../../../../web/src/features/bench/forms/bathTable.ts'

const lines = (row: (i: number) => string): string => [1, 2, 3, 4].map(row).join('\n')
const firstRow = (text: string, single: 'gS' | 'gRho' = 'gS'): unknown => {
  const read = readBathTable(text, single)
  return 'rows' in read ? read.rows[0] : read.message
}

describe('a pasted table of the bath', () => {
  it.each([
    ['tabs', '\t'],
    ['spaces', '   '],
    ['commas', ', '],
    ['semicolons', ';'],
  ])('is read with its columns apart by %s', (_name, between) => {
    expect(firstRow(lines((i) => [`${i}e-1`, 10 + i, 11 + i].join(between)))).toEqual({
      temperatureGeV: 0.1,
      gRho: 11,
      gS: 12,
    })
  })

  it('takes its columns by their names, in any order, whatever signs stand around them', () => {
    const row = (i: number): string => `${10 + i},${i}e-1`
    expect(firstRow(`g_s, T [GeV]\n${lines(row)}`)).toEqual({ temperatureGeV: 0.1, gS: 11 })
    expect(firstRow(`g_ρ, T (GeV)\n${lines(row)}`)).toEqual({ temperatureGeV: 0.1, gRho: 11 })
    expect(firstRow(`gRho\ttemperatureGeV\n${lines(row)}`)).toEqual({ temperatureGeV: 0.1, gRho: 11 })
  })

  it('has the only column of numbers without names be what it was', () => {
    const text = lines((i) => `${i} ${10 + i}`)
    expect(firstRow(text, 'gS')).toEqual({ temperatureGeV: 1, gS: 11 })
    expect(firstRow(text, 'gRho')).toEqual({ temperatureGeV: 1, gRho: 11 })
  })

  it.each([
    ['a line that is no row', `1 10\n2 11\nthree 12\n4 13`, 'Line 3 is not two or three numbers'],
    ['rows of unlike length', `1 10\n2 11 12\n3 12\n4 13`, 'Line 2 is not two or three numbers'],
    ['four columns', lines((i) => `${i} 10 11 12`), 'Line 1 is not two or three numbers'],
    ['another unit', `T [MeV]\tg_s\n${lines((i) => `${i} 10`)}`, 'Temperatures are in GeV here.'],
    ['a name that is none', `T\tentropy\n${lines((i) => `${i} 10`)}`, '“entropy” is none of them'],
    ['a name twice', `T\tT\n${lines((i) => `${i} 10`)}`, '“T” is none of them or stands twice'],
    ['no temperature', `g_s\tg_rho\n${lines((i) => `${i} 10`)}`, 'The columns are T, g_ρ and g_s'],
    [
      'more names than columns',
      `T\tg_s\tg_rho\n${lines((i) => `${i} 10`)}`,
      'There are 3 names over 2 columns.',
    ],
    ['three rows', '1 10\n2 11\n3 12', 'At least four rows are needed.'],
    ['nothing', '', 'At least four rows are needed.'],
  ])('says what is wrong with %s', (_what, text, message) => {
    expect(firstRow(text)).toContain(message)
  })

  it('leaves out empty lines and those that begin with #', () => {
    expect(firstRow(`# from somewhere\n\n${lines((i) => `${i} 10`)}\n# the end`)).toEqual({
      temperatureGeV: 1,
      gS: 10,
    })
  })

  it('is written so that it reads as itself', () => {
    const positive = fc.double({ min: 1e-9, max: 1e9, noNaN: true })
    const row = fc.record({ temperatureGeV: positive, gRho: positive, gS: positive })
    fc.assert(
      fc.property(fc.array(row, { minLength: 4 }), (rows) => {
        expect(readBathTable(bathTableText(rows), 'gS')).toEqual({ rows })
        const single = recalled(
          rows.map(({ temperatureGeV, gS }) => ({ temperatureGeV, gS })),
          'gRho',
        )
        expect(readBathTable(bathTableText(single), 'gRho')).toEqual({ rows: single })
      }),
    )
  })
})
