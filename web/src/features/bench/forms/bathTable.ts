/** Reading a table of the whole bath: T in GeV with g_ρ, g_s or both, in any order when the columns are named. */
import type { BathColumn, BathRow } from '#core/wire/index'
import { readColumns } from './columns.ts'

type Name = keyof BathRow

/** What a column is called, without its unit and signs. */
const NAMES: Record<string, Name> = {
  t: 'temperatureGeV',
  temperature: 'temperatureGeV',
  temperaturegev: 'temperatureGeV',
  grho: 'gRho',
  gρ: 'gRho',
  gs: 'gS',
}

const EXPECTED = 'two or three numbers, as many in every row. “0.15  27.1  24.6” would do.'
const WANTED_NAMES = 'The columns are T, g_ρ and g_s, or T and one of them'

/** The meanings of named columns, or what is wrong with the names. */
function meaningsOf(names: readonly string[]): Name[] | { message: string } {
  if (names.some((name) => /[mk]eV/i.test(name))) return { message: 'Temperatures are in GeV here.' }
  const bare = names.map((name) => name.replace(/[[(].*$/, '').replace(/[^\p{L}]/gu, ''))
  const meanings = bare.map((name) => NAMES[name.toLowerCase()])
  const unknown = meanings.findIndex((meaning, i) => meaning === undefined || meanings.indexOf(meaning) < i)
  if (unknown >= 0)
    return { message: `${WANTED_NAMES}; “${names[unknown]}” is none of them or stands twice.` }
  const known = meanings as Name[]
  return known.includes('temperatureGeV') && known.length > 1 ? known : { message: `${WANTED_NAMES}.` }
}

/**
 * Reads the rows.
 * @param single what the second of two columns is when nothing names it
 */
export function readBathTable(text: string, single: BathColumn): { rows: BathRow[] } | { message: string } {
  const read = readColumns(text, EXPECTED, (numbers) => numbers === 2 || numbers === 3)
  if ('message' in read) return read
  const width = read.rows[0]?.length ?? 0
  if (read.rows.length < 4) return { message: 'At least four rows are needed.' }
  const meanings = read.names
    ? meaningsOf(read.names)
    : (['temperatureGeV', ...(width === 3 ? ['gRho', 'gS'] : [single])] as Name[])
  if ('message' in meanings) return meanings
  if (meanings.length !== width)
    return { message: `There are ${meanings.length} names over ${width} columns.` }
  return {
    rows: read.rows.map(
      (numbers) => Object.fromEntries(meanings.map((name, i) => [name, numbers[i]])) as unknown as BathRow,
    ),
  }
}

/** The columns the rows have beside T, in the order in which they are written without names. */
export const columnsOf = (rows: readonly BathRow[]): BathColumn[] =>
  (['gRho', 'gS'] as const).filter((column) => rows[0]?.[column] !== undefined)

/** The rows as text that reads as the same rows. */
export function bathTableText(rows: readonly BathRow[]): string {
  const columns = columnsOf(rows)
  return rows
    .map((row) => [row.temperatureGeV, ...columns.map((column) => row[column])].join('  '))
    .join('\n')
}

/** The same rows with their only column called by the other name. */
export const recalled = (rows: readonly BathRow[], column: BathColumn): BathRow[] =>
  rows.map((row) => ({ temperatureGeV: row.temperatureGeV, [column]: row.gRho ?? row.gS }))
