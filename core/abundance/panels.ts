/** Panels on which a function of the history is smooth: between breaks and edges of its table, none wider than asked. */
import type { ThermalHistory } from '../history/thermalHistory.ts'

/** Edges in ln T, descending from `hot` to `cold`. */
export function panelEdges(history: ThermalHistory, hot: number, cold: number, widest: number): number[] {
  const inner = [...history.radiation.table.edges, ...history.breaks.map(Math.log)].filter(
    (edge) => edge > cold && edge < hot,
  )
  const cuts = [...new Set([hot, cold, ...inner])].sort((a, b) => b - a)
  const edges = [hot]
  for (let i = 0; i + 1 < cuts.length; i++) {
    const [from, to] = [cuts[i]!, cuts[i + 1]!]
    if (from - to < 1e-12) continue
    const parts = Math.ceil((from - to) / widest)
    for (let k = 1; k <= parts; k++) edges.push(from - ((from - to) * k) / parts)
  }
  return edges
}

/** Breaks of the history, as ln T, strictly between two values: where an integrator restarts. Descending. */
export function breaksBetween(history: ThermalHistory, hot: number, cold: number): number[] {
  return history.breaks
    .map(Math.log)
    .filter((edge) => edge < hot - 1e-12 && edge > cold + 1e-12)
    .sort((a, b) => b - a)
}
