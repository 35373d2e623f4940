/** The geometry of the ember line: what stands where, and which label yields. */
export interface Label {
  id: string
  text: string
  x: number
  importance: number
}

export interface PlacedLabel extends Label {
  anchor: 'start' | 'middle' | 'end'
}

const GAP = 10

/** Width of a label at 12 px, near enough to keep labels apart without measuring text. */
const widthOf = (text: string): number => text.length * 6.4

function span({ x, text, anchor }: PlacedLabel): [number, number] {
  const width = widthOf(text)
  if (anchor === 'start') return [x, x + width]
  return anchor === 'end' ? [x - width, x] : [x - width / 2, x + width / 2]
}

/** Places labels inside [0, width]; where two would collide the less important one is left out. */
export function placeLabels(labels: readonly Label[], width: number): PlacedLabel[] {
  const placed: PlacedLabel[] = []
  for (const label of [...labels].sort((a, b) => b.importance - a.importance)) {
    const half = widthOf(label.text) / 2
    const anchor = label.x < half ? 'start' : label.x > width - half ? 'end' : 'middle'
    const candidate: PlacedLabel = { ...label, anchor }
    const [from, to] = span(candidate)
    const free = placed.every((other) => {
      const [a, b] = span(other)
      return to + GAP < a || from - GAP > b
    })
    if (free) placed.push(candidate)
  }
  return placed.sort((a, b) => a.x - b.x)
}

/** An age in the unit that suits it. */
export function ageText(seconds: number): string {
  const units: readonly (readonly [string, number])[] = [
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
  ]
  const found = units.find(([, size]) => seconds >= size)
  if (!found) return `${seconds.toExponential(0)} s`
  return `${Number((seconds / found[1]).toPrecision(2))} ${found[0]}`
}
