import { memo, useMemo } from 'react'
import type { BenchReport } from '#core/bench/types'
import type { Cursor } from '../../components/charts/cursor.ts'
import { LineChart } from '../../components/charts/LineChart.tsx'
import { GRho, GS } from '../../components/ui/symbols.tsx'
import type { TemperatureWindow } from '../../components/charts/window.ts'

interface BenchChartsProps {
  report: BenchReport
  window: TemperatureWindow
  onWindow: (window: TemperatureWindow | null) => void
  cursor: Cursor
  /** Whether history and baseline differ at all. */
  differs: boolean
}

const RATE_TITLES = {
  'freeze-out': 'Annihilation rate over expansion',
  production: 'Production rate over expansion',
} as const

/** Decades shown below the largest yield. */
const YIELD_DECADES = 14

/** A range of yields that shows the plateau and the fall to it. */
function yieldDomain(report: BenchReport): [number, number] {
  const values = [...report.yieldCurve.value, ...report.baselineYieldCurve.value].filter((value) => value > 0)
  const top = 10 ** Math.ceil(Math.log10(Math.max(...values, 1e-30)))
  const last = report.result.yieldToday
  return [10 ** Math.max(Math.floor(Math.log10(last)) - 3, Math.log10(top) - 3 * YIELD_DECADES), top]
}

/** The three charts of the Bench, over one window and with one cursor. */
export const BenchCharts = memo(function BenchCharts({
  report,
  window,
  onWindow,
  cursor,
  differs,
}: BenchChartsProps) {
  const marks = useMemo(
    () =>
      report.mark
        ? [{ temperatureGeV: report.mark.temperatureGeV, label: report.mark.kind, colour: '--ember' }]
        : [],
    [report.mark],
  )
  const equilibrium = report.equilibriumOf === 'parent' ? 'parent in equilibrium' : 'equilibrium'
  const yields = useMemo(
    () => [
      {
        id: 'yield',
        name: 'this history',
        shortName: 'this history',
        curve: report.yieldCurve,
        colour: '--series-1',
        width: 2,
      },
      ...(differs
        ? [
            {
              id: 'baseline',
              name: 'baseline',
              shortName: 'baseline',
              curve: report.baselineYieldCurve,
              colour: '--series-2',
              dash: '6 4',
            },
          ]
        : []),
      {
        id: 'equilibrium',
        name: equilibrium,
        shortName: equilibrium,
        curve: report.equilibriumCurve,
        colour: '--series-8',
        dash: '1 3',
      },
    ],
    [report, differs, equilibrium],
  )
  const numbers = useMemo(
    () => [
      {
        id: 'g-rho',
        name: <GRho />,
        shortName: 'gρ',
        drawnName: <EffectiveNumber index="ρ" />,
        curve: report.gRhoCurve,
        colour: '--series-1',
        width: 2,
      },
      {
        id: 'g-s',
        name: <GS />,
        shortName: 'gs',
        drawnName: <EffectiveNumber index="s" />,
        curve: report.gSCurve,
        colour: '--series-4',
        dash: '2 3',
      },
      ...(differs
        ? [
            {
              id: 'baseline',
              name: 'baseline',
              shortName: 'gρ, baseline',
              drawnName: (
                <>
                  <EffectiveNumber index="ρ" />
                  <tspan dy="-0.25em">, baseline</tspan>
                </>
              ),
              curve: report.baselineGRhoCurve,
              colour: '--series-2',
              dash: '6 4',
            },
          ]
        : []),
    ],
    [report, differs],
  )
  const rate = useMemo(
    () => [
      {
        id: 'rate',
        name: 'Γ/H',
        shortName: 'Γ/H',
        curve: report.rateOverHubbleCurve,
        colour: '--series-1',
        width: 2,
      },
    ],
    [report],
  )
  const shared = {
    window,
    onWindow: (hotGeV: number, coldGeV: number) => onWindow({ hotGeV, coldGeV }),
    onReset: () => onWindow(null),
    cursor,
    marks,
  }
  return (
    <div className="grid gap-6">
      <LineChart
        {...shared}
        title="Yield Y = n/s"
        description="Number of candidates per entropy against the temperature of the bath"
        height={300}
        y={{ scale: 'log', domain: yieldDomain(report), label: 'Y' }}
        series={yields}
      />
      <LineChart
        {...shared}
        title="Effective degrees of freedom"
        description="Effective numbers in energy and entropy density against the temperature of the bath"
        height={190}
        y={{ scale: 'linear', label: 'g' }}
        series={numbers}
        {...(differs
          ? {
              ratio: {
                label: 'ratio to the baseline',
                curve: report.gRhoRatioCurve,
                domain: ratioDomain(report),
              },
            }
          : {})}
      />
      <LineChart
        {...shared}
        title={RATE_TITLES[report.mark?.kind ?? 'production']}
        description="Rate over the Hubble rate against the temperature of the bath; at one they are equal"
        height={170}
        y={{ scale: 'log', label: 'Γ/H', reference: 1, domain: rateDomain(report) }}
        series={rate}
      />
    </div>
  )
})

function ratioDomain({ gRhoRatioCurve }: BenchReport): [number, number] {
  const away = Math.max(
    0.02,
    ...[...gRhoRatioCurve.value].filter(Number.isFinite).map((ratio) => Math.abs(ratio - 1)),
  )
  const reach = Math.min(0.3, away * 1.15)
  return [1 - reach, 1 + reach]
}

function rateDomain({ rateOverHubbleCurve }: BenchReport): [number, number] {
  const top = Math.max(...[...rateOverHubbleCurve.value].filter((value) => Number.isFinite(value)), 1)
  return [1e-4, 10 ** Math.ceil(Math.log10(top))]
}

/** g with its index, for the ends of curves. */
const EffectiveNumber = ({ index }: { index: string }) => (
  <>
    <tspan fontStyle="italic">g</tspan>
    <tspan fontStyle="italic" fontSize="0.75em" dy="0.33em">
      {index}
    </tspan>
  </>
)
