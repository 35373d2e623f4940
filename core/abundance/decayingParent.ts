/**
 * A parent with an annihilation of its own, followed through its freeze-out and decay, and the candidate it leaves:
 *
 *   dn_B/dt + 3Hn_B = −⟨σv⟩(n_B² − n_eq²) − Γ (K₁/K₂) n_B,   dn_X/dt + 3Hn_X = n_X Γ (K₁/K₂) n_B,
 *
 * K₁/K₂ at m_B/T being the Maxwell–Boltzmann time dilation, taken for any statistics. While annihilation keeps B in
 * equilibrium the candidate is a quadrature; then both are solved together until all have decayed.
 * Source: Hall, Jedamzik, March-Russell, West, JHEP 03 (2010) 080, §2, and Gondolo & Gelmini (1991) for the parent.
 */
import { emptyExpansion } from '../history/expansionPoint.ts'
import { solveOde } from '../numerics/ode/radau.ts'
import type { OdeStep } from '../numerics/ode/problem.ts'
import { integrateWith } from '../numerics/quadrature/gaussLegendre.ts'
import { quickScaledBesselK } from '../numerics/special/besselTable.ts'
import { brent } from '../numerics/roots/brent.ts'
import type { AnnihilatingState } from './annihilatingState.ts'
import { integrationFailure } from '../numerics/convergence.ts'
import type { Effort } from './freezeOutEffort.ts'
import { Sampler } from './yieldSamples.ts'
import type { YieldSamples } from './yieldSamples.ts'

/** x = m_B/T where it all begins when nothing bounds the temperature. */
const EARLIEST_X = 1e-4

/** k Z_eq/max(1, x, Γ/H) down to which B follows equilibrium to second order in its inverse. */
const LN_CERTAIN = Math.log(1e5)

/** ln(Z_B/Z_X) at which the last parents are dropped. */
const LN_LEFT = -40

export interface DecayedParent {
  yieldToday: number
  /** ln T, T in GeV, when half of the candidates were there. */
  lnHalfTemperature: number
}

/** Γ(K₁/K₂)/H times −d ln a/d ln T at ln x, as a function. */
function decayPerLnX(state: AnnihilatingState, widthGeV: number): (lnX: number) => number {
  const point = emptyExpansion()
  return (lnX) => {
    const x = Math.exp(lnX)
    state.history.at(state.clampedLnT(lnX), point)
    return ((widthGeV * point.stretch) / point.hubble) * (quickScaledBesselK(1, x) / quickScaledBesselK(2, x))
  }
}

/** Z_B that follows equilibrium to first order, with decays. */
function following(state: AnnihilatingState, decay: number, lnX: number): number {
  const h = 1e-4
  state.moveTo(lnX + h)
  const after = state.lnEquilibrium
  state.moveTo(lnX)
  const lag =
    ((after - state.lnEquilibrium) / h + decay) / (2 * state.strength * Math.exp(state.lnEquilibrium))
  return Math.exp(state.lnEquilibrium) * (1 - lag)
}

/** The ln x down to which, from `from`, annihilation is far faster than anything else. */
function equilibriumEnds(state: AnnihilatingState, decayAt: (lnX: number) => number, from: number): number {
  let lnX = from
  for (; lnX < Math.log(600); lnX += 0.1) {
    state.moveTo(lnX)
    const others = Math.max(1, Math.exp(lnX), decayAt(lnX))
    if (Math.log(state.strength / others) + state.lnEquilibrium < LN_CERTAIN) break
  }
  return Math.max(from, lnX - 0.1)
}

/**
 * Solves for the candidate's yield today.
 * @param samples wanted ln x, ascending; the candidate's ln Y is written there
 * @throws ConvergenceError; returns null when parents are left today
 */
