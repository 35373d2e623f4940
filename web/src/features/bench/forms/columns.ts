/** Columns of numbers typed or pasted: apart by space, comma, semicolon or tab, with or without a line of names. */

export interface Columns {
  /** The names, when the first line has them. */
  names: string[] | null
  rows: number[][]
}

const fieldsOf = (line: string): string[] => (/[,;\t]/.test(line) ? line.split(/[,;\t]/) : line.split(/\s+/))

const numbersOf = (line: string): number[] =>
  line
    .trim()
    .split(/[\s,;]+/)
    .map(Number)

/**
 * Reads columns; the first line that is no row of them is named. Empty lines and lines that begin with # are left out.
 * @param expected what a row is, in words, with an example
 * @param wide whether a row may have that many numbers
 */
export function readColumns(
  text: string,
  expected: string,
  wide: (numbers: number) => boolean,
): Columns | { message: string } {
  let names: string[] | null = null
  const rows: number[][] = []
  for (const [index, line] of text.split('\n').entries()) {
    if (line.trim() === '' || line.trim().startsWith('#')) continue
    const numbers = numbersOf(line)
    const isRow =
      numbers.every(Number.isFinite) &&
      (rows.length === 0 ? wide(numbers.length) : numbers.length === rows[0]!.length)
    if (isRow) rows.push(numbers)
    else if (rows.length === 0 && names === null && numbers.every(Number.isNaN))
      names = fieldsOf(line.trim()).map((name) => name.trim())
    else return { message: `Line ${index + 1} is not ${expected}` }
  }
  return { names, rows }
}
