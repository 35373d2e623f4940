import { z } from 'zod'
import { MEASURED_DENSITY } from '../constants/measured.ts'
import { nonNegative, positive } from './numbers.ts'

/** A positive number with its standard errors downwards and upwards, which may differ; zero for one known exactly. */
const withErrors = z.strictObject({
  value: positive.describe('Best value'),
  minus: nonNegative.describe('Standard error downwards'),
  plus: nonNegative.describe('Standard error upwards'),
})

/** A measured number: the mode and the two widths of a two-piece normal distribution. */
export const measuredNumber = withErrors.meta({ id: 'MeasuredNumber' })
export type MeasuredNumber = z.output<typeof measuredNumber>

/** A measured abundance Ωh². */
export const measuredDensity = withErrors
  .refine((density) => density.minus < density.value, {
    path: ['minus'],
    message: 'allowed: below the value, for an abundance is positive',
  })
  .meta({ id: 'MeasuredDensity' })

/** The measured density of cold dark matter. */
export const MEASURED: MeasuredNumber = {
  value: MEASURED_DENSITY.omegaH2,
  minus: MEASURED_DENSITY.standardError,
  plus: MEASURED_DENSITY.standardError,
}
