import { useId, useMemo, useRef, useState } from 'react'
import type { Curve } from '#core/bench/types'
import { ChartMenu } from './ChartMenu.tsx'
import type { Cursor } from './cursor.ts'
import { DataTable } from './DataTable.tsx'
import { Legend } from './Legend.tsx'
import { Panel } from './Panel.tsx'
import { Plane } from './Plane.tsx'
import type { AxisScale } from './scale.ts'
import { summary, usualDomain } from './series.ts'
import type { Mark, Series } from './series.ts'
import { useWidth } from './useWidth.ts'
import type { TemperatureWindow } from './window.ts'

export interface LineChartProps {
  title: string
  description: string
  height: number
  window: TemperatureWindow
  onWindow: (hotGeV: number, coldGeV: number) => void
  onReset: () => void
  cursor: Cursor
  y: { scale: 'log' | 'linear'; domain?: [number, number]; label: string; reference?: number }
  series: readonly Series[]
  marks: readonly Mark[]
  /** A curve about one, drawn in a strip of its own beneath over the same temperatures. */
  ratio?: { label: string; curve: Curve; domain: [number, number] }
}

const LEFT = 46

/** Room above the frame for the symbol of the values. */
const TOP = 28
const RIGHT = 108

/** Room for half of the last temperature, px. */
const RIGHT_NARROW = 26
const RATIO_HEIGHT = 64
const RATIO_GAP = 16
const AXIS_HEIGHT = 26

/** Narrower than this, px, the names stand in the legend alone. */
const NARROW = 480

/** Curves against temperature, hot at the left: window by dragging, cursor shared with every chart of the page. */
export function LineChart(props: LineChartProps) {
  const { title, description, height, window, series, ratio, cursor } = props
  const [frame, width] = useWidth<HTMLDivElement>()
  const svg = useRef<SVGSVGElement>(null)
  const [hidden, setHidden] = useState<ReadonlySet<string>>(new Set())
  const [table, setTable] = useState(false)
  const id = useId()
  const shown = useMemo(() => series.filter((each) => !hidden.has(each.id)), [series, hidden])
  const words = useMemo(() => summary(shown), [shown])
  const { scale, domain } = props.y
  const yDomain = useMemo(() => domain ?? usualDomain(series, scale), [domain, series, scale])
  const names = width >= NARROW
  const x: AxisScale = {
    kind: 'log',
    domain: [window.hotGeV, window.coldGeV],
    range: [LEFT, Math.max(LEFT + 1, width - (names ? RIGHT : RIGHT_NARROW))],
  }
  const y: AxisScale = { kind: scale, domain: yDomain, range: [height - AXIS_HEIGHT, TOP] }
  const total = height + (ratio ? RATIO_HEIGHT : 0)
  return (
    <figure aria-labelledby={`${id}-title`} className="min-w-0">
      <figcaption className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h3 id={`${id}-title`} className="font-sans text-small font-semibold text-soft">
          {title}
        </h3>
        <ChartMenu
          title={title}
          svg={svg}
          series={shown}
          tableShown={table}
          onTable={() => setTable(!table)}
        />
      </figcaption>
      <Legend
        series={series}
        hidden={hidden}
        onToggle={(one) => setHidden((before) => toggled(before, one))}
        cursor={cursor}
      />
      <div ref={frame}>
        {width === 0 ? (
          <div style={{ height: total }} />
        ) : (
          <svg
            ref={svg}
            width={width}
            height={total}
            role="group"
            aria-label={`${title}: ${description}`}
            aria-describedby={`${id}-summary`}
            className="block overflow-hidden select-none"
          >
            <Panel
              x={x}
              y={y}
              series={shown}
              marks={props.marks}
              cursor={cursor}
              labels={names}
              temperatureLabels={!ratio}
              symbol={props.y.label}
              reference={props.y.reference}
            />
            {ratio ? (
              <RatioPanel ratio={ratio} x={x} cursor={cursor} top={height - AXIS_HEIGHT} bottom={total} />
            ) : null}
            <Plane {...props} x={x} top={TOP} bottom={total - AXIS_HEIGHT} />
          </svg>
        )}
      </div>
      <p id={`${id}-summary`} className="sr-only">
        {words}
      </p>
      {table ? <DataTable series={shown} /> : null}
    </figure>
  )
}

function toggled(before: ReadonlySet<string>, one: string): ReadonlySet<string> {
  const after = new Set(before)
  if (!after.delete(one)) after.add(one)
  return after
}

interface RatioPanelProps {
  ratio: NonNullable<LineChartProps['ratio']>
  x: AxisScale
  cursor: Cursor
  top: number
  bottom: number
}

function RatioPanel({ ratio: { label, curve, domain }, x, cursor, top, bottom }: RatioPanelProps) {
  const series: Series = {
    id: 'ratio',
    name: label,
    shortName: label,
    curve,
    colour: '--series-1',
    width: 1.5,
  }
  return (
    <Panel
      x={x}
      y={{ kind: 'linear', domain, range: [bottom - AXIS_HEIGHT, top + RATIO_GAP] }}
      series={[series]}
      marks={[]}
      cursor={cursor}
      labels={false}
      temperatureLabels
      caption={label}
      reference={1}
    />
  )
}
