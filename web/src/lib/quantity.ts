import { UNITS } from '#core/units/units'
import type { Dimension } from '#core/units/units'

/** What a typed text means: a number in the base unit of its dimension, or what is wrong with it. */
export type ParsedQuantity = { ok: true; value: number } | { ok: false; message: string }

/** 2.2e-26, 2.2×10^-26, 2.2 x 10^-26, 2.2·10⁻²⁶, 1/3 is not among them. */
const NUMBER = /^([+-]?(?:\d+\.?\d*|\.\d+))(?:\s*(?:e|[x×*·]\s*10\s*\^?)\s*([+-]?\d+))?/i

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹'

/** Brings typographic signs to the ones the pattern knows. */
function plain(text: string): string {
  return text
    .trim()
    .replace(/[−–]/g, '-')
    .replace(/⁻/g, '-')
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(SUPERSCRIPTS.indexOf(digit)))
    .replace(/\s+/g, ' ')
}

/** Spellings of a unit that mean the same. */
const spelling = (unit: string): string =>
  unit
    .trim()
    .replace(/μ/g, 'µ')
    .replace(/cm\^?3 ?(\/ ?s| s\^?-1)/, 'cm3/s')
    .replace(/gev\^?-2/i, 'GeV^-2')
    .replace(/^pb\*?c$|^pb c$/, 'pb·c')

/** Reads a text as a quantity; a bare number is in `unit`. */
export function parseQuantity(text: string, dimension: Dimension, unit: string): ParsedQuantity {
  const source = plain(text)
  const example = dimension === 'pure' ? '2.5 or 2.5e-3' : `2.5e-3 or 2.5 ${unit}`
  if (source === '')
    return { ok: false, message: `Nothing is entered. A number such as ${example} would do.` }
  const match = NUMBER.exec(source)
  if (!match)
    return { ok: false, message: `“${text.trim()}” does not begin with a number. ${example} would do.` }
  const value = Number(`${match[1]}e${match[2] ?? '0'}`)
  const rest = source.slice(match[0].length).trim()
  const factor = rest === '' ? (UNITS[dimension][unit] ?? 1) : UNITS[dimension][spelling(rest)]
  if (factor === undefined) {
    const known = Object.keys(UNITS[dimension])
    const allowed = known.length === 0 ? 'This number has no unit.' : `Units known here: ${known.join(', ')}.`
    return { ok: false, message: `“${rest}” is not a unit of this quantity. ${allowed}` }
  }
  if (!Number.isFinite(value * factor)) return { ok: false, message: 'This number is too large.' }
  return { ok: true, value: exactly(value, factor, match) }
}

/** Powers of ten multiply without leaving 0.1 + 0.2 behind: 3 keV is 3e-6 GeV, not 2.9999999999999997e-6. */
function exactly(value: number, factor: number, match: RegExpExecArray): number {
  const power = Math.log10(factor)
  if (!Number.isInteger(power)) return value * factor
  return Number(`${match[1]}e${Number(match[2] ?? '0') + power}`)
}

/** The text with its last significant digit moved by `step`. */
export function stepLastDigit(text: string, step: number): string {
  const source = plain(text)
  const match = NUMBER.exec(source)
  if (!match) return text
  const mantissa = match[1]!
  const decimals = mantissa.includes('.') ? mantissa.length - mantissa.indexOf('.') - 1 : 0
  const next = (Number(mantissa) + step * 10 ** -decimals).toFixed(decimals)
  return next + source.slice(mantissa.length)
}
