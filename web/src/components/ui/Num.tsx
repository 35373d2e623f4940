import { numberParts, plainText } from '../../lib/number.ts'
import { useCopy } from './useCopy.ts'

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

/** The same, copied at full precision when pressed; above it stands what became of that. */
export function CopyNum(props: NumProps) {
  const [state, copy] = useCopy()
  const text = plainText(props.value)
  return (
    <span className="relative">
      <button
        type="button"
        className="hover:text-ember"
        aria-label={`Copy ${text}`}
        onClick={() => void copy(text)}
      >
        <Num {...props} />
      </button>
      <span
        role="status"
        className="absolute bottom-[84%] left-0 font-sans text-caption leading-normal whitespace-nowrap text-soft"
      >
        {state === 'copied' ? 'copied' : ''}
        {state === 'refused' ? `select to copy: ${text}` : ''}
      </span>
    </span>
  )
}
