/** Inputs taken apart into single fields, for tables and comparisons. */

/** A row of a table whose columns have names: T and effective numbers. */
export type NamedRow = Readonly<Record<string, number>>

export type FieldValue = number | string | boolean | null | readonly number[] | NamedRow

export interface FieldEntry {
  /** Where in the JSON document: `annihilation.others[0].massGeV`. */
  path: string
  value: FieldValue
}

export interface Difference {
  path: string
  /** undefined where that side has no such field. */
  before: FieldValue | undefined
  after: FieldValue | undefined
}

const isRow = (value: unknown): value is readonly number[] =>
  Array.isArray(value) && value.length > 0 && value.every((item) => typeof item === 'number')

/** Whether a list is a table over temperature with named columns: more rows than anyone wants to see as single fields. */
const isNamedTable = (value: readonly unknown[]): value is readonly NamedRow[] =>
  value.length > 0 &&
  value.every(
    (row) =>
      row !== null &&
      typeof row === 'object' &&
      'temperatureGeV' in row &&
      Object.keys(row).length > 1 &&
      Object.values(row).every((item) => typeof item === 'number'),
  )

/** Every field of a JSON value with its path; a row of numbers is one field, an empty list none. */
export function fieldsOf(value: unknown, path = ''): FieldEntry[] {
  if (value === undefined) return []
  if (isRow(value)) return [{ path, value }]
  if (Array.isArray(value) && isNamedTable(value))
    return value.map((row, index) => ({ path: `${path}[${index}]`, value: row }))
  if (Array.isArray(value)) return value.flatMap((item, index) => fieldsOf(item, `${path}[${index}]`))
  if (value !== null && typeof value === 'object')
    return Object.entries(value).flatMap(([key, item]) =>
      fieldsOf(item, path === '' ? key : `${path}.${key}`),
    )
  return [{ path, value: value as FieldValue }]
}

const isComposite = (value: FieldValue | undefined): boolean => typeof value === 'object' && value !== null

const same = (a: FieldValue | undefined, b: FieldValue | undefined): boolean =>
  a === b || (isComposite(a) && isComposite(b) && JSON.stringify(a) === JSON.stringify(b))

/** The fields in which two JSON values differ, in the order of the first, what only the second has last. */
export function differences(a: unknown, b: unknown): Difference[] {
  const before = new Map(fieldsOf(a).map((field) => [field.path, field.value]))
  const after = new Map(fieldsOf(b).map((field) => [field.path, field.value]))
  return [...new Set([...before.keys(), ...after.keys()])]
    .map((path) => ({ path, before: before.get(path), after: after.get(path) }))
    .filter((difference) => !same(difference.before, difference.after))
}

const UNITS: readonly (readonly [ending: RegExp, unit: string])[] = [
  [/GeVMinus2$/, '1/GeV²'],
  [/Cm3PerS$/, 'cm³/s'],
  [/GeV$/, 'GeV'],
  [/[a-z]S$/, 's'],
  [/[a-z]K$/, 'K'],
]

/** The unit a field carries in its name; undefined for pure numbers and words. */
export const unitOf = (path: string): string | undefined => UNITS.find(([ending]) => ending.test(path))?.[1]
