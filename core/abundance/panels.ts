/** Where a function of the history is smooth: between breaks, and on panels between the edges of its table. */
import type { ThermalHistory } from '../history/thermalHistory.ts'

/** Values closer than this, in a logarithm, are one. */
const SAME = 1e-12

/** Edges in ln T, descending from `hot` to `cold`, none farther apart than `widest`. */
export function panelEdges(
  history: ThermalHistory,
  hot: number,
  cold: number,
  widest: number,
  more: readonly number[] = [],
): number[] {
  const inner = [...history.radiation.edges, ...history.breaks.map(Math.log), ...more].filter(
    (edge) => edge > cold && edge < hot,
  )
  const cuts = [hot, ...inner.sort((a, b) => b - a), cold]
  const edges = [hot]
  for (const to of cuts.slice(1)) {
    const from = edges.at(-1)!
    if (from - to < SAME) continue
    const parts = Math.ceil((from - to) / widest)
    for (let k = 1; k < parts; k++) edges.push(from - ((from - to) * k) / parts)
    edges.push(to)
  }
  return edges
}

/** Breaks and kinks of the history and those given, as ln T, strictly between two values: where an integrator restarts. Descending. */
export function breaksBetween(
  history: ThermalHistory,
  hot: number,
  cold: number,
  more: readonly number[] = [],
): number[] {
  return [...new Set([...[...history.breaks, ...history.kinks].map(Math.log), ...more])]
    .filter((edge) => edge < hot - SAME && edge > cold + SAME)
    .sort((a, b) => b - a)
}
