/** How an abundance stands against the measured density, in words. */
export interface Verdict {
  words: string
  side: 'above' | 'below' | 'level'
}

export interface MeasuredDensity {
  omegaH2: number
  standardError: number
}

const SHORT = 2

/** "1.8 % above, 1.8 σ"; beyond a factor two, "3.2 times above"; below a half, "72 % below". */
export function verdict(omegaH2: number, measured: MeasuredDensity): Verdict {
  const ratio = omegaH2 / measured.omegaH2
  const sigma = Math.abs(omegaH2 - measured.omegaH2) / measured.standardError
  const side = ratio > 1 ? 'above' : 'below'
  if (Math.abs(ratio - 1) < 5e-5) return { words: 'as measured', side: 'level' }
  const sigmaWords = `${Number(sigma.toPrecision(SHORT)).toLocaleString('en')} σ`
  if (ratio >= 2) return { words: `${timesWords(ratio)} the measured density, ${sigmaWords}`, side }
  return { words: `${Number((Math.abs(ratio - 1) * 100).toPrecision(SHORT))} % ${side}, ${sigmaWords}`, side }
}

const timesWords = (ratio: number): string =>
  ratio < 1e4
    ? `${Number(ratio.toPrecision(SHORT)).toLocaleString('en')} times`
    : `10^${Math.round(Math.log10(ratio))} times`
