/** The geometry of the ember line: what stands where, and which label yields. */
import { superscript } from '../charts/superscript.ts'
import type { TemperatureWindow } from '../charts/window.ts'

export interface Label {
  id: string
  text: string
  x: number
  importance: number
}

export interface PlacedLabel extends Label {
  anchor: 'start' | 'middle' | 'end'
}

/** Least distance between two labels, px. */
const GAP = 10

/** Width of a character at 12 px, near enough to keep labels apart without measuring text. */
const CHARACTER = 6

const widthOf = (text: string): number => text.length * CHARACTER

/** Left and right end of a placed label, px. */
export function extent({ x, text, anchor }: PlacedLabel): [left: number, right: number] {
  const width = widthOf(text)
  if (anchor === 'start') return [x, x + width]
  return anchor === 'end' ? [x - width, x] : [x - width / 2, x + width / 2]
}

const ANCHORS = ['middle', 'start', 'end'] as const

/**
 * Places labels inside [0, width]: over what they name, or beginning or ending there when that is where they have
 * room; where two would collide all the same, the less important one is left out.
 */
export function placeLabels(labels: readonly Label[], width: number): PlacedLabel[] {
  const placed: PlacedLabel[] = []
  const fits = (candidate: PlacedLabel): boolean => {
    const [left, right] = extent(candidate)
    return left >= 0 && right <= width && placed.every((other) => areApart(extent(other), [left, right]))
  }
  for (const label of [...labels].sort((a, b) => b.importance - a.importance)) {
    const found = ANCHORS.map((anchor) => ({ ...label, anchor })).find(fits)
    if (found) placed.push(found)
  }
  return placed.sort((a, b) => a.x - b.x)
}

const areApart = ([left, right]: [number, number], [otherLeft, otherRight]: [number, number]): boolean =>
  right + GAP <= otherLeft || left - GAP >= otherRight

/** Everything the line has to span: its range, and the window where that reaches farther. */
export const spanOf = (range: TemperatureWindow, window: TemperatureWindow): TemperatureWindow => ({
  hotGeV: Math.max(range.hotGeV, window.hotGeV),
  coldGeV: Math.min(range.coldGeV, window.coldGeV),
})

/** Whether a temperature, GeV, lies on the line. */
export const isWithin = (temperatureGeV: number, span: TemperatureWindow): boolean =>
  temperatureGeV <= span.hotGeV && temperatureGeV >= span.coldGeV

const UNITS: readonly (readonly [unit: string, seconds: number])[] = [
  ['Gyr', 3.15576e16],
  ['Myr', 3.15576e13],
  ['yr', 3.15576e7],
  ['d', 86_400],
  ['h', 3600],
  ['min', 60],
  ['s', 1],
  ['ms', 1e-3],
  ['µs', 1e-6],
  ['ns', 1e-9],
  ['ps', 1e-12],
  ['fs', 1e-15],
  ['as', 1e-18],
]

/** Two digits in the unit that suits: 0.15 ps is written 150 fs; below an attosecond in powers of ten. */
export function ageText(seconds: number): string {
  const found = UNITS.find(([, size]) => seconds >= size * 0.995)
  if (!found) {
    const [mantissa, power] = seconds.toExponential(0).split('e')
    return `${mantissa} × 10${superscript(Number(power))} s`
  }
  return `${Number((seconds / found[1]).toPrecision(2))} ${found[0]}`
}

/** The age at a temperature when one is given there, else nothing. */
export function ageAt(
  times: readonly { temperatureGeV: number; timeS: number }[],
  temperatureGeV: number,
): string {
  const found = times.find((time) => Math.abs(Math.log(time.temperatureGeV / temperatureGeV)) < 1e-6)
  return found ? ageText(found.timeS) : ''
}
