/**
 * Freeze-in by decay with inverse decays kept:
 *
 *   dZ/d ln x = P (1 − (Y/Y_eq)^{n_X}) + P_φ,   Y = Z e^{lnDilution},
 *
 * P the production without them, n_X candidates per decay, and P_φ what a decaying field makes beside them. It goes over
 * smoothly into thermalisation as the width grows.
 * Source: Hall, Jedamzik, March-Russell, West, JHEP 03 (2010) 080, §2; the power n_X by detailed balance.
 */
import { emptyExpansion } from '../history/expansionPoint.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { solveOde } from '../numerics/ode/radau.ts'
import { integrationFailure } from '../numerics/convergence.ts'
import { logEquilibriumYield } from './equilibrium.ts'
import type { EquilibriumSpecies } from './equilibrium.ts'
import { FREEZE_IN_RULES, fieldPerLnT, productionEnds, solveFreezeIn, thermalPerLnT } from './freezeIn.ts'
import type { FreezeInSource } from './freezeIn.ts'
import { breaksBetween } from './panels.ts'
import { Sampler } from './yieldSamples.ts'
import type { YieldSamples } from './yieldSamples.ts'

/** Tolerances of rising care, in units of the yield's own size. */
export const BACK_REACTION_TOLERANCES: readonly number[] = [1e-5, 1e-6, 1e-8, 1e-9]

/** ln x over which the production is looked at for the largest Y_eq that can hold it. */
const EDGE = 1e-13

/**
 * The yield today.
 * @param samples wanted ln x of the source's scale; ln Y is written there
 */
export function solveWithBackReaction(
  history: ThermalHistory,
  source: FreezeInSource,
  candidate: EquilibriumSpecies,
  perDecay: number,
  tolerance: number,
  samples: YieldSamples | null = null,
): number {
  const lnScale = Math.log(source.scaleGeV)
  const hot = Math.log(source.hottestGeV)
  const cold = Math.log(productionEnds(history, source))
  const production = thermalPerLnT(history, source)
  const fromField = history.expansion.producesUntil === null ? () => 0 : fieldPerLnT(history)
  const point = emptyExpansion()
  const lnEquilibrium = (lnT: number): number => {
    history.at(lnT, point)
    return (
      logEquilibriumYield([candidate], candidate.massGeV, candidate.massGeV / point.temperature, point.gS) -
      point.lnDilution
    )
  }
  const free = solveFreezeIn(history, source, FREEZE_IN_RULES[0]!)
  const unit = Math.min(free, Math.exp(lnEquilibrium(lnScale)))
  const sampler = new Sampler(samples)
  const today = lnScale - Math.log(history.temperatureToday)
  const lnYield = (lnX: number, z: number): number => {
    history.at(lnScale - lnX, point)
    return Math.log(z) + point.lnDilution
  }
  sampler.upTo(lnScale - hot - 1e-12, () => NaN)
  let from = hot
  let z = 0
  for (const to of [...breaksBetween(history, hot, cold), cold]) {
    const high = from - EDGE * Math.max(1, Math.abs(from))
    const low = to + EDGE * Math.max(1, Math.abs(to))
    const solution = solveOde(
      {
        dimension: 1,
        evaluate(lnX, y, slope, jacobian) {
          const lnT = Math.max(low, Math.min(high, lnScale - lnX))
          const source = production(lnT) / unit
          slope[0] = fromField(lnT) / unit
          jacobian[0] = 0
          // Long after the parents, Y_eq may be nothing.
          if (source === 0) return
          const ratio = (unit * y[0]!) / Math.exp(lnEquilibrium(lnT))
          // Between Newton steps y may be negative, where a broken power does not exist.
          const filled = Math.abs(ratio) ** (perDecay - 1)
          slope[0] += source * (1 - filled * ratio)
          jacobian[0] = (-source * perDecay * filled * unit) / Math.exp(lnEquilibrium(lnT))
        },
      },
      lnScale - from,
      [z / unit],
      lnScale - to,
      {
        absoluteTolerance: tolerance,
        onStep: (step) => sampler.upTo(step.to, (lnX) => lnYield(lnX, unit * step.at(lnX, 0))),
      },
    )
    if (solution.status === 'failed') throw integrationFailure(solution.reason, Math.exp(solution.t))
    z = unit * solution.y[0]!
    from = to
  }
  sampler.upTo(today, (lnX) => lnYield(lnX, z))
  return z
}
