import { numberParts } from '../../lib/number.ts'
import { temperatureText } from '../../lib/temperature.ts'

/** A number in SVG text: 0.01 to 9999 written out, else the power of ten, 10⁻⁴, with its power as a superscript. */
export function TickNumber({ value }: { value: number }) {
  const size = Math.abs(value)
  if (size === 0 || (size >= 1e-2 && size < 1e4))
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
