import { superscript } from './superscript.ts'

/** How an abundance stands against the measured density, in words. */
export interface Verdict {
  words: string
  side: 'above' | 'below' | 'level'
}

export interface MeasuredDensity {
  omegaH2: number
  standardError: number
}

const DIGITS = 2

/** Closer than this fraction the two are the same to the digits anyone writes. */
const LEVEL = 5e-5

/** Below this fraction a percentage would round to "100 % below". */
const HARDLY_ANY = 0.01

/**
 * "1.8 % above, 1.8 σ" up to a factor two, "3.2 times above" beyond it, where the σ say no more;
 * "72 % below, 72 σ", and under a hundredth "250 times below".
 */
export function verdict(omegaH2: number, { omegaH2: measured, standardError }: MeasuredDensity): Verdict {
  const ratio = omegaH2 / measured
  if (Math.abs(ratio - 1) < LEVEL) return { words: 'as measured', side: 'level' }
  const side = ratio > 1 ? 'above' : 'below'
  if (ratio === 0) return { words: 'none left', side }
  if (ratio >= 2 || ratio < HARDLY_ANY)
    return { words: `${times(ratio >= 2 ? ratio : 1 / ratio)} times ${side}`, side }
  const sigmas = Math.abs(omegaH2 - measured) / standardError
  return { words: `${rounded(Math.abs(ratio - 1) * 100)} % ${side}, ${rounded(sigmas)} σ`, side }
}

const rounded = (value: number): string => Number(value.toPrecision(DIGITS)).toLocaleString('en')

const times = (ratio: number): string =>
  ratio < 1e4 ? rounded(ratio) : `10${superscript(Math.round(Math.log10(ratio)))}`
