import { stringify } from 'csv-stringify/browser/esm/sync'

/**
 * Rows as CSV (RFC 4180). A cell that a spreadsheet would take for a formula gets an apostrophe before it, which keeps
 * it text.
 */
export const csvText = (rows: readonly (readonly (string | number | boolean | null)[])[]): string =>
  stringify(
    rows.map((row) => [...row]),
    { record_delimiter: 'windows', escape_formulas: true, cast: { boolean: String } },
  )
