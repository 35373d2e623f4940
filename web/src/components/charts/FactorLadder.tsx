import { Num } from '../ui/Num.tsx'
import { logTicks, position } from './scale.ts'
import type { AxisScale } from './scale.ts'
import { useWidth } from './useWidth.ts'

interface Factor {
  label: string
  /** Null where a mixed history could not be computed. */
  factor: number | null
}

interface FactorLadderProps {
  baseline: number
  factors: readonly Factor[]
  result: number
  measured: number
}

/** One rung: from one running product to the next. */
export interface Rung extends Factor {
  from: number
  to: number
}

/** The running products from the baseline, factor after factor. */
export function rungs(baseline: number, factors: readonly Factor[]): Rung[] {
  let at = baseline
  return factors.map(({ label, factor }) => {
    const from = at
    at *= factor ?? 1
    return { label, factor, from, to: at }
  })
}

const ROW = 42
const TOP = 18

/** A window on the abundance that holds everything, with room on both sides. */
function domainOf(values: readonly number[]): [number, number] {
  const low = Math.min(...values)
  const high = Math.max(...values)
  const room = Math.max(1.25, (high / low) ** 0.18)
  return [low / room, high * room]
}

/** The digits 1, 2 and 5 of every decade inside: few enough to read. */
const ladderTicks = (domain: [number, number]): number[] => {
  const ticks = logTicks(domain, 8).map((tick) => tick.value)
  const round = ticks.filter((value) => [1, 2, 5].includes(Number(value.toExponential().split('e')[0])))
  return round.length > 5 ? round.filter((value) => value.toExponential().startsWith('1e')) : round
}

/** From the baseline to this history on a logarithmic axis: filled where a factor raises, outlined where it lowers. */
export function FactorLadder({ baseline, factors, result, measured }: FactorLadderProps) {
  const [frame, width] = useWidth<HTMLDivElement>()
  const steps = rungs(baseline, factors)
  const x: AxisScale = {
    kind: 'log',
    domain: domainOf([baseline, result, measured, ...steps.map((step) => step.to)]),
    range: [6, Math.max(20, width - 66)],
  }
  const at = (value: number): number => position(x, value)
  const bottom = TOP + ROW * (steps.length + 2)
  return (
    <div ref={frame}>
      <svg
        width={width}
        height={bottom + 22}
        role="img"
        aria-label={`From ${baseline.toPrecision(4)} in the baseline to ${result.toPrecision(4)}: ${factors.map(({ label, factor }) => `${label} times ${factor?.toPrecision(4) ?? 'not computable'}`).join(', ')}.`}
        className="block text-[12px]"
      >
        <path d={`M${at(measured)} ${TOP}V${bottom}`} stroke="var(--good)" strokeDasharray="3 3" />
        <text
          x={at(measured)}
          y={11}
          textAnchor={at(measured) > width * 0.6 ? 'end' : 'start'}
          fill="var(--good)"
        >
          measured
        </text>
        <Row y={TOP} label="baseline">
          <circle cx={at(baseline)} cy={TOP + 28} r={4.5} fill="var(--ink)" />
          <Beside x={at(baseline)} y={TOP + 28} value={baseline} width={width} />
        </Row>
        {steps.map((step, i) => (
          <LadderRung key={step.label} step={step} y={TOP + ROW * (i + 1)} at={at} width={width} />
        ))}
        <path d={`M${at(baseline)} ${TOP + 33}V${TOP + ROW + 22}`} stroke="var(--faint)" />
        <path d={`M${at(result)} ${bottom - ROW - 6}V${bottom - 18}`} stroke="var(--faint)" />
        <Row y={bottom - ROW} label="this history">
          <circle cx={at(result)} cy={bottom - ROW + 28} r={4.5} fill="var(--ember)" />
          <Beside x={at(result)} y={bottom - ROW + 28} value={result} width={width} />
        </Row>
        {ladderTicks([x.domain[0], x.domain[1]]).map((value) => (
          <text key={value} x={at(value)} y={bottom + 16} textAnchor="middle" fill="var(--soft)">
            {value >= 1e-4 && value < 1e4 ? Number(value.toPrecision(1)) : value.toExponential(0)}
          </text>
        ))}
      </svg>
      <ul className="sr-only">
        {steps.map((step) => (
          <li key={step.label}>
            {step.label}: {step.factor === null ? 'not computable' : <Num value={step.factor} />}
          </li>
        ))}
      </ul>
    </div>
  )
}

const Row = ({ y, label, children }: { y: number; label: string; children: React.ReactNode }) => (
  <g>
    <text x={0} y={y + 10} fill="var(--soft)">
      {label}
    </text>
    {children}
  </g>
)

/** A value beside its dot, on the side that has room. */
function Beside({ x, y, value, width }: { x: number; y: number; value: number; width: number }) {
  const left = x > width - 70
  return (
    <text
      x={left ? x - 9 : x + 9}
      y={y}
      dy="0.34em"
      textAnchor={left ? 'end' : 'start'}
      className="font-serif text-[13px]"
      fill="var(--ink)"
    >
      {Number(value.toPrecision(3))}
    </text>
  )
}

function LadderRung({
  step,
  y,
  at,
  width,
}: {
  step: Rung
  y: number
  at: (value: number) => number
  width: number
}) {
  const rises = step.to > step.from
  const [from, to] = [Math.min(at(step.from), at(step.to)), Math.max(at(step.from), at(step.to))]
  const size = Math.max(2, to - from)
  const left = to > width - 74
  return (
    <Row y={y} label={step.label}>
      <rect
        x={from}
        y={y + 20}
        width={size}
        height={12}
        fill={rises ? 'var(--ember)' : 'none'}
        stroke="var(--ember)"
      />
      <text
        x={left ? from - 8 : to + 8}
        y={y + 26}
        dy="0.34em"
        textAnchor={left ? 'end' : 'start'}
        className="font-serif text-[13px]"
        fill="var(--ink)"
      >
        {step.factor === null ? 'not computable' : `× ${Number(step.factor.toPrecision(4))}`}
      </text>
    </Row>
  )
}
