import { TickNumber } from './AxisLabels.tsx'
import { logTicks, position } from './scale.ts'
import type { AxisScale } from './scale.ts'
import type { MeasuredDensity } from './verdict.ts'
import { useWidth } from './useWidth.ts'

interface AbundanceBarProps {
  omegaH2: number
  measured: MeasuredDensity
  band: { low: number; high: number } | null
  verdict: string
}

const HEIGHT = 62
const LINE = 34

/** From 0.001 to 10, and as many decades more as the answer needs. */
export function barDomain(omegaH2: number): [number, number] {
  return [
    Math.min(1e-3, 10 ** Math.floor(Math.log10(omegaH2))),
    Math.max(10, 10 ** Math.ceil(Math.log10(omegaH2))),
  ]
}

/** The answer as a dot on a logarithmic line with the measured density: left of it too little, right of it too much. */
export function AbundanceBar({ omegaH2, measured, band, verdict }: AbundanceBarProps) {
  const [frame, width] = useWidth<HTMLDivElement>()
  const x: AxisScale = { kind: 'log', domain: barDomain(omegaH2), range: [10, Math.max(20, width - 10)] }
  const at = (value: number): number => position(x, value)
  const mark = at(measured.omegaH2)
  const ticks = logTicks(x.domain, Math.max(3, Math.floor(width / 60))).filter((tick) => tick.major)
  return (
    <div ref={frame}>
      <p className="flex flex-wrap justify-between gap-x-4 text-small">
        <span className="text-soft">
          measured {measured.omegaH2.toFixed(4)} ± {measured.standardError.toFixed(4)}
        </span>
        <strong data-testid="verdict">{verdict}</strong>
      </p>
      <svg width={width} height={HEIGHT} aria-hidden="true" className="block text-[11.5px]">
        <path d={`M${x.range[0]} ${LINE}H${x.range[1]}`} stroke="var(--rule)" />
        {ticks.map(({ value }) => (
          <g key={value}>
            <path d={`M${at(value)} ${LINE - 4}v8`} stroke="var(--faint)" />
            <text x={at(value)} y={LINE + 20} textAnchor="middle" fill="var(--soft)">
              <TickNumber value={value} />
            </text>
          </g>
        ))}
        <text x={(x.range[0] + mark) / 2} y={LINE - 9} textAnchor="middle" fill="var(--soft)">
          too little
        </text>
        {x.range[1] - mark > 80 ? (
          <text x={(x.range[1] + mark) / 2} y={LINE - 9} textAnchor="middle" fill="var(--soft)">
            too much
          </text>
        ) : null}
        {band ? (
          <path
            d={`M${at(band.low)} ${LINE}H${Math.max(at(band.high), at(band.low) + 1)}`}
            stroke="var(--ember)"
            strokeWidth={7}
            opacity={0.3}
          />
        ) : null}
        <rect
          x={at(measured.omegaH2 - measured.standardError)}
          y={LINE - 13}
          width={Math.max(
            1.5,
            at(measured.omegaH2 + measured.standardError) - at(measured.omegaH2 - measured.standardError),
          )}
          height={26}
          fill="var(--good)"
        />
        <circle
          cx={0}
          cy={LINE}
          r={6}
          fill="var(--ember)"
          style={{
            transform: `translateX(${at(omegaH2)}px)`,
            transition: 'transform var(--moment) ease-out',
          }}
        />
      </svg>
    </div>
  )
}
