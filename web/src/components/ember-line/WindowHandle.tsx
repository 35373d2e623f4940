import type { KeyboardEvent, PointerEvent } from 'react'
import { temperatureText } from '../../lib/temperature.ts'
import type { TemperatureWindow } from '../charts/window.ts'

interface WindowHandleProps {
  end: 'hot' | 'cold'
  x: number
  /** Height of the line and of the whole, px. */
  line: number
  height: number
  temperatureGeV: number
  span: TemperatureWindow
  onTake: (event: PointerEvent<SVGElement>) => void
  onMove: (temperatureGeV: number) => void
}

/** One step of a handle by arrow and by page key, as a factor in temperature. */
const STEP = 1.25
const LARGE_STEP = 10

/** Half of the width in which a finger finds the handle, px. */
const REACH = 14

const FACTORS: Record<string, number> = {
  ArrowLeft: STEP,
  ArrowUp: STEP,
  ArrowRight: 1 / STEP,
  ArrowDown: 1 / STEP,
  PageUp: LARGE_STEP,
  PageDown: 1 / LARGE_STEP,
  // As far as the line goes; whoever listens holds it inside.
  Home: Infinity,
  End: 0,
}

/** An end of the window: a slider whose value is the logarithm of the temperature, spoken in units. */
export function WindowHandle({
  end,
  x,
  line,
  height,
  temperatureGeV,
  span,
  onTake,
  onMove,
}: WindowHandleProps) {
  const onKeyDown = (event: KeyboardEvent): void => {
    const factor = FACTORS[event.key]
    if (factor === undefined) return
    event.preventDefault()
    onMove(temperatureGeV * factor)
  }
  return (
    <g
      role="slider"
      tabIndex={0}
      aria-label={end === 'hot' ? 'Hot end of the window' : 'Cold end of the window'}
      aria-valuemin={Math.log10(span.coldGeV)}
      aria-valuemax={Math.log10(span.hotGeV)}
      aria-valuenow={Math.log10(temperatureGeV)}
      aria-valuetext={temperatureText(Number(temperatureGeV.toPrecision(3)))}
      className="cursor-ew-resize [&:focus:not(:focus-visible)]:outline-none"
      onPointerDown={onTake}
      onKeyDown={onKeyDown}
    >
      <rect x={x - REACH} y={6} width={2 * REACH} height={Math.max(0, height - 13)} fill="transparent" />
      <rect x={x - 2.5} y={line - 12} width={5} height={24} rx={2} fill="var(--ink)" />
    </g>
  )
}
