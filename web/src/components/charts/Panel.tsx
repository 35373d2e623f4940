import { Axis, Grid } from '@visx/visx'
import { useId, useMemo } from 'react'
import { TemperatureTick, TickNumber, needsPowers } from './AxisLabels.tsx'
import { EndLabels } from './EndLabels.tsx'
import { useCursorAt } from './cursor.ts'
import type { Cursor } from './cursor.ts'
import type { Mark, Series } from './series.ts'
import { pathData, stretches } from './curvePath.ts'
import { inside, linearTicks, logTicks, position, visxScale } from './scale.ts'
import type { AxisScale, Tick } from './scale.ts'

interface PanelProps {
  x: AxisScale
  y: AxisScale
  series: readonly Series[]
  marks: readonly Mark[]
  cursor: Cursor
  /** Whether names stand at the ends of the curves. */
  labels: boolean
  temperatureLabels: boolean
  caption?: string
  /** Symbol of what the values are. */
  symbol?: string
  /** A value with a line of its own, such as one. */
  reference?: number | undefined
}

const PX_PER_TEMPERATURE_LABEL = 70
const PX_PER_VALUE_LABEL = 28
const FEWEST_VALUES = 3

/** One frame: grid, axes, curves with their names at their ends, marks and cursor. */
export function Panel(props: PanelProps) {
  const { x, y, cursor } = props
  const clip = useId()
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
      <CursorLine cursor={cursor} x={x} y={y} />
      {props.labels ? <EndLabels series={props.series} x={x} y={y} /> : null}
    </g>
  )
}

function CursorLine({ cursor, x, y }: { cursor: Cursor; x: AxisScale; y: AxisScale }) {
  const temperatureGeV = useCursorAt(cursor)
  const at = temperatureGeV === null ? NaN : position(x, temperatureGeV)
  if (!inside(at, x.range)) return null
  return <path d={`M${at} ${y.range[1]}V${y.range[0]}`} stroke="var(--soft)" shapeRendering="crispEdges" />
}

const valueTick = (powers: boolean) =>
  function ValueTick({ x, y, formattedValue }: Axis.TickRendererProps) {
    return (
      <text x={x} y={y} dy="0.34em" dx={-5} textAnchor="end" fill="var(--soft)">
        <TickNumber value={Number(formattedValue)} powers={powers} />
      </text>
    )
  }
const POWER_TICK = valueTick(true)
const PLAIN_TICK = valueTick(false)

const temperatureTick = ({ x, y, formattedValue }: Axis.TickRendererProps) => (
  <text x={x} y={y} dy="0.5em" textAnchor="middle" fill="var(--soft)">
    <TemperatureTick temperatureGeV={Number(formattedValue)} />
  </text>
)

function Axes({ x, y, temperatureLabels, caption, symbol, reference }: PanelProps) {
  const width = x.range[1] - x.range[0]
  const height = y.range[0] - y.range[1]
  const major = (ticks: Tick[]): number[] => ticks.filter((tick) => tick.major).map((tick) => tick.value)
  const xTicks = major(logTicks(x.domain, Math.floor(width / PX_PER_TEMPERATURE_LABEL)))
  const wanted = Math.max(FEWEST_VALUES, Math.floor(height / PX_PER_VALUE_LABEL))
  const yTicks = major(y.kind === 'log' ? logTicks(y.domain, wanted) : linearTicks(y.domain, wanted))
  const [xScale, yScale] = [visxScale(x), visxScale(y)]
  return (
    <g className="text-[12px]">
      <Grid.GridColumns
        scale={xScale}
        tickValues={xTicks}
        top={y.range[1]}
        height={height}
        stroke="var(--grid)"
      />
      <Grid.GridRows
        scale={yScale}
        tickValues={yTicks}
        left={x.range[0]}
        width={width}
        stroke="var(--grid)"
      />
      {reference === undefined ? null : (
        <path d={`M${x.range[0]} ${position(y, reference)}H${x.range[1]}`} stroke="var(--faint)" />
      )}
      <Axis.AxisLeft
        scale={yScale}
        tickValues={yTicks}
        left={x.range[0]}
        hideAxisLine
        hideTicks
        tickLength={3}
        tickFormat={String}
        tickComponent={y.kind === 'log' && needsPowers(yTicks) ? POWER_TICK : PLAIN_TICK}
      />
      <Axis.AxisBottom
        scale={xScale}
        tickValues={temperatureLabels ? xTicks : []}
        top={y.range[0]}
        stroke="var(--faint)"
        hideTicks
        tickFormat={String}
        tickComponent={temperatureTick}
      />
      {symbol ? (
        <text x={0} y={y.range[1] - 14} className="font-serif text-[14px] italic" fill="var(--ink)">
          {symbol}
        </text>
      ) : null}
      {caption ? (
        <text x={x.range[1]} y={y.range[1] - 4} textAnchor="end" fill="var(--soft)">
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
