import { useRef, useState } from 'react'
import type { KeyboardEvent, PointerEvent } from 'react'
import type { BenchReport, EpochMark } from '#core/bench/types'
import { temperatureText } from '../../lib/temperature.ts'
import { logTicks, position, valueAt } from '../charts/scale.ts'
import type { AxisScale } from '../charts/scale.ts'
import { useWidth } from '../charts/useWidth.ts'
import { ageText, placeLabels } from './layout.ts'

interface Window {
  hotGeV: number
  coldGeV: number
}

interface EmberLineProps {
  /** Everything the line spans. */
  range: Window
  window: Window
  onWindow: (hotGeV: number, coldGeV: number) => void
  cursorGeV: number | null
  onCursor: (temperatureGeV: number | null) => void
  epochs: readonly EpochMark[]
  times: BenchReport['times']
  mark: BenchReport['mark']
}

const HEIGHT = 88
const LINE = 40
const EDGE = 26
const COMPACT = 560

/** Least ratio of the window's ends. */
const LEAST_WINDOW = 3

/** One step of a handle by keyboard. */
const KEY_STEP = 1.25

type Handle = 'hot' | 'cold' | 'both'

const MARK_WORDS = { 'freeze-out': 'freeze-out', production: 'production' } as const

/** The temperature ruler of the page: hot at the left, time beneath, epochs above, and the window of every chart. */
export function EmberLine({
  range,
  window,
  onWindow,
  cursorGeV,
  onCursor,
  epochs,
  times,
  mark,
}: EmberLineProps) {
  const [frame, width] = useWidth<HTMLDivElement>()
  const svg = useRef<SVGSVGElement>(null)
  const [grip, setGrip] = useState<{ handle: Handle; from: number; window: Window } | null>(null)
  const span = {
    hotGeV: Math.max(range.hotGeV, window.hotGeV),
    coldGeV: Math.min(range.coldGeV, window.coldGeV),
  }
  const x: AxisScale = {
    kind: 'log',
    domain: [span.hotGeV, span.coldGeV],
    range: [EDGE, Math.max(EDGE + 1, width - EDGE)],
  }
  const at = (temperature: number): number => position(x, temperature)
  const compact = width < COMPACT

  const temperatureOf = (event: PointerEvent): number =>
    valueAt(x, event.clientX - svg.current!.getBoundingClientRect().left)
  const bounded = (temperature: number): number => Math.min(span.hotGeV, Math.max(span.coldGeV, temperature))
  const set = (hot: number, cold: number): void => {
    if (hot / cold >= LEAST_WINDOW) onWindow(bounded(hot), bounded(cold))
  }
  const take = (handle: Handle) => (event: PointerEvent<SVGElement>) => {
    event.stopPropagation()
    svg.current?.setPointerCapture(event.pointerId)
    setGrip({ handle, from: temperatureOf(event), window })
  }
  const move = (event: PointerEvent): void => {
    const here = temperatureOf(event)
    onCursor(bounded(here))
    if (!grip) return
    if (grip.handle === 'hot') set(bounded(here), window.coldGeV)
    else if (grip.handle === 'cold') set(window.hotGeV, bounded(here))
    else {
      const ratio = Math.min(
        span.hotGeV / grip.window.hotGeV,
        Math.max(span.coldGeV / grip.window.coldGeV, here / grip.from),
      )
      set(grip.window.hotGeV * ratio, grip.window.coldGeV * ratio)
    }
  }
  const onKey = (handle: 'hot' | 'cold') => (event: KeyboardEvent) => {
    const factor =
      event.key === 'ArrowLeft' || event.key === 'ArrowUp'
        ? KEY_STEP
        : event.key === 'ArrowRight' || event.key === 'ArrowDown'
          ? 1 / KEY_STEP
          : 0
    if (factor === 0) return
    event.preventDefault()
    if (handle === 'hot') set(window.hotGeV * factor, window.coldGeV)
    else set(window.hotGeV, window.coldGeV * factor)
  }

  const markLabel = mark
    ? [
        {
          id: 'mark',
          text: `${MARK_WORDS[mark.kind]}, ${temperatureText(Number(mark.temperatureGeV.toPrecision(3)))}`,
          x: at(mark.temperatureGeV),
          importance: 100,
        },
      ]
    : []
  const labels = placeLabels(
    [
      ...markLabel,
      ...epochs.map((epoch) => ({
        id: epoch.code + epoch.label,
        text: epoch.label,
        x: at(epoch.temperatureGeV),
        importance: epoch.importance,
      })),
    ],
    width,
  )
  const ticks = logTicks(x.domain, Math.floor(width / (compact ? 70 : 90))).filter((tick) => tick.major)
  return (
    <div ref={frame} className="border-b border-rule bg-sunk">
      <svg
        ref={svg}
        width={width}
        height={HEIGHT}
        className="block touch-none text-[12px] select-none"
        role="group"
        aria-label="Temperature of the bath, hot to cold"
        onPointerMove={move}
        onPointerUp={() => setGrip(null)}
        onPointerLeave={() => onCursor(null)}
      >
        <defs>
          <linearGradient id="ember-ramp">
            {[1, 2, 3, 4, 5].map((stop) => (
              <stop key={stop} offset={`${(stop - 1) * 25}%`} stopColor={`var(--ramp-${stop})`} />
            ))}
          </linearGradient>
        </defs>
        <rect
          x={at(window.hotGeV)}
          y={6}
          width={Math.max(0, at(window.coldGeV) - at(window.hotGeV))}
          height={HEIGHT - 13}
          rx={4}
          fill="var(--raised)"
          stroke="var(--rule)"
          className="cursor-grab"
          onPointerDown={take('both')}
        />
        {ticks.map(({ value }) => (
          <g key={value} fill="var(--soft)" pointerEvents="none">
            <path d={`M${at(value)} ${LINE + 5}v4`} stroke="var(--faint)" />
            <text x={at(value)} y={LINE + 22} textAnchor="middle">
              {temperatureText(value)}
            </text>
            {compact ? null : (
              <text x={at(value)} y={LINE + 38} textAnchor="middle" className="text-[11px]">
                {timeAt(times, value)}
              </text>
            )}
          </g>
        ))}
        <rect
          x={x.range[0]}
          y={LINE - 2}
          width={Math.max(0, x.range[1] - x.range[0])}
          height={4}
          rx={2}
          fill="url(#ember-ramp)"
          pointerEvents="none"
        />
        {labels.map((label) => (
          <text
            key={label.id}
            x={label.x}
            y={22}
            textAnchor={label.anchor}
            fill={label.id === 'mark' ? 'var(--ember)' : 'var(--soft)'}
            fontWeight={label.id === 'mark' ? 600 : 400}
            pointerEvents="none"
          >
            {label.text}
          </text>
        ))}
        {epochs.map((epoch) => (
          <circle
            key={epoch.code + epoch.label}
            cx={at(epoch.temperatureGeV)}
            cy={LINE}
            r={3.5}
            fill="var(--raised)"
            stroke="var(--ink)"
            strokeWidth={1.5}
            pointerEvents="none"
          />
        ))}
        {mark ? (
          <circle
            cx={at(mark.temperatureGeV)}
            cy={LINE}
            r={5.5}
            fill="var(--ember)"
            stroke="var(--raised)"
            strokeWidth={1.5}
            pointerEvents="none"
          />
        ) : null}
        {cursorGeV === null ? null : (
          <path d={`M${at(cursorGeV)} 6V${HEIGHT - 7}`} stroke="var(--soft)" pointerEvents="none" />
        )}
        {(['hot', 'cold'] as const).map((handle) => (
          <WindowHandle
            key={handle}
            handle={handle}
            x={at(handle === 'hot' ? window.hotGeV : window.coldGeV)}
            temperature={handle === 'hot' ? window.hotGeV : window.coldGeV}
            span={span}
            onTake={take(handle)}
            onKey={onKey(handle)}
          />
        ))}
      </svg>
    </div>
  )
}

