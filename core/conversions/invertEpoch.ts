/** The temperature at which a quantity has a given value. */
import { COLDEST_GEV, HOTTEST_GEV } from '../history/radiation.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import { brent } from '../numerics/roots/brent.ts'
import type { EpochQuantity } from '../wire/convert.ts'
import type { EpochReader } from './epoch.ts'

/** Allowed error of ln T. */
const TOLERANCE = 1e-14

/** |ln(found/wanted)| above which there is a leap and no solution. */
const REACHED = 1e-10

const GOLDEN = (Math.sqrt(5) - 1) / 2

/** Why no temperature has the value. */
export class NoSuchMoment extends Error {}

export type Inverse = (value: number) => number

/** Redshifts are searched as a₀/a, which is positive. */
const shift = (quantity: EpochQuantity): number => (quantity === 'redshift' ? 1 : 0)

/**
 * The lowest ln T from which on the quantity changes one way only. A wave that enters the horizon is one of decelerating expansion:
 * a H is smallest where Λ begins to accelerate it, and the same frequency would be met again after that.
 */
function coldestOneWay(quantity: EpochQuantity, read: EpochReader, today: number): number {
  if (quantity !== 'waveFrequencyHz') return Math.log(COLDEST_GEV)
  // The turn lies within e⁴ in temperature of today for any allowed matter and Λ with a decelerating past.
  let [a, b] = [Math.max(Math.log(COLDEST_GEV), today - 4), today + 4]
  for (let i = 0; i < 100; i++) {
    const [left, right] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)]
    if (read(quantity, left) < read(quantity, right)) b = right
    else a = left
  }
  return b
}

/** Halvings that narrow an edge in ln T to rounding. */
const HALVINGS = 60

/**
 * The lowest ln T from `cold` on at which the quantity is defined. A species apart that weighs too much today leaves a flat universe
 * a negative Λ, and no expansion rate below some temperature.
 */
function coldestDefined(ln: (lnT: number) => number, cold: number, hot: number): number {
  if (Number.isFinite(ln(cold))) return cold
  let [undefinedAt, definedAt] = [cold, hot]
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (undefinedAt + definedAt) / 2
    if (Number.isFinite(ln(middle))) definedAt = middle
    else undefinedAt = middle
  }
  return definedAt
}

/**
 * ln(T/GeV) as a function of a quantity's value.
 * @throws NoSuchMoment by the inverse, for a value that is never reached or leapt over
 */
export function invertEpoch(quantity: EpochQuantity, history: ThermalHistory, read: EpochReader): Inverse {
  const offset = shift(quantity)
  const ln = (lnT: number): number => Math.log(read(quantity, lnT) + offset)
  const hot = Math.log(HOTTEST_GEV)
  const cold = coldestDefined(ln, coldestOneWay(quantity, read, Math.log(history.temperatureToday)), hot)
  const ends = [ln(cold), ln(hot)] as const
  const [least, most] = [Math.min(...ends), Math.max(...ends)]
  return (value) => {
    const wanted = Math.log(value + offset)
    if (!(wanted >= least && wanted <= most)) {
      const [from, to] = [least, most].map((end) => Math.exp(end) - offset) as [number, number]
      throw new NoSuchMoment(`allowed: ${from.toPrecision(6)} to ${to.toPrecision(6)} in this history`)
    }
    if (wanted === ends[0]) return cold
    if (wanted === ends[1]) return hot
    const lnT = brent((at) => ln(at) - wanted, cold, hot, TOLERANCE)
    if (Math.abs(ln(lnT) - wanted) > REACHED) throw leap(quantity, read, lnT)
    return lnT
  }
}

/** Distance in ln T at which both sides of a leap are read. */
const BESIDE = 1e-9

function leap(quantity: EpochQuantity, read: EpochReader, lnT: number): NoSuchMoment {
  const [cold, hot] = [read(quantity, lnT - BESIDE), read(quantity, lnT + BESIDE)]
  const temperature = Math.exp(lnT).toPrecision(6)
  return new NoSuchMoment(
    `allowed: a value the history passes through; at ${temperature} GeV it steps from ${hot.toPrecision(6)} to ${cold.toPrecision(6)}`,
  )
}
