/**
 * Freeze-out as a few dozen lines of plain code do it, to hold the core's solver against in the same run: ln Y against ln x by the
 * trapezoidal rule (implicit, of order two) with steps of one size and no error estimate, s/H and ln Y_eq from even tables made
 * beforehand. It knows nothing of steps in the bath, of other expansions, or of how wrong it is.
 */

/** λ = s⟨σv⟩/H (1 + δ_s) and ln Y_eq at even steps of ln x. */
export interface FreezeOutTables {
  lnXStart: number
  step: number
  lambda: Float64Array
  lnEquilibrium: Float64Array
}

export function freezeOutTables(
  lnXStart: number,
  lnXEnd: number,
  steps: number,
  at: (lnX: number) => { lambda: number; lnEquilibrium: number },
): FreezeOutTables {
  const step = (lnXEnd - lnXStart) / steps
  const lambda = new Float64Array(steps + 1)
  const lnEquilibrium = new Float64Array(steps + 1)
  for (let i = 0; i <= steps; i++) {
    const point = at(lnXStart + i * step)
    lambda[i] = point.lambda
    lnEquilibrium[i] = point.lnEquilibrium
  }
  return { lnXStart, step, lambda, lnEquilibrium }
}

/** Y at the end of the tables, from equilibrium at their start. */
export function plainFreezeOut({ step, lambda, lnEquilibrium }: FreezeOutTables): number {
  let y = lnEquilibrium[0]!
  let slope = 0
  for (let i = 1; i < lambda.length; i++) {
    const k = lambda[i]!
    const square = Math.exp(2 * lnEquilibrium[i]!)
    const start = y + (step / 2) * slope
    for (let iteration = 0; iteration < 8; iteration++) {
      const loss = k * Math.exp(y)
      const gain = (k * k * square) / loss
      const change = (start + (step / 2) * (gain - loss) - y) / (1 + (step / 2) * (gain + loss))
      y += change
      if (Math.abs(change) < 1e-6) break
    }
    const loss = k * Math.exp(y)
    slope = (k * k * square) / loss - loss
  }
  return Math.exp(y)
}
