import { TickNumber } from './AxisLabels.tsx'
import { ladderDomain, ladderTicks, rungs } from './ladder.ts'
import type { Factor, Rung } from './ladder.ts'
import { position } from './scale.ts'
import type { AxisScale } from './scale.ts'
import { useWidth } from './useWidth.ts'

interface FactorLadderProps {
  /** Ω_χh² of the baseline. */
  baseline: number
  factors: readonly Factor[]
  /** Ω_χh² of this history. */
  result: number
  /** Ω_χh² measured. */
  measured: number
}

const ROW = 42
const TOP = 18
const BAR = 12

/** Height within a row at which dot and bar are centred, beneath the row's name. */
const CENTRE = 28

/** Width kept at the right for the number beside a bar, px. */
const NUMBER_ROOM = 72

const MOST_TICKS = 5

type At = (value: number) => number

/** From the baseline to this history on a logarithmic axis: filled where a factor raises, outlined where it lowers. */
export function FactorLadder({ baseline, factors, result, measured }: FactorLadderProps) {
  const [frame, width] = useWidth<HTMLDivElement>()
  const steps = rungs(baseline, factors)
  const x: AxisScale = {
    kind: 'log',
    domain: ladderDomain([baseline, result, measured, ...steps.map((step) => step.to)]),
    range: [6, Math.max(20, width - NUMBER_ROOM)],
  }
  const at: At = (value) => position(x, value)
  const rowY = (row: number): number => TOP + ROW * row
  const last = steps.length + 1
  const bottom = rowY(last + 1)
  if (width === 0) return <div ref={frame} style={{ height: bottom + 22 }} />
  return (
    <div ref={frame}>
      <svg
        width={width}
        height={bottom + 22}
        role="img"
        aria-label={inWords({ baseline, factors, result, measured })}
        className="block text-[12px]"
      >
        <Measured x={at(measured)} bottom={bottom} width={width} />
        {[baseline, ...steps.map((step) => step.to)].map((value, row) => (
          <path
            key={row}
            d={`M${at(value)} ${rowY(row) + CENTRE}V${rowY(row + 1) + CENTRE}`}
            stroke="var(--faint)"
          />
        ))}
        <Row y={rowY(0)} label="baseline">
          <Dot x={at(baseline)} y={rowY(0) + CENTRE} value={baseline} colour="--ink" width={width} />
        </Row>
        {steps.map((step, i) => (
          <Row key={step.label} y={rowY(i + 1)} label={step.label}>
            <Bar step={step} y={rowY(i + 1) + CENTRE} at={at} width={width} />
          </Row>
        ))}
        <Row y={rowY(last)} label="this history">
          <Dot x={at(result)} y={rowY(last) + CENTRE} value={result} colour="--ember" width={width} />
        </Row>
        {ladderTicks(x.domain, MOST_TICKS).map((value) => (
          <g key={value} fill="var(--soft)">
            <path d={`M${at(value)} ${bottom}v4`} stroke="var(--faint)" />
            <text x={at(value)} y={bottom + 17} textAnchor={at(value) < 14 ? 'start' : 'middle'}>
              <TickNumber value={value} />
            </text>
          </g>
        ))}
      </svg>
    </div>
  )
}

const inWords = ({ baseline, factors, result, measured }: FactorLadderProps): string =>
  [
    `From ${baseline.toPrecision(4)} in the baseline to ${result.toPrecision(4)}`,
    ...factors.map(({ label, factor }) =>
      factor === null ? `${label} not computable` : `${label} times ${factor.toPrecision(4)}`,
    ),
    `measured ${measured}`,
  ].join('; ')

function Measured({ x, bottom, width }: { x: number; bottom: number; width: number }) {
  return (
    <g>
      <path d={`M${x} ${TOP}V${bottom}`} stroke="var(--series-3)" strokeDasharray="3 3" />
      <text x={x} y={11} textAnchor={x > width * 0.6 ? 'end' : 'start'} fill="var(--series-3)">
        measured
      </text>
    </g>
  )
}

/** The name stands over the lines behind it, on a seam of paper. */
const Row = ({ y, label, children }: { y: number; label: string; children: React.ReactNode }) => (
  <g>
    <text x={0} y={y + 12} fill="var(--soft)" stroke="var(--paper)" strokeWidth={4} paintOrder="stroke">
      {label}
    </text>
    {children}
  </g>
)

interface BesideProps {
  from: number
  to: number
  y: number
  /** Width of the drawing, in which the text has to stay. */
  width: number
  children: string
}

/** Width of a character at 13 px, near enough. */
const CHARACTER = 7

/** A number beside what it belongs to, on the side that has room, on a seam of paper. */
function Beside({ from, to, y, width, children }: BesideProps) {
  const left = to + 9 + children.length * CHARACTER > width
  return (
    <text
      x={left ? from - 9 : to + 9}
      y={y}
      dy="0.34em"
      textAnchor={left ? 'end' : 'start'}
      className="font-serif text-[13px]"
      fill="var(--ink)"
      stroke="var(--paper)"
      strokeWidth={4}
      paintOrder="stroke"
    >
      {children}
    </text>
  )
}

interface DotProps {
  x: number
  y: number
  value: number
  colour: string
  width: number
}

function Dot({ x, y, value, colour, width }: DotProps) {
  return (
    <>
      <circle cx={x} cy={y} r={4.5} fill={`var(${colour})`} />
      <Beside from={x} to={x} y={y} width={width}>
        {String(Number(value.toPrecision(4)))}
      </Beside>
    </>
  )
}

function Bar({ step, y, at, width }: { step: Rung; y: number; at: At; width: number }) {
  const [from, to] = [Math.min(at(step.from), at(step.to)), Math.max(at(step.from), at(step.to))]
  const known = step.factor !== null
  return (
    <>
      {known ? (
        <rect
          x={from}
          y={y - BAR / 2}
          width={Math.max(2, to - from)}
          height={BAR}
          fill={step.to > step.from ? 'var(--ember)' : 'var(--paper)'}
          stroke="var(--ember)"
        />
      ) : null}
      <Beside from={from} to={to} y={y} width={width}>
        {known ? `× ${Number(step.factor!.toPrecision(4))}` : 'not computable'}
      </Beside>
    </>
  )
}
