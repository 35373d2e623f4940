import { numberParts } from '../../lib/number.ts'
import { temperatureText } from '../../lib/temperature.ts'

/** Sizes that are written out. */
const PLAIN: readonly [number, number] = [1e-3, 1e4]

/** Sizes written out even among powers of ten. */
const PLAIN_AMONG_POWERS: readonly [number, number] = [0.1, 100]

/** Whether an axis reaches beyond what is written out, so that its labels had better be powers of ten throughout. */
export const needsPowers = (values: readonly number[]): boolean =>
  values.some((value) => value < PLAIN[0] || value >= PLAIN[1])

interface TickNumberProps {
  value: number
  /** Whether it stands among powers of ten. */
  powers?: boolean
}

/** A number in SVG text: written out while it is short, else 10⁻⁴ with its power as a superscript. */
export function TickNumber({ value, powers = false }: TickNumberProps) {
  const size = Math.abs(value)
  const [least, most] = powers ? PLAIN_AMONG_POWERS : PLAIN
  if (size === 0 || (size >= least && size < most))
    return <>{numberParts(value, 3).mantissa.replace('-', '−')}</>
  const power = Math.floor(Math.log10(size) + 1e-9)
  const mantissa = Number((value / 10 ** power).toPrecision(3))
  return (
    <>
      {mantissa === 1 ? '10' : `${String(mantissa).replace('-', '−')} × 10`}
      <Superscript>{power}</Superscript>
    </>
  )
}

/** Above this, GeV, a unit no longer helps and the power of ten is written. */
const BEYOND_UNITS = 1e6

/** A temperature in SVG text: 100 GeV, 1 MeV; beyond the units 10⁷ GeV. */
export function TemperatureTick({ temperatureGeV }: { temperatureGeV: number }) {
  if (temperatureGeV < BEYOND_UNITS) return <>{temperatureText(temperatureGeV)}</>
  return (
    <>
      <TickNumber value={temperatureGeV} />
      <tspan dy="0.32em"> GeV</tspan>
    </>
  )
}

/** Raised by its own em, which is why what follows in the same text comes down by less of its own. */
function Superscript({ children }: { children: number }) {
  return (
    <tspan dy="-0.45em" fontSize="0.72em">
      {String(children).replace('-', '−')}
    </tspan>
  )
}
