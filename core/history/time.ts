/**
 * Age of the universe: dt/dT = −(1 + δ_s)/(HT), from t = 2/((4 + n)H) at the start, n = 0 without a fluid (t = 1/(2H)).
 * Source: Kolb & Turner, The Early Universe (1990), §3.4 (t ≈ 2.42 g_*^{−1/2} (T/MeV)^{−2} s).
 */
import { HBAR_GEV_S } from '../constants/natural.ts'
import { gaussLegendre, integrateWith } from '../numerics/quadrature/gaussLegendre.ts'
import { LATE_GEV, lateUniverse } from './lateUniverse.ts'
import { emptyExpansion, hubbleOf } from './expansionPoint.ts'
import type { ThermalHistory } from './thermalHistory.ts'

const rule = gaussLegendre(16)
const LARGEST_PANEL = 0.3

/** Ages, s, at the given temperatures, GeV, in any order. */
export function ages(history: ThermalHistory, temperaturesGeV: readonly number[]): number[] {
  const late = lateUniverse(history)
  const point = emptyExpansion()
  const perLnT = (lnT: number): number => {
    history.at(lnT, point)
    return point.stretch / hubbleOf(point.energy + late.matter(point) + late.darkEnergy(point))
  }
  const order = temperaturesGeV.map((_, i) => i).sort((i, j) => temperaturesGeV[j]! - temperaturesGeV[i]!)
  const hottest = Math.max(history.expansion.ageStartsAt, temperaturesGeV[order[0]!] ?? 0)
  const cuts = [...history.breaks, ...history.kinks, LATE_GEV].map(Math.log).sort((a, b) => b - a)

  let from = Math.log(hottest)
  history.at(from, point)
  let age = 2 / ((4 + history.expansion.earlyIndex) * point.hubble)
  const result = new Array<number>(temperaturesGeV.length).fill(0)
  for (const i of order) {
    const to = Math.log(temperaturesGeV[i]!)
    const edges = [from, ...cuts.filter((cut) => cut < from && cut > to), to]
    for (let k = 0; k + 1 < edges.length; k++) {
      const [high, low] = [edges[k]!, edges[k + 1]!]
      const panels = Math.max(1, Math.ceil((high - low) / LARGEST_PANEL))
      const width = (high - low) / panels
      for (let panel = 0; panel < panels; panel++)
        age += integrateWith(rule, perLnT, high - (panel + 1) * width, high - panel * width)
    }
    from = to
    result[i] = age * HBAR_GEV_S
  }
  return result
}
