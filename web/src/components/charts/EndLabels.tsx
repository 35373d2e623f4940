import { inside, position } from './scale.ts'
import type { AxisScale } from './scale.ts'
import type { Series } from './series.ts'
import { spread } from './spread.ts'

/** Least distance between two names, px. */
const GAP = 14

/** A curve that ends farther than this, px, before the frame does has its name at its own end. */
const REACHES = 40

interface End {
  series: Series
  x: number
  y: number
}

/** The last point of a curve that lies in the frame; null if none does. */
function endOf(series: Series, x: AxisScale, y: AxisScale): End | null {
  const { temperatureGeV, value } = series.curve
  for (let i = temperatureGeV.length - 1; i >= 0; i--) {
    const end = { series, x: position(x, temperatureGeV[i]!), y: position(y, value[i]!) }
    if (inside(end.x, x.range) && inside(end.y, y.range)) return end
  }
  return null
}

interface EndLabelsProps {
  series: readonly Series[]
  x: AxisScale
  y: AxisScale
}

/** The name of each curve at its end: outside of the frame, apart from one another, or where the curve leaves it early. */
export function EndLabels({ series, x, y }: EndLabelsProps) {
  const ends = series.map((each) => endOf(each, x, y)).filter((end) => end !== null)
  const reaching = ends.filter((end) => end.x >= x.range[1] - REACHES)
  const frame = [y.range[1] + 6, y.range[0] - 4] as const
  const placed = spread(
    reaching.map((end) => end.y),
    GAP,
    frame,
  )
  return (
    <>
      {reaching.map(({ series }, i) => (
        <Name key={series.id} series={series} x={x.range[1] + 8} y={placed[i]!} />
      ))}
      {ends
        .filter((end) => !reaching.includes(end))
        .map((end) => (
          <Name
            key={end.series.id}
            series={end.series}
            x={end.x + 8}
            y={Math.max(frame[0], Math.min(end.y, y.range[0] - 12))}
          />
        ))}
    </>
  )
}

const Name = ({ series, x, y }: { series: Series; x: number; y: number }) => (
  <text
    x={x}
    y={y}
    dy="0.34em"
    fill={`var(${series.colour})`}
    stroke="var(--paper)"
    strokeWidth={3}
    paintOrder="stroke"
    className="text-[12px]"
  >
    {series.drawnName ?? series.shortName}
  </text>
)
