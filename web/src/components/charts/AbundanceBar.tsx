import { TickNumber, needsPowers } from './AxisLabels.tsx'
import { barDomain } from './barDomain.ts'
import { logTicks, position } from './scale.ts'
import type { AxisScale } from './scale.ts'
import type { MeasuredDensity } from './verdict.ts'
import { useWidth } from './useWidth.ts'

interface AbundanceBarProps {
  omegaH2: number
  measured: MeasuredDensity
  /** Ω_χh² at the ends of the bath's own band. */
  band?: { low: number; high: number } | null
  /** How the two compare, in words. */
  verdict: string
}

const HEIGHT = 60
const LINE = 32
const MARGIN = 18
const PX_PER_LABEL = 52

/** Room the words "too much" need beside the measured mark, px. */
const WORDS_ROOM = 80

/** The answer as a dot on a logarithmic line with the measured density: left of it too little, right of it too much. */
export function AbundanceBar({ omegaH2, measured, band, verdict }: AbundanceBarProps) {
  const [frame, width] = useWidth<HTMLDivElement>()
  const x: AxisScale = {
    kind: 'log',
    domain: barDomain(omegaH2),
    range: [MARGIN, Math.max(MARGIN + 1, width - MARGIN)],
  }
  return (
    <div ref={frame}>
      <p className="flex flex-wrap justify-between gap-x-4 text-small">
        <span className="text-soft">
          measured {measured.omegaH2.toFixed(4)} ± {measured.standardError.toFixed(4)}
        </span>
        <strong data-testid="verdict">{verdict}</strong>
      </p>
      {width === 0 ? (
        <div style={{ height: HEIGHT }} />
      ) : (
        <svg width={width} height={HEIGHT} aria-hidden="true" className="block text-[12px]">
          <Line x={x} />
          <Sides x={x} mark={position(x, measured.omegaH2)} />
          {band ? <Band x={x} band={band} /> : null}
          <MeasuredMark x={x} measured={measured} />
          {omegaH2 > 0 && omegaH2 < Infinity ? (
            <circle
              cy={LINE}
              r={6}
              fill="var(--ember)"
              style={{
                transform: `translateX(${position(x, omegaH2)}px)`,
                transition: 'transform var(--moment) ease-out',
              }}
            />
          ) : null}
        </svg>
      )}
    </div>
  )
}

function Line({ x }: { x: AxisScale }) {
  const most = Math.max(3, Math.floor((x.range[1] - x.range[0]) / PX_PER_LABEL))
  const values = logTicks(x.domain, most)
    .filter((tick) => tick.major)
    .map((tick) => tick.value)
  return (
    <g fill="var(--soft)">
      <path d={`M${x.range[0]} ${LINE}H${x.range[1]}`} stroke="var(--faint)" />
      {values.map((value) => (
        <g key={value}>
          <path d={`M${position(x, value)} ${LINE - 4}v8`} stroke="var(--faint)" />
          <text x={position(x, value)} y={LINE + 22} textAnchor="middle">
            <TickNumber value={value} powers={needsPowers(values)} />
          </text>
        </g>
      ))}
    </g>
  )
}

function Sides({ x: { range }, mark }: { x: AxisScale; mark: number }) {
  return (
    <g fill="var(--soft)" textAnchor="middle">
      {mark - range[0] > WORDS_ROOM ? (
        <text x={(range[0] + mark) / 2} y={LINE - 11}>
          too little
        </text>
      ) : null}
      {range[1] - mark > WORDS_ROOM ? (
        <text x={(range[1] + mark) / 2} y={LINE - 11}>
          too much
        </text>
      ) : null}
    </g>
  )
}

/** Wide enough to be seen however narrow the band is: the wash alone would vanish on paper. */
function Band({ x, band }: { x: AxisScale; band: { low: number; high: number } }) {
  const low = position(x, band.low)
  const high = Math.max(position(x, band.high), low + 1)
  if (!Number.isFinite(high)) return null
  return <path d={`M${low} ${LINE}H${high}`} stroke="var(--ember)" strokeWidth={5} opacity={0.3} />
}

function MeasuredMark({
  x,
  measured: { omegaH2, standardError },
}: {
  x: AxisScale
  measured: MeasuredDensity
}) {
  const at = position(x, omegaH2)
  const low = position(x, Math.max(omegaH2 - standardError, Math.min(...x.domain)))
  const high = position(x, omegaH2 + standardError)
  return (
    <>
      <rect x={low} y={LINE - 15} width={high - low} height={23} fill="var(--series-3)" opacity={0.35} />
      <path d={`M${at} ${LINE - 15}v23`} stroke="var(--series-3)" strokeWidth={1.5} />
    </>
  )
}
