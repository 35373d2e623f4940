/** The age of the universe as a quick function of temperature: known ages at edges, and from them one panel of quadrature. */
import { ages } from '../history/time.ts'
import { emptyExpansion, hubbleOf } from '../history/expansionPoint.ts'
import { LATE_GEV, lateUniverse } from '../history/lateUniverse.ts'
import { COLDEST_GEV } from '../history/radiation.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { gaussLegendre, integrateWith } from '../numerics/quadrature/gaussLegendre.ts'
import { HBAR_GEV_S } from '../constants/natural.ts'

const rule = gaussLegendre(16)

/** Widest panel in ln T. */
const WIDEST = 0.3

/** Edges in ln T from hot to cold, at all breaks between and nowhere further apart than the widest panel. */
function edgesBetween(hot: number, cold: number, breaks: readonly number[]): number[] {
  const marks = [hot, ...breaks.filter((at) => at < hot && at > cold).sort((a, b) => b - a), cold]
  return marks.flatMap((mark, i) => {
    const next = marks[i + 1]
    if (next === undefined) return [mark]
    const panels = Math.ceil((mark - next) / WIDEST)
    return Array.from({ length: panels }, (_, k) => mark + ((next - mark) * k) / panels)
  })
}

/** Age, s, at ln(T/GeV). Hotter than the start of the history's ages it is 2/((4 + n)H), n = 0 without a fluid. */
export function clockOf(history: ThermalHistory): (lnT: number) => number {
  const late = lateUniverse(history)
  const point = emptyExpansion()
  const perLnT = (lnT: number): number => {
    history.at(lnT, point)
    return point.stretch / hubbleOf(point.energy + late.matter(point) + late.darkEnergy(point))
  }
  const { ageStartsAt, earlyIndex } = history.expansion
  const start = Math.log(ageStartsAt)
  const edges = edgesBetween(start, Math.log(COLDEST_GEV), [...history.breaks, LATE_GEV].map(Math.log))
  const known = ages(history, edges.map(Math.exp))
  return (lnT) => {
    if (lnT >= start) {
      history.at(lnT, point)
      return (2 / ((4 + earlyIndex) * point.hubble)) * HBAR_GEV_S
    }
    let [low, high] = [0, edges.length - 1]
    while (high - low > 1) {
      const middle = (low + high) >> 1
      if (edges[middle]! >= lnT) low = middle
      else high = middle
    }
    return known[low]! + integrateWith(rule, perLnT, lnT, edges[low]!) * HBAR_GEV_S
  }
}
