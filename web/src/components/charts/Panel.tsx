import { useId, useMemo } from 'react'
import { TemperatureTick, TickNumber, needsPowers } from './AxisLabels.tsx'
import { EndLabels } from './EndLabels.tsx'
import type { Mark, Series } from './series.ts'
import { pathData, stretches } from './curvePath.ts'
import { inside, linearTicks, logTicks, position } from './scale.ts'
import type { AxisScale } from './scale.ts'

interface PanelProps {
  x: AxisScale
  y: AxisScale
  series: readonly Series[]
  marks: readonly Mark[]
  cursorGeV: number | null
  /** Whether names stand at the ends of the curves. */
  labels: boolean
  temperatureLabels: boolean
  caption?: string
  /** Symbol of what the values are. */
  symbol?: string
  /** A value with a line of its own, such as one. */
  reference?: number
}

const PX_PER_TEMPERATURE_LABEL = 86
const PX_PER_VALUE_LABEL = 28
const FEWEST_VALUES = 3

/** One frame: grid, axes, curves with their names at their ends, marks and cursor. */
export function Panel(props: PanelProps) {
  const { x, y, cursorGeV } = props
  const clip = useId()
  const cursor = cursorGeV === null ? NaN : position(x, cursorGeV)
  return (
    <g>
      <clipPath id={clip}>
        <rect
          x={x.range[0]}
          y={y.range[1]}
          width={x.range[1] - x.range[0]}
          height={Math.max(0, y.range[0] - y.range[1])}
        />
      </clipPath>
      <Axes {...props} />
      <g clipPath={`url(#${clip})`}>
        {props.series.map((series) => (
          <CurveLine key={series.id} series={series} x={x} y={y} />
        ))}
      </g>
      {props.marks.map((mark) => (
        <MarkLine key={`${mark.label} ${mark.temperatureGeV}`} mark={mark} x={x} y={y} />
      ))}
      {inside(cursor, x.range) ? (
        <path d={`M${cursor} ${y.range[1]}V${y.range[0]}`} stroke="var(--soft)" shapeRendering="crispEdges" />
      ) : null}
      {props.labels ? <EndLabels series={props.series} x={x} y={y} /> : null}
    </g>
  )
}

function Axes({ x, y, temperatureLabels, caption, symbol, reference }: PanelProps) {
  const xTicks = logTicks(x.domain, Math.floor((x.range[1] - x.range[0]) / PX_PER_TEMPERATURE_LABEL)).filter(
    (tick) => tick.major,
  )
  const height = y.range[0] - y.range[1]
  const wanted = Math.max(FEWEST_VALUES, Math.floor(height / PX_PER_VALUE_LABEL))
  const yTicks = (y.kind === 'log' ? logTicks(y.domain, wanted) : linearTicks(y.domain, wanted)).filter(
    (tick) => tick.major,
  )
  const powers = y.kind === 'log' && needsPowers(yTicks.map((tick) => tick.value))
  return (
    <g className="text-[12px]" shapeRendering="crispEdges" fill="var(--soft)">
      {xTicks.map(({ value }) => (
        <path key={value} d={`M${position(x, value)} ${y.range[1]}V${y.range[0]}`} stroke="var(--grid)" />
      ))}
      {yTicks.map(({ value }) => (
        <path key={value} d={`M${x.range[0]} ${position(y, value)}H${x.range[1]}`} stroke="var(--grid)" />
      ))}
      {reference === undefined ? null : (
        <path d={`M${x.range[0]} ${position(y, reference)}H${x.range[1]}`} stroke="var(--faint)" />
      )}
      {yTicks.map(({ value }) => (
        <text key={value} x={x.range[0] - 8} y={position(y, value)} dy="0.34em" textAnchor="end">
          <TickNumber value={value} powers={powers} />
        </text>
      ))}
      <path d={`M${x.range[0]} ${y.range[0]}H${x.range[1]}`} stroke="var(--faint)" />
      {temperatureLabels
        ? xTicks.map(({ value }) => (
            <text key={value} x={position(x, value)} y={y.range[0] + 17} textAnchor="middle">
              <TemperatureTick temperatureGeV={value} />
            </text>
          ))
        : null}
      {symbol ? (
        <text x={0} y={y.range[1] - 14} className="font-serif text-[14px] italic" fill="var(--ink)">
          {symbol}
        </text>
      ) : null}
      {caption ? (
        <text x={x.range[1]} y={y.range[1] - 4} textAnchor="end">
          {caption}
        </text>
      ) : null}
    </g>
  )
}

function CurveLine({ series, x, y }: { series: Series; x: AxisScale; y: AxisScale }) {
  const [x0, x1] = x.range
  const [y0, y1] = y.range
  const [d0, d1] = y.domain
  const [hot, cold] = x.domain
  const { kind } = y
  const { curve } = series
  const data = useMemo(
    () =>
      pathData(
        stretches(
          curve,
          { kind: 'log', domain: [hot, cold], range: [x0, x1] },
          { kind, domain: [d0, d1], range: [y0, y1] },
        ),
      ),
    [curve, hot, cold, x0, x1, kind, d0, d1, y0, y1],
  )
  return (
    <path
      d={data}
      fill="none"
      stroke={`var(${series.colour})`}
      strokeWidth={series.width ?? 1.5}
      strokeDasharray={series.dash}
      strokeLinejoin="round"
    />
  )
}

function MarkLine({ mark, x, y }: { mark: Mark; x: AxisScale; y: AxisScale }) {
  const at = position(x, mark.temperatureGeV)
  if (!inside(at, x.range)) return null
  const near = x.range[1] - at < 70
  return (
    <g>
      <path d={`M${at} ${y.range[1]}V${y.range[0]}`} stroke={`var(${mark.colour})`} strokeDasharray="3 3" />
      <text
        x={near ? at - 6 : at + 6}
        y={y.range[1] + 12}
        textAnchor={near ? 'end' : 'start'}
        fill={`var(${mark.colour})`}
        className="text-[12px]"
      >
        {mark.label}
      </text>
    </g>
  )
}
