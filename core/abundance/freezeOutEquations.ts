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

/** Half the distance in ln x over which a slope is taken, and the orders in H/Γ to which a curve follows equilibrium. */
const NEARBY = 1e-3
const ORDERS = 3

/** The lead δ of ln Z over the balance that makes ln Z change by `slope` per ln x: k [Z_s (e^−δ − e^δ) + η (e^−δ − 1)] = slope. */
function leadFor(state: AnnihilatingState, lnSteady: number, slope: number): number {
  const { strength, asymmetry } = state
  const wanted = -slope / strength
  const steady = Math.exp(lnSteady)
  let lead = 0
  for (let i = 0; i < 3; i++) {
    const missing = wanted - 2 * steady * Math.sinh(lead) + asymmetry * Math.expm1(-lead)
    lead += missing / (2 * steady * Math.cosh(lead) + asymmetry * Math.exp(-lead))
  }
  return Math.max(-1, Math.min(lead, 1))
}

/** ln Z that leads the balance by as much as the slope of the order before needs; the balance itself to order zero. */
function followingTo(order: number, state: AnnihilatingState, lnX: number): number {
  const after = order > 0 ? followingTo(order - 1, state, lnX + NEARBY) : 0
  const before = order > 0 ? followingTo(order - 1, state, lnX - NEARBY) : 0
  state.moveTo(lnX)
  const balance = steadyYield(state)
  return order > 0 ? balance + leadFor(state, balance, (after - before) / (2 * NEARBY)) : balance
}

/**
 * The same for a curve, to third order, so that it goes over smoothly into the solution. Where the bath steps nearby there is no
 * slope, and the balance is given.
 */
export function drawnYield(state: AnnihilatingState, lnX: number): number {
  const reach = ORDERS * NEARBY
  const stepsNearby = state.breaksBetween(lnX - reach, lnX + reach).length > 0
  return followingTo(stepsNearby ? 0 : ORDERS, state, lnX)
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