export function solveDecayingParent(
  state: AnnihilatingState,
  widthGeV: number,
  perDecay: number,
  effort: Effort,
  samples: YieldSamples | null = null,
): DecayedParent | null {
  const { history, lnMass } = state
  const maximum = history.input.maximumTemperatureGeV
  const start =
    maximum === null ? Math.log(EARLIEST_X) : Math.max(Math.log(EARLIEST_X), lnMass - Math.log(maximum))
  const today = lnMass - Math.log(history.temperatureToday)
  const decayAt = decayPerLnX(state, widthGeV)
  const sampler = new Sampler(samples)
  const milestones: { lnX: number; z: number }[] = []
  const sampleWith = (to: number, zAt: (lnX: number) => number): void =>
    sampler.upTo(to, (lnX) => {
      state.moveTo(lnX)
      return Math.log(zAt(lnX)) + state.lnDilution
    })

  state.readAll()
  sampler.upTo(start - 1e-12, () => NaN)
  const end = equilibriumEnds(state, decayAt, start)
  let z = 0
  const feeding = (lnX: number): number => perDecay * decayAt(lnX) * following(state, decayAt(lnX), lnX)
  if (maximum === null) z = feeding(start) / 3 // Z_X grows as x³ at first
  const edges = end > start ? state.panelEdges(start, end, 0.5) : [start]
  for (let i = 0; i + 1 < edges.length; i++) {
    const [from, to] = [edges[i]!, edges[i + 1]!]
    state.stayWithin(from, to)
    const before = z
    sampleWith(to, (lnX) => before + integrateWith(effort.rule, feeding, from, lnX))
    z += integrateWith(effort.rule, feeding, from, to)
    milestones.push({ lnX: to, z })
  }

  state.readAll()
  state.moveTo(end)
  let lnParents = end > start ? Math.log(following(state, decayAt(end), end)) : state.lnEquilibrium
  const unit = Math.max(z, perDecay * Math.exp(lnParents) * Math.min(1, decayAt(end)), 1e-290)
  let lnX = end
  const ends = [...state.breaksBetween(end, today), today]
  for (const to of ends) {
    state.stayWithin(lnX, to)
    const solution = solveOde(
      {
        dimension: 2,
        evaluate(at, y, slope, jacobian) {
          state.moveTo(at)
          const decay = decayAt(at)
          const parents = Math.exp(y[0]!)
          const loss = state.strength * parents
          const gain = state.strength * Math.exp(2 * state.lnEquilibrium - y[0]!)
          slope[0] = gain - loss - decay
          slope[1] = (perDecay * decay * parents) / unit
          jacobian[0] = -gain - loss
          jacobian[1] = jacobian[3] = 0
          jacobian[2] = slope[1]
        },
      },
      lnX,
      [lnParents, z / unit],
      to,
      {
        absoluteTolerance: effort.tolerance,
        relativeTolerance: effort.tolerance,
        firstStep: Math.min(1e-3, to - lnX),
        onStep: (step: OdeStep) => {
          sampleWith(step.to, (at) => unit * step.at(at, 1))
          milestones.push({ lnX: step.to, z: unit * step.end[1]! })
          return step.end[0]! - Math.log(Math.max(unit * step.end[1]!, 1e-300)) < LN_LEFT
        },
      },
    )
    if (solution.status === 'failed') throw integrationFailure(solution.reason, Math.exp(solution.t))
    lnX = solution.t
    lnParents = solution.y[0]!
    z = unit * solution.y[1]!
    if (solution.status === 'stopped') break
  }
  if (lnParents - Math.log(z) > Math.log(1e-9)) return null
  sampleWith(today, () => z)
  return { yieldToday: z, lnHalfTemperature: lnMass - halfWay(milestones, z) }
}

/** ln x at which half of the final candidates were there, by interpolation between the steps. */
function halfWay(milestones: readonly { lnX: number; z: number }[], last: number): number {
  const after = milestones.findIndex((milestone) => milestone.z >= last / 2)
  const high = milestones[Math.max(after, 0)]!
  const low = milestones[Math.max(after - 1, 0)]!
  if (low === high) return high.lnX
  return brent(
    (lnX) => low.z + ((high.z - low.z) * (lnX - low.lnX)) / (high.lnX - low.lnX) - last / 2,
    low.lnX,
    high.lnX,
    1e-9,
  )
}
