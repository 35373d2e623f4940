/** The names of what comes out, by field. */
import type { ReactNode } from 'react'
import type { AbundanceResult } from '#core/wire/index'
import { OmegaH2, SigmaV, XF } from '../../components/ui/symbols.tsx'
import { meaningfulDigits } from '../../lib/number.ts'
import { fieldsOf, unitOf } from '../records/fields.ts'

type ParentFreezeOut = NonNullable<AbundanceResult['parentFreezeOut']>
type Label = ReactNode
type LabelsOf<T> = Record<keyof T, Label>

const FREEZE_OUT = {
  freezeOutX: (
    <>
      Freeze-out, <XF />
    </>
  ),
  freezeOutTemperatureGeV: 'Temperature at freeze-out',
  sigmaVAtFreezeOutCm3PerS: (
    <>
      <SigmaV /> at freeze-out
    </>
  ),
  rateOverHubbleAtFreezeOut: 'Rate over expansion at freeze-out',
  rateEqualsHubbleTemperatureGeV: 'Temperature where the rate equals the expansion',
} as const satisfies Partial<LabelsOf<AbundanceResult>>

const RESULT: LabelsOf<Omit<AbundanceResult, 'guards' | 'parentFreezeOut'>> = {
  omegaH2: (
    <>
      Relic abundance <OmegaH2 />
    </>
  ),
  yieldToday: (
    <>
      Yield today, <i className="font-serif">Y = n/s</i>
    </>
  ),
  numericalError: 'Relative numerical error',
  ...FREEZE_OUT,
  yieldFreezeIn: 'Yield from freeze-in',
  yieldLateDecay: 'Yield from late decays',
  decayTimeS: 'Age when half of the parents have decayed',
  yieldParticle: 'Yield of the particle',
  yieldAntiparticle: 'Yield of the antiparticle',
  dilution: (
    <>
      Growth of <i className="font-serif">s a</i>
      <sup>3</sup> in the era of matter
    </>
  ),
  lifetimeS: 'Lifetime of the parent',
  widthGeV: 'Width of the parent',
  productionTemperatureGeV: 'Temperature where most is produced',
}

const PARENT: LabelsOf<ParentFreezeOut> = {
  yieldToday: 'yield today, were it stable',
  omegaH2IfStable: (
    <>
      <OmegaH2 /> were it stable
    </>
  ),
  ...FREEZE_OUT,
  widthOverHubble: 'width over expansion at freeze-out',
}

const LABELS = new Map<string, Label>([
  ...Object.entries(RESULT),
  ...Object.entries(PARENT).map(([field, label]): [string, Label] => [
    `parentFreezeOut.${field}`,
    <>Parent: {label}</>,
  ]),
])

const MOST_DIGITS = 8

const digitsOf = (path: string, { numericalError }: AbundanceResult): number =>
  path === 'numericalError' ? 2 : meaningfulDigits(numericalError, MOST_DIGITS)

export interface Output {
  path: string
  label: Label
  value: number
  unit: string | undefined
  /** Significant digits worth showing. */
  digits: number
}

/** Every number a result holds, named; the guards are told apart from them. */
export const outputsOf = (result: AbundanceResult): Output[] =>
  fieldsOf({ ...result, guards: [] }).flatMap(({ path, value }) =>
    typeof value === 'number'
      ? [{ path, label: LABELS.get(path) ?? path, value, unit: unitOf(path), digits: digitsOf(path, result) }]
      : [],
  )
