import { numberParts, plainText } from '../../lib/number.ts'

interface NumProps {
  value: number
  digits?: number
  unit?: string
}

/** A number set as it is written, 2.2 × 10⁻²⁶, with its unit; the title tells it at full precision. */
export function Num({ value, digits = 4, unit }: NumProps) {
  const { mantissa, exponent } = numberParts(value, digits)
  return (
    <span className="number whitespace-nowrap" title={`${plainText(value)}${unit ? ` ${unit}` : ''}`}>
      {mantissa.replace('-', '−')}
      {exponent === null ? null : (
        <>
          {' × 10'}
          <sup>{String(exponent).replace('-', '−')}</sup>
        </>
      )}
      {unit ? <span className="text-soft"> {unit}</span> : null}
    </span>
  )
}

/** The same, copied at full precision when pressed. */
export function CopyNum(props: NumProps) {
  return (
    <button
      type="button"
      className="hover:text-ember"
      aria-label={`Copy ${plainText(props.value)}`}
      onClick={() => void navigator.clipboard.writeText(plainText(props.value))}
    >
      <Num {...props} />
    </button>
  )
}
