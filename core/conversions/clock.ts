/** The age of the universe as a quick function of temperature: ages kept at edges, and from the edge above one panel of quadrature. */
import { HBAR_GEV_S } from '../constants/natural.ts'
import { COLDEST_GEV } from '../history/radiation.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { LARGEST_PANEL, ageBetween, ageIntegrand, earliestAge } from '../history/time.ts'

/** Edges in ln T from hot to cold, at all cuts between and nowhere further apart than the widest panel. */
function edgesBetween(hot: number, cold: number, cuts: readonly number[]): number[] {
  const marks = [hot, ...cuts.filter((at) => at < hot && at > cold), cold]
  return marks.flatMap((mark, i) => {
    const next = marks[i + 1]
    if (next === undefined) return [mark]
    const panels = Math.ceil((mark - next) / LARGEST_PANEL)
    return Array.from({ length: panels }, (_, k) => mark + ((next - mark) * k) / panels)
  })
}

/** Age, s, at ln(T/GeV). Hotter than the start of the history's ages it is 2/((4 + n)H), n = 0 without a fluid. */
export function clockOf(history: ThermalHistory): (lnT: number) => number {
  const integrand = ageIntegrand(history)
  const start = Math.log(history.expansion.ageStartsAt)
  const edges = edgesBetween(start, Math.log(COLDEST_GEV), integrand.cuts)
  const known = new Float64Array(edges.length)
  known[0] = earliestAge(history, start)
  for (let i = 1; i < edges.length; i++)
    known[i] = known[i - 1]! + ageBetween(integrand, edges[i - 1]!, edges[i]!)
  return (lnT) => {
    if (lnT >= start) return earliestAge(history, lnT) * HBAR_GEV_S
    let [low, high] = [0, edges.length - 1]
    while (high - low > 1) {
      const middle = (low + high) >> 1
      if (edges[middle]! >= lnT) low = middle
      else high = middle
    }
    return (known[low]! + ageBetween(integrand, edges[low]!, lnT)) * HBAR_GEV_S
  }
}
