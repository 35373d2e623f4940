/** The window of temperatures all charts of a page share, and the ways to change it. */
export interface TemperatureWindow {
  hotGeV: number
  coldGeV: number
}

/** Least and most ratio of a window's ends: closer the curves have no points, farther they show nothing. */
const LEAST = 1.5
const MOST = 1e12

/** A window `factor` times as wide about a temperature, GeV, in ln T; as it is when it would be too narrow or too wide. */
export function zoomed(window: TemperatureWindow, aboutGeV: number, factor: number): TemperatureWindow {
  const hotGeV = aboutGeV * (window.hotGeV / aboutGeV) ** factor
  const coldGeV = aboutGeV * (window.coldGeV / aboutGeV) ** factor
  const ratio = hotGeV / coldGeV
  return ratio >= LEAST && ratio <= MOST ? { hotGeV, coldGeV } : window
}

/** The window between two temperatures, GeV, in either order; null when they are too close for one. */
export function between(aGeV: number, bGeV: number): TemperatureWindow | null {
  const chosen = { hotGeV: Math.max(aGeV, bGeV), coldGeV: Math.min(aGeV, bGeV) }
  return chosen.hotGeV / chosen.coldGeV >= LEAST ? chosen : null
}

/** One end moved to a temperature, GeV: inside the span, and not closer to the other end than a window may be. */
export function withEnd(
  window: TemperatureWindow,
  end: 'hot' | 'cold',
  toGeV: number,
  span: TemperatureWindow,
): TemperatureWindow {
  return end === 'hot'
    ? { ...window, hotGeV: Math.min(span.hotGeV, Math.max(toGeV, window.coldGeV * LEAST)) }
    : { ...window, coldGeV: Math.max(span.coldGeV, Math.min(toGeV, window.hotGeV / LEAST)) }
}

/** The whole window moved by a factor in temperature, as far as the span allows. */
export function shifted(
  { hotGeV, coldGeV }: TemperatureWindow,
  factor: number,
  span: TemperatureWindow,
): TemperatureWindow {
  const bounded = Math.min(span.hotGeV / hotGeV, Math.max(span.coldGeV / coldGeV, factor))
  return { hotGeV: hotGeV * bounded, coldGeV: coldGeV * bounded }
}
