import { numberParts } from '../../lib/number.ts'
import { temperatureText } from '../../lib/temperature.ts'

/** A number in SVG text: 10⁻⁴ with its power as a superscript. */
export function TickNumber({ value }: { value: number }) {
  const { mantissa, exponent } =
    value >= 1e-2 && value < 1e4
      ? numberParts(value, 3)
      : { mantissa: '1', exponent: Math.round(Math.log10(value)) }
  if (exponent === null) return <>{mantissa.replace('-', '−')}</>
  return (
    <>
      10
      <tspan dy="-0.45em" fontSize="0.72em">
        {String(exponent).replace('-', '−')}
      </tspan>
    </>
  )
}

/** A temperature on an axis; powers of ten beyond the named units. */
export const temperatureTick = (temperatureGeV: number): string =>
  temperatureGeV >= 1e6 ? `1e${Math.round(Math.log10(temperatureGeV))} GeV` : temperatureText(temperatureGeV)
