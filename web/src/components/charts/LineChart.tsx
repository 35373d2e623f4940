import { useId, useRef, useState } from 'react'
import type { KeyboardEvent, PointerEvent, ReactNode } from 'react'
import type { Curve } from '#core/bench/types'
import { Num } from '../ui/Num.tsx'
import { temperatureText } from '../../lib/temperature.ts'
import { ChartMenu } from './ChartMenu.tsx'
import { DataTable } from './DataTable.tsx'
import { Panel } from './Panel.tsx'
import { valueAtTemperature } from './curvePath.ts'
import { position, valueAt } from './scale.ts'
import type { AxisScale } from './scale.ts'
import { useWidth } from './useWidth.ts'

export interface Series {
  id: string
  name: ReactNode
  /** The name as plain text, for labels in the drawing and for readers. */
  shortName: string
  curve: Curve
  /** Name of a colour token. */
  colour: string
  dash?: string
  width?: number
}

export interface Mark {
  temperatureGeV: number
  label: string
  colour: string
}

export interface LineChartProps {
  title: string
  description: string
  height: number
  window: { hotGeV: number; coldGeV: number }
  onWindow: (hotGeV: number, coldGeV: number) => void
  onReset: () => void
  cursorGeV: number | null
  onCursor: (temperatureGeV: number | null) => void
  y: { scale: 'log' | 'linear'; domain?: [number, number]; label: string }
  series: readonly Series[]
  marks: readonly Mark[]
  ratio?: { label: string; curve: Curve; domain: [number, number] }
}

const LEFT = 46
const RATIO_HEIGHT = 64
const AXIS_HEIGHT = 26
const NARROW = 480

/** A linear axis from zero to a little above the largest value. */
function usualDomain(series: readonly Series[], scale: 'log' | 'linear'): [number, number] {
  const values = series
    .flatMap((each) => [...each.curve.value])
    .filter((value) => Number.isFinite(value) && (scale === 'linear' || value > 0))
  const top = Math.max(...values, scale === 'log' ? 1e-30 : 1)
  return scale === 'linear' ? [0, top * 1.08] : [Math.min(...values), top]
}

/** Curves against temperature, hot at the left: window by dragging, cursor shared with every chart of the page. */
export function LineChart(props: LineChartProps) {
  const { title, description, height, window, series, ratio, cursorGeV, onCursor } = props
  const [frame, width] = useWidth<HTMLDivElement>()
  const svg = useRef<SVGSVGElement>(null)
  const [hidden, setHidden] = useState<ReadonlySet<string>>(new Set())
  const [drag, setDrag] = useState<{ from: number; to: number } | null>(null)
  const [table, setTable] = useState(false)
  const id = useId()
  const shown = series.filter((each) => !hidden.has(each.id))
  const right = width < NARROW ? 8 : 108
  const x: AxisScale = {
    kind: 'log',
    domain: [window.hotGeV, window.coldGeV],
    range: [LEFT, Math.max(LEFT + 1, width - right)],
  }
  const y: AxisScale = {
    kind: props.y.scale,
    domain: props.y.domain ?? usualDomain(series, props.y.scale),
    range: [height - AXIS_HEIGHT, 8],
  }
  const total = height + (ratio ? RATIO_HEIGHT : 0)

  const temperatureOf = (event: PointerEvent): number => {
    const box = svg.current!.getBoundingClientRect()
    return valueAt(x, Math.min(Math.max(event.clientX - box.left, x.range[0]), x.range[1]))
  }
  const move = (event: PointerEvent): void => {
    const at = temperatureOf(event)
    onCursor(at)
    if (drag) setDrag({ ...drag, to: at })
  }
  const release = (): void => {
    if (drag && Math.abs(Math.log(drag.from / drag.to)) > 0.1)
      props.onWindow(Math.max(drag.from, drag.to), Math.min(drag.from, drag.to))
    setDrag(null)
  }
  const onKey = (event: KeyboardEvent): void => {
    const span = Math.log(window.hotGeV / window.coldGeV)
    const middle = cursorGeV ?? Math.sqrt(window.hotGeV * window.coldGeV)
    const zoom = (factor: number): void =>
      props.onWindow(
        middle * (window.hotGeV / middle) ** factor,
        middle * (window.coldGeV / middle) ** factor,
      )
    const actions: Record<string, () => void> = {
      ArrowLeft: () => onCursor(Math.min(window.hotGeV, middle * Math.exp(span / 100))),
      ArrowRight: () => onCursor(Math.max(window.coldGeV, middle * Math.exp(-span / 100))),
      '+': () => zoom(0.7),
      '-': () => zoom(1 / 0.7),
      '0': props.onReset,
      Escape: () => onCursor(null),
    }
    const action = actions[event.key]
    if (!action) return
    event.preventDefault()
    action()
  }
  const toggle = (series: string): void =>
    setHidden(
      (before) =>
        new Set(before.has(series) ? [...before].filter((each) => each !== series) : [...before, series]),
    )

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
      <Legend series={series} hidden={hidden} onToggle={toggle} cursorGeV={cursorGeV} />
      <div ref={frame}>
        {width === 0 ? (
          <div style={{ height: total }} />
        ) : (
          // A drawing one can move about in: the keys are told to those who hear it.
          // eslint-disable-next-line jsx-a11y/no-noninteractive-element-interactions
          <svg
            ref={svg}
            width={width}
            height={total}
            role="application"
            // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex
            tabIndex={0}
            aria-label={`${title}. ${description}. Arrow keys move the cursor, plus and minus zoom, 0 resets.`}
            className="block touch-pan-y select-none"
            onPointerMove={move}
            onPointerLeave={() => onCursor(null)}
            onPointerDown={(event) => {
              if (event.button !== 0) return
              event.currentTarget.setPointerCapture(event.pointerId)
              setDrag({ from: temperatureOf(event), to: temperatureOf(event) })
            }}
            onPointerUp={release}
            onDoubleClick={props.onReset}
            onKeyDown={onKey}
          >
            <Panel
              x={x}
              y={y}
              series={shown}
              marks={props.marks}
              cursorGeV={cursorGeV}
              labels={width >= NARROW}
              temperatureLabels={!ratio}
            />
            {ratio ? (
              <Panel
                x={x}
                y={{
                  kind: 'linear',
                  domain: ratio.domain,
                  range: [total - AXIS_HEIGHT, height - AXIS_HEIGHT + 16],
                }}
                series={[
                  {
                    id: 'ratio',
                    name: ratio.label,
                    shortName: ratio.label,
                    curve: ratio.curve,
                    colour: '--series-1',
                    width: 1.5,
                  },
                ]}
                marks={[]}
                cursorGeV={cursorGeV}
                labels={false}
                temperatureLabels
                caption={ratio.label}
                reference={1}
              />
            ) : null}
            {drag ? <DragShade x={x} drag={drag} height={total - AXIS_HEIGHT} /> : null}
          </svg>
        )}
      </div>
      <p className="sr-only">{summary(shown)}</p>
      {table ? <DataTable series={shown} /> : null}
    </figure>
  )
}

