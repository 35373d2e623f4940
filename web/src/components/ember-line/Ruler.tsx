import { useId } from 'react'
import type { BenchReport, EpochMark } from '#core/bench/types'
import { temperatureText } from '../../lib/temperature.ts'
import { TemperatureTick } from '../charts/AxisLabels.tsx'
import { logTicks, position } from '../charts/scale.ts'
import type { AxisScale } from '../charts/scale.ts'
import type { TemperatureWindow } from '../charts/window.ts'
import { ageAt, isWithin, placeLabels } from './layout.ts'

interface RulerProps {
  x: AxisScale
  width: number
  /** Height of the line itself, px. */
  line: number
  compact: boolean
  span: TemperatureWindow
  epochs: readonly EpochMark[]
  times: BenchReport['times']
  mark: BenchReport['mark']
}

const LABELS = 22
const PX_PER_TICK = 86
const PX_PER_TICK_COMPACT = 64

/** Above every epoch: where the abundance is decided keeps its name. */
const MARK_IMPORTANCE = Infinity

const MARK = 'mark'

const STOPS = [1, 2, 3, 4, 5] as const

/** The line in the colours of temperature, its ticks with ages, the epochs and the candidate's mark; the pointer passes through. */
export function Ruler(all: RulerProps) {
  const { x, line, span, mark } = all
  const props = {
    ...all,
    epochs: all.epochs.filter((epoch) => isWithin(epoch.temperatureGeV, span)),
    mark: mark && isWithin(mark.temperatureGeV, span) ? mark : null,
  }
  const ramp = useId()
  return (
    <g pointerEvents="none">
      <linearGradient id={ramp}>
        {STOPS.map((stop, i) => (
          <stop key={stop} offset={i / (STOPS.length - 1)} stopColor={`var(--ramp-${stop})`} />
        ))}
      </linearGradient>
      <Ticks {...props} />
      <rect
        x={x.range[0]}
        y={line - 2}
        width={Math.max(0, x.range[1] - x.range[0])}
        height={4}
        rx={2}
        fill={`url(#${ramp})`}
      />
      <Names {...props} />
      <Circles {...props} />
    </g>
  )
}

function Ticks({ x, line, compact, times }: RulerProps) {
  const most = Math.floor((x.range[1] - x.range[0]) / (compact ? PX_PER_TICK_COMPACT : PX_PER_TICK))
  return logTicks(x.domain, most)
    .filter((tick) => tick.major)
    .map(({ value }) => (
      <g key={value} fill="var(--soft)" textAnchor="middle">
        <path d={`M${position(x, value)} ${line + 5}v4`} stroke="var(--faint)" />
        <text x={position(x, value)} y={line + 22}>
          <TemperatureTick temperatureGeV={value} />
        </text>
        {compact ? null : (
          <text x={position(x, value)} y={line + 38}>
            {ageAt(times, value)}
          </text>
        )}
      </g>
    ))
}

function Names({ x, width, epochs, mark }: RulerProps) {
  const labels = epochs.map(({ code, label, temperatureGeV, importance }) => ({
    id: code + label,
    text: label,
    x: position(x, temperatureGeV),
    importance,
  }))
  if (mark)
    labels.push({
      id: MARK,
      text: `${mark.kind}, ${temperatureText(Number(mark.temperatureGeV.toPrecision(3)))}`,
      x: position(x, mark.temperatureGeV),
      importance: MARK_IMPORTANCE,
    })
  return placeLabels(labels, width).map(({ id, x, anchor, text }) => (
    <text
      key={id}
      x={x}
      y={LABELS}
      textAnchor={anchor}
      fill={id === MARK ? 'var(--ember)' : 'var(--soft)'}
      fontWeight={id === MARK ? 600 : 400}
    >
      {text}
    </text>
  ))
}

function Circles({ x, line, epochs, mark }: RulerProps) {
  return (
    <>
      {epochs.map(({ code, label, temperatureGeV }) => (
        <circle
          key={code + label}
          cx={position(x, temperatureGeV)}
          cy={line}
          r={3.5}
          fill="var(--raised)"
          stroke="var(--ink)"
          strokeWidth={1.5}
        />
      ))}
      {mark ? (
        <circle
          cx={position(x, mark.temperatureGeV)}
          cy={line}
          r={5.5}
          fill="var(--ember)"
          stroke="var(--raised)"
          strokeWidth={1.5}
        />
      ) : null}
    </>
  )
}
