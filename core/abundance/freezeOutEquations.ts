/** The equations of freeze-out for the integrator, and their solutions in closed form. */
import type { OdeProblem } from '../numerics/ode/problem.ts'
import type { AnnihilatingState } from './annihilatingState.ts'

/** y = ln Z: y′ = (k Z_eq² + P)/Z − k (Z + η). */
export function logarithmicProblem(state: AnnihilatingState): OdeProblem {
  return {
    dimension: 1,
    evaluate(lnX, y, slope, jacobian) {
      state.moveTo(lnX)
      const loss = state.strength * Math.exp(y[0]!)
      const lossToMajority = state.strength * state.asymmetry
      let gain = state.strength * Math.exp(2 * state.lnEquilibrium - y[0]!)
      if (state.production > 0) gain += state.production * Math.exp(-y[0]!)
      slope[0] = gain - loss - lossToMajority
      jacobian[0] = -gain - loss
    },
  }
}

/** The same in Z/unit, for a start from nothing, where ln Z does not exist. */
export function linearProblem(state: AnnihilatingState, unit: number): OdeProblem {
  return {
    dimension: 1,
    evaluate(lnX, y, slope, jacobian) {
      state.moveTo(lnX)
      slope[0] =
        (state.strength * Math.exp(2 * state.lnEquilibrium) + state.production) / unit -
        state.strength * unit * y[0]! * y[0]!
      jacobian[0] = -2 * state.strength * unit * y[0]!
    },
  }
}

/** ln Z that follows equilibrium to first order in H/Γ. */
export function followingYield(state: AnnihilatingState, lnX: number): number {
  const h = 1e-3
  state.moveTo(lnX + h)
  const after = steadyYield(state)
  state.moveTo(lnX)
  const now = steadyYield(state)
  const lag = -(after - now) / h / (state.strength * (2 * Math.exp(now) + state.asymmetry))
  return now + Math.log1p(Math.max(0, Math.min(lag, 1)))
}

/** ln Z at which gain and loss balance: Z (Z + η) = Z_eq² + P/k. */
export function steadyYield(state: AnnihilatingState): number {
  const { asymmetry, production, strength, lnEquilibrium } = state
  if (asymmetry === 0 && production === 0) return lnEquilibrium
  const square = Math.exp(2 * lnEquilibrium) + production / strength
  if (asymmetry > 0 && square < 1e-200) return 2 * lnEquilibrium - Math.log(asymmetry)
  return Math.log(square / (Math.sqrt(square + (asymmetry / 2) ** 2) + asymmetry / 2))
}

/** Z after ∫ k d ln x without production: 1/Z grows by it; with an asymmetry, ln(1 + η/Z) grows by η times it. */
export function annihilated(z: number, asymmetry: number, integral: number): number {
  return asymmetry === 0
    ? 1 / (1 / z + integral)
    : asymmetry / Math.expm1(Math.log1p(asymmetry / z) + asymmetry * integral)
}
