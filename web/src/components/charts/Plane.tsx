import { useState } from 'react'
import type { KeyboardEvent, PointerEvent } from 'react'
import { temperatureText } from '../../lib/temperature.ts'
import { cursorOrMiddle, keyAction } from './chartKeys.ts'
import { position, valueAt } from './scale.ts'
import type { AxisScale } from './scale.ts'
import { useCursorAt } from './cursor.ts'
import type { Cursor } from './cursor.ts'
import { between } from './window.ts'
import type { TemperatureWindow } from './window.ts'

interface PlaneProps {
  title: string
  window: TemperatureWindow
  onWindow: (hotGeV: number, coldGeV: number) => void
  onReset: () => void
  cursor: Cursor
  x: AxisScale
  top: number
  bottom: number
}

/** The surface over a chart that takes pointer and keys: a slider of the cursor, for those who cannot see it. */
export function Plane({ title, window, onWindow, onReset, cursor, x, top, bottom }: PlaneProps) {
  const cursorGeV = useCursorAt(cursor)
  const [drag, setDrag] = useState<{ from: number; to: number } | null>(null)
  const temperatureOf = (event: PointerEvent<SVGElement>): number => {
    const box = event.currentTarget.getBoundingClientRect()
    const at = x.range[0] + event.clientX - box.left
    return valueAt(x, Math.min(Math.max(at, x.range[0]), x.range[1]))
  }
  const press = (event: PointerEvent<SVGElement>): void => {
    if (event.button !== 0) return
    event.currentTarget.setPointerCapture(event.pointerId)
    setDrag({ from: temperatureOf(event), to: temperatureOf(event) })
  }
  const move = (event: PointerEvent<SVGElement>): void => {
    const at = temperatureOf(event)
    cursor.move(at)
    if (drag) setDrag({ ...drag, to: at })
  }
  const release = (): void => {
    const chosen = drag ? between(drag.from, drag.to) : null
    if (chosen) onWindow(chosen.hotGeV, chosen.coldGeV)
    setDrag(null)
  }
  const onKey = (event: KeyboardEvent): void => {
    if (event.ctrlKey || event.metaKey || event.altKey) return
    const action = keyAction(event.key, window, cursorGeV)
    if (!action) return
    event.preventDefault()
    if (action.kind === 'cursor') cursor.move(action.cursorGeV)
    else if (action.kind === 'reset') onReset()
    else onWindow(action.window.hotGeV, action.window.coldGeV)
  }
  const here = cursorOrMiddle(cursorGeV, window)
  return (
    <>
      {drag ? <Shade x={x} drag={drag} top={top} bottom={bottom} /> : null}
      <rect
        x={x.range[0]}
        y={top}
        width={x.range[1] - x.range[0]}
        height={Math.max(0, bottom - top)}
        fill="transparent"
        role="slider"
        tabIndex={0}
        aria-label={`Temperature cursor of ${title}; plus and minus zoom, 0 resets, Escape clears`}
        aria-valuemin={Math.log10(window.coldGeV)}
        aria-valuemax={Math.log10(window.hotGeV)}
        aria-valuenow={Math.log10(here)}
        aria-valuetext={temperatureText(Number(here.toPrecision(3)))}
        className="cursor-crosshair touch-pan-y [&:focus:not(:focus-visible)]:outline-none"
        onPointerDown={press}
        onPointerMove={move}
        onPointerUp={release}
        onPointerCancel={() => setDrag(null)}
        onPointerLeave={() => cursor.move(null)}
        onDoubleClick={onReset}
        onKeyDown={onKey}
      />
    </>
  )
}

interface ShadeProps {
  x: AxisScale
  drag: { from: number; to: number }
  top: number
  bottom: number
}

/** What the next window will hold. */
function Shade({ x, drag, top, bottom }: ShadeProps) {
  const [a, b] = [position(x, drag.from), position(x, drag.to)]
  return (
    <rect
      x={Math.min(a, b)}
      y={top}
      width={Math.abs(a - b)}
      height={bottom - top}
      fill="var(--ember)"
      opacity={0.12}
    />
  )
}
