import { useRef, useState } from 'react'
import type { PointerEvent } from 'react'
import type { BenchReport, EpochMark } from '#core/bench/types'
import { useCursorAt } from '../charts/cursor.ts'
import type { Cursor } from '../charts/cursor.ts'
import { inside, position, valueAt } from '../charts/scale.ts'
import type { AxisScale } from '../charts/scale.ts'
import { useWidth } from '../charts/useWidth.ts'
import { shifted, withEnd } from '../charts/window.ts'
import type { TemperatureWindow } from '../charts/window.ts'
import { Ruler } from './Ruler.tsx'
import { WindowHandle } from './WindowHandle.tsx'
import { spanOf } from './layout.ts'

export interface EmberLineProps {
  /** Everything the line spans, unless the window reaches farther. */
  range: TemperatureWindow
  window: TemperatureWindow
  onWindow: (hotGeV: number, coldGeV: number) => void
  cursor: Cursor
  epochs: readonly EpochMark[]
  times: BenchReport['times']
  mark: BenchReport['mark']
}

const LINE = 40
const EDGE = 28

/** Narrower than this, px, there are fewer labels and no ages. */
const COMPACT = 500
const HEIGHT = 88
const COMPACT_HEIGHT = 72

/** What is held: an end, or the whole window taken at a temperature. */
type Grip = { part: 'hot' | 'cold' } | { part: 'both'; fromGeV: number; window: TemperatureWindow }

/** The temperature ruler of the page: hot at the left, time beneath, epochs above, and the window of every chart. */
export function EmberLine(props: EmberLineProps) {
  const { window, cursor } = props
  const [frame, width] = useWidth<HTMLDivElement>()
  const svg = useRef<SVGSVGElement>(null)
  const [grip, setGrip] = useState<Grip | null>(null)
  const span = spanOf(props.range, window)
  const compact = width < COMPACT
  const height = compact ? COMPACT_HEIGHT : HEIGHT
  const x: AxisScale = {
    kind: 'log',
    domain: [span.hotGeV, span.coldGeV],
    range: [EDGE, Math.max(EDGE + 1, width - EDGE)],
  }
  const at = (temperatureGeV: number): number => position(x, temperatureGeV)

  const temperatureOf = (event: PointerEvent): number => {
    const left = svg.current?.getBoundingClientRect().left ?? 0
    return Math.min(span.hotGeV, Math.max(span.coldGeV, valueAt(x, event.clientX - left)))
  }
  const change = (changed: TemperatureWindow): void => {
    if (changed.hotGeV !== window.hotGeV || changed.coldGeV !== window.coldGeV)
      props.onWindow(changed.hotGeV, changed.coldGeV)
  }
  const take = (event: PointerEvent<SVGElement>, part: Grip['part']): void => {
    if (event.button !== 0) return
    svg.current?.setPointerCapture(event.pointerId)
    setGrip(part === 'both' ? { part, fromGeV: temperatureOf(event), window } : { part })
  }
  const move = (event: PointerEvent): void => {
    const here = temperatureOf(event)
    cursor.move(here)
    if (!grip) return
    if (grip.part === 'both') change(shifted(grip.window, here / grip.fromGeV, span))
    else change(withEnd(window, grip.part, here, span))
  }
  const release = (): void => setGrip(null)

  if (width === 0)
    return <div ref={frame} className="border-b border-rule bg-sunk" style={{ height: HEIGHT }} />
  return (
    <div ref={frame} className="border-b border-rule bg-sunk">
      <svg
        ref={svg}
        width={width}
        height={height}
        className="block touch-pan-y text-[12px] select-none"
        role="group"
        aria-label="Temperature of the bath, hot to cold"
        onPointerMove={move}
        onPointerUp={release}
        onPointerCancel={release}
        onPointerLeave={() => cursor.move(null)}
      >
        <rect
          x={at(window.hotGeV)}
          y={6}
          width={Math.max(0, at(window.coldGeV) - at(window.hotGeV))}
          height={height - 13}
          rx={4}
          fill="var(--raised)"
          stroke="var(--rule)"
          className={grip ? 'cursor-grabbing' : 'cursor-grab'}
          onPointerDown={(event) => take(event, 'both')}
        />
        <Ruler {...props} x={x} width={width} line={LINE} compact={compact} span={span} />
        <CursorLine cursor={cursor} x={x} height={height} />
        {(['hot', 'cold'] as const).map((end) => {
          const temperatureGeV = end === 'hot' ? window.hotGeV : window.coldGeV
          return (
            <WindowHandle
              key={end}
              end={end}
              x={at(temperatureGeV)}
              line={LINE}
              height={height}
              temperatureGeV={temperatureGeV}
              span={span}
              onTake={(event) => take(event, end)}
              onMove={(toGeV) => change(withEnd(window, end, toGeV, span))}
            />
          )
        })}
      </svg>
    </div>
  )
}

function CursorLine({ cursor, x, height }: { cursor: Cursor; x: AxisScale; height: number }) {
  const temperatureGeV = useCursorAt(cursor)
  const at = temperatureGeV === null ? NaN : position(x, temperatureGeV)
  if (!inside(at, x.range)) return null
  return <path d={`M${at} 6V${height - 7}`} stroke="var(--soft)" pointerEvents="none" />
}
