import type { ReactNode } from 'react'
import type { Curve } from '#core/bench/types'
import type { AxisScale } from './scale.ts'

/** One curve of a chart, with how it is drawn and called. */
export interface Series {
  id: string
  name: ReactNode
  /** The name as plain text, for labels in the drawing and for readers. */
  shortName: string
  /** The same with its indices set, as SVG text; the plain text when left out. */
  drawnName?: ReactNode
  curve: Curve
  /** Name of a colour token. */
  colour: string
  dash?: string
  width?: number
}

/** A temperature with a vertical line of its own. */
export interface Mark {
  temperatureGeV: number
  label: string
  /** Name of a colour token. */
  colour: string
}

const drawnValues = (series: readonly Series[], kind: AxisScale['kind']): number[] =>
  series.flatMap(({ curve }) =>
    [...curve.value].filter((value) => Number.isFinite(value) && (kind === 'linear' || value > 0)),
  )

/** The usual axis of values: from zero to a little above the largest, or the whole decades that hold them all. */
export function usualDomain(series: readonly Series[], kind: AxisScale['kind']): [number, number] {
  let low = Infinity
  let high = -Infinity
  for (const value of drawnValues(series, kind)) {
    low = Math.min(low, value)
    high = Math.max(high, value)
  }
  if (kind === 'linear') return [Math.min(0, low * 1.08), high > 0 ? high * 1.08 : 1]
  if (low === Infinity) return [0.1, 1]
  const [first, last] = [Math.floor(Math.log10(low)), Math.ceil(Math.log10(high))]
  return [10 ** first, 10 ** Math.max(last, first + 1)]
}

/** What the curves do, for those who hear the chart. */
export function summary(series: readonly Series[]): string {
  const word = (value: number): string => value.toPrecision(3)
  return series
    .map(({ shortName, curve }) => {
      const values = [...curve.value].filter(Number.isFinite)
      if (values.length === 0) return `${shortName}: nothing in this window.`
      const low = values.reduce((a, b) => Math.min(a, b))
      const high = values.reduce((a, b) => Math.max(a, b))
      return `${shortName}: ${word(values[0]!)} at the hot end, ${word(values.at(-1)!)} at the cold end, between ${word(low)} and ${word(high)}.`
    })
    .join(' ')
}