/** The age at a tick, when the report gives one there. */
function timeAt(times: BenchReport['times'], temperatureGeV: number): string {
  const found = times.find((time) => Math.abs(Math.log(time.temperatureGeV / temperatureGeV)) < 1e-6)
  return found ? ageText(found.timeS) : ''
}

interface WindowHandleProps {
  handle: 'hot' | 'cold'
  x: number
  temperature: number
  span: Window
  onTake: (event: PointerEvent<SVGElement>) => void
  onKey: (event: KeyboardEvent) => void
}

function WindowHandle({ handle, x, temperature, span, onTake, onKey }: WindowHandleProps) {
  return (
    <g
      role="slider"
      tabIndex={0}
      aria-label={handle === 'hot' ? 'Hot end of the window' : 'Cold end of the window'}
      aria-valuemin={Math.log10(span.coldGeV)}
      aria-valuemax={Math.log10(span.hotGeV)}
      aria-valuenow={Math.log10(temperature)}
      aria-valuetext={temperatureText(Number(temperature.toPrecision(3)))}
      className="cursor-ew-resize"
      onPointerDown={onTake}
      onKeyDown={onKey}
    >
      <rect x={x - 14} y={6} width={28} height={HEIGHT - 13} fill="transparent" />
      <rect x={x - 2.5} y={LINE - 12} width={5} height={24} rx={2} fill="var(--ink)" />
    </g>
  )
}