function DragShade({
  x,
  drag,
  height,
}: {
  x: AxisScale
  drag: { from: number; to: number }
  height: number
}) {
  const [a, b] = [position(x, drag.from), position(x, drag.to)]
  return (
    <rect
      x={Math.min(a, b)}
      y={8}
      width={Math.abs(a - b)}
      height={height - 8}
      fill="var(--ember)"
      opacity={0.12}
    />
  )
}

interface LegendProps {
  series: readonly Series[]
  hidden: ReadonlySet<string>
  onToggle: (id: string) => void
  cursorGeV: number | null
}

/** Names with their dash, to show and hide; beside them the values at the cursor, in a place kept for them. */
function Legend({ series, hidden, onToggle, cursorGeV }: LegendProps) {
  return (
    <div className="flex min-h-6 flex-wrap items-center gap-x-4 text-caption text-soft">
      {series.map((each) => (
        <button
          key={each.id}
          type="button"
          aria-pressed={!hidden.has(each.id)}
          className="flex items-center gap-1.5 aria-[pressed=false]:line-through aria-[pressed=false]:opacity-60"
          onClick={() => onToggle(each.id)}
        >
          <svg aria-hidden="true" width="22" height="6">
            <path
              d="M0 3h22"
              stroke={`var(${each.colour})`}
              strokeWidth={each.width ?? 1.5}
              strokeDasharray={each.dash}
            />
          </svg>
          {each.name}
          {cursorGeV === null ? null : <ValueAtCursor curve={each.curve} at={cursorGeV} />}
        </button>
      ))}
      {cursorGeV === null ? null : <span className="ml-auto tabular-nums">{temperatureText(cursorGeV)}</span>}
    </div>
  )
}

function ValueAtCursor({ curve, at }: { curve: Curve; at: number }) {
  const value = valueAtTemperature(curve, at)
  return Number.isFinite(value) ? (
    <span className="text-ink">
      <Num value={value} digits={3} />
    </span>
  ) : null
}

/** What a curve does, for those who hear it. */
function summary(series: readonly Series[]): string {
  return series
    .map(({ shortName, curve }) => {
      const values = [...curve.value].filter(Number.isFinite)
      if (values.length === 0) return `${shortName}: nothing in this window.`
      const word = (value: number): string => value.toPrecision(3)
      return `${shortName}: ${word(values[0]!)} at the hot end, ${word(values.at(-1)!)} at the cold end, between ${word(Math.min(...values))} and ${word(Math.max(...values))}.`
    })
    .join(' ')
}
