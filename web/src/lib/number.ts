/** A number as it is shown: mantissa and power of ten apart, so that the power can be set as a superscript. */
export interface NumberParts {
  mantissa: string
  /** Power of ten, null when the number is written out. */
  exponent: number | null
}

/** Splits a number into what is shown, with that many significant digits; plain between 0.001 and 99999. */
export function numberParts(value: number, digits: number): NumberParts {
  if (value === 0 || !Number.isFinite(value)) return { mantissa: String(value), exponent: null }
  const size = Math.abs(value)
  if (size >= 1e-3 && size < 1e5) return { mantissa: plain(value, digits), exponent: null }
  const [mantissa, power] = value.toExponential(digits - 1).split('e')
  return { mantissa: trimmedIfExact(`${mantissa}`, value / 10 ** Number(power)), exponent: Number(power) }
}

function plain(value: number, digits: number): string {
  const decimals = Math.max(0, digits - 1 - Math.floor(Math.log10(Math.abs(value))))
  return trimmedIfExact(value.toFixed(Math.min(decimals, 20)), value)
}

/** 100 rather than 100.0 for a number that is exactly that; the zeros of a rounded number are digits, and stay. */
function trimmedIfExact(text: string, value: number): string {
  const exact = Math.abs(Number(text) - value) <= 4 * Number.EPSILON * Math.abs(value)
  return exact && text.includes('.') ? text.replace(/\.?0+$/, '') : text
}

/** Significant digits that a relative error leaves meaningful, between 2 and `most`. */
export function meaningfulDigits(relativeError: number, most: number): number {
  if (!(relativeError > 0)) return most
  return Math.max(2, Math.min(most, Math.floor(-Math.log10(relativeError))))
}

const SUPERSCRIPT_TO_PLAIN: Record<string, string> = { '−': '-', '–': '-' }

/** The number as plain text that can be read back: 2.2e-26. */
export function plainText(value: number): string {
  return String(value).replace(/[−–]/g, (sign) => SUPERSCRIPT_TO_PLAIN[sign]!)
}

/** Text for an input: short when the number is short, full precision otherwise. */
export function inputText(value: number): string {
  const short = Number(value.toPrecision(6))
  const chosen = short === value ? short : value
  const size = Math.abs(chosen)
  return size !== 0 && (size < 1e-3 || size >= 1e6)
    ? chosen.toExponential().replace('e+', 'e')
    : String(chosen)
}
