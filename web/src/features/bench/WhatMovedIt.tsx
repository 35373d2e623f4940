import type { BenchReport } from '#core/bench/types'
import { MEASURED_DENSITY } from '#core/constants/measured'
import { FactorLadder } from '../../components/charts/FactorLadder.tsx'
import { Num } from '../../components/ui/Num.tsx'
import { SigmaV, XF } from '../../components/ui/symbols.tsx'
import { ASSUMPTION_TITLES } from '../../lib/describe.tsx'
import { factorText } from './AssumptionCard.tsx'

/** The way from the baseline to this history, one factor for each assumption that differs. */
export function WhatMovedIt({ report }: { report: BenchReport }) {
  const { omegaH2 } = report.result
  const moved = report.factors.filter((factor) => factor.differs)
  return (
    <section aria-labelledby="moved-title">
      <h2 id="moved-title" className="pb-2 font-sans text-small font-semibold text-soft">
        What moved it
      </h2>
      {moved.length === 0 ? (
        <p className="text-small text-soft">
          Nothing differs from the baseline. Change an assumption to see what it does.
        </p>
      ) : (
        <>
          <FactorLadder
            baseline={report.baselineOmegaH2}
            factors={moved.map((factor) => ({
              label: ASSUMPTION_TITLES[factor.group].toLowerCase(),
              factor: factor.attributed,
            }))}
            result={omegaH2}
            measured={MEASURED_DENSITY.omegaH2}
          />
          <p className="pt-2 text-small text-soft">
            Exact factors, averaged over every order of the changes; their product is the ratio,{' '}
            {factorText(omegaH2 / report.baselineOmegaH2)}.
          </p>
        </>
      )}
    </section>
  )
}

interface Fact {
  name: React.ReactNode
  value: number | undefined
  unit?: string
  digits?: number
}

/** The numbers behind the answer. */
export function Facts({ report }: { report: BenchReport }) {
  const { result } = report
  const facts: Fact[] = [
    {
      name: (
        <>
          Freeze-out at <XF />
        </>
      ),
      value: result.freezeOutX,
    },
    { name: 'Temperature there', value: result.freezeOutTemperatureGeV, unit: 'GeV' },
    {
      name: (
        <>
          <SigmaV /> there
        </>
      ),
      value: result.sigmaVAtFreezeOutCm3PerS,
      unit: 'cm³/s',
    },
    { name: 'Rate over expansion there', value: result.rateOverHubbleAtFreezeOut, digits: 3 },
    { name: 'Production peaks at', value: result.productionTemperatureGeV, unit: 'GeV', digits: 3 },
    { name: 'Lifetime of the parent', value: result.lifetimeS, unit: 's' },
    { name: 'Width of the parent', value: result.widthGeV, unit: 'GeV' },
    { name: 'Half decayed at the age', value: result.decayTimeS, unit: 's', digits: 3 },
    {
      name: 'Freeze-in part of the yield',
      value: result.yieldFreezeIn === result.yieldToday ? undefined : result.yieldFreezeIn,
    },
    { name: 'Late-decay part of the yield', value: result.yieldLateDecay },
    { name: 'Yield of particles', value: result.yieldParticle },
    { name: 'Yield of antiparticles', value: result.yieldAntiparticle },
    { name: 'Entropy grew by the factor', value: result.dilution },
    { name: 'Yield today', value: result.yieldToday },
    {
      name: 'Entropy density today',
      value: report.workings.find((working) => working.symbol === 's₀')?.value,
      unit: 'cm⁻³',
      digits: 5,
    },
  ]
  return (
    <dl className="rows self-start border-y border-rule text-small">
      {facts.map((fact, index) =>
        fact.value === undefined ? null : (
          <div key={index} className="flex justify-between gap-3 py-2">
            <dt>{fact.name}</dt>
            <dd>
              <Num value={fact.value} digits={fact.digits ?? 4} {...(fact.unit ? { unit: fact.unit } : {})} />
            </dd>
          </div>
        ),
      )}
    </dl>
  )
}
