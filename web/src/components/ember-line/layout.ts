/** The geometry of the ember line: what stands where, and which label yields. */
import type { EpochMark } from '#core/bench/types'
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
const CHARACTER = 6.4

const widthOf = (text: string): number => text.length * CHARACTER

/** Left and right end of a placed label, px. */
export function extent({ x, text, anchor }: PlacedLabel): [left: number, right: number] {
  const width = widthOf(text)
  if (anchor === 'start') return [x, x + width]
  return anchor === 'end' ? [x - width, x] : [x - width / 2, x + width / 2]
}

/** Places labels inside [0, width]; where two would collide, the less important one is left out. */
export function placeLabels(labels: readonly Label[], width: number): PlacedLabel[] {
  const placed: PlacedLabel[] = []
  for (const label of [...labels].sort((a, b) => b.importance - a.importance)) {
    const half = widthOf(label.text) / 2
    const anchor = label.x < half ? 'start' : label.x > width - half ? 'end' : 'middle'
    const candidate: PlacedLabel = { ...label, anchor }
    const [left, right] = extent(candidate)
    const free = placed.every((other) => {
      const [otherLeft, otherRight] = extent(other)
      return right + GAP < otherLeft || left - GAP > otherRight
    })
    if (free) placed.push(candidate)
  }
  return placed.sort((a, b) => a.x - b.x)
}

/** Everything the line has to span: its range, and the window where that reaches farther. */
export const spanOf = (range: TemperatureWindow, window: TemperatureWindow): TemperatureWindow => ({
  hotGeV: Math.max(range.hotGeV, window.hotGeV),
  coldGeV: Math.min(range.coldGeV, window.coldGeV),
})

/** The epochs that lie on the line. */
export const epochsWithin = (epochs: readonly EpochMark[], span: TemperatureWindow): EpochMark[] =>
  epochs.filter(({ temperatureGeV }) => temperatureGeV <= span.hotGeV && temperatureGeV >= span.coldGeV)

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
