import type { AbundanceResult } from '#core/wire/index'
import { MEASURED_DENSITY } from '#core/constants/measured'
import { verdict } from '../../components/charts/verdict.ts'
import { CopyNum, Num } from '../../components/ui/Num.tsx'
import { OmegaH2 } from '../../components/ui/symbols.tsx'
import { meaningfulDigits } from '../../lib/number.ts'
import { outputsOf } from './outputs.tsx'

/** The stored number, how sure the arithmetic is of it, and how it stands against the measured density. */
export function StoredAnswer({ result: { omegaH2, numericalError } }: { result: AbundanceResult }) {
  return (
    <div>
      <p className="flex flex-wrap items-baseline gap-x-4 leading-none">
        <span className="text-[1.9rem] text-soft">
          <OmegaH2 />
        </span>
        <span className="text-[length:var(--size-answer)] leading-none">
          <CopyNum value={omegaH2} digits={meaningfulDigits(numericalError, 4)} />
        </span>
        <strong>{verdict(omegaH2, MEASURED_DENSITY).words}</strong>
      </p>
      <p className="pt-2.5 text-small text-soft">
        numerical error <Num value={numericalError} digits={1} />; measured{' '}
        <span className="number">
          {MEASURED_DENSITY.omegaH2.toFixed(4)} ± {MEASURED_DENSITY.standardError.toFixed(4)}
        </span>
        , {MEASURED_DENSITY.source}
      </p>
    </div>
  )
}

export function Outputs({ result }: { result: AbundanceResult }) {
  return (
    <table className="w-full text-small">
      <caption className="sr-only">What came out</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">Quantity</th>
          <th scope="col">Value</th>
        </tr>
      </thead>
      <tbody className="rows">
        {outputsOf(result).map(({ path, label, value, unit, digits }) => (
          <tr key={path} className="align-baseline">
            <th scope="row" className="py-1.5 pr-4 text-left font-normal" title={path}>
              {label}
            </th>
            <td className="py-1.5 text-right">
              <Num value={value} digits={digits} {...(unit === undefined ? {} : { unit })} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}

/** What physics had to object, with the number each objection rests on. */
export function StoredGuards({ guards }: { guards: AbundanceResult['guards'] }) {
  if (guards.length === 0) return <p className="text-soft">None was raised.</p>
  return (
    <ul className="grid gap-3">
      {guards.map((guard) => (
        <li key={guard.code + guard.message} className="border-l-2 border-ember pl-3">
          <p>{guard.message}</p>
          <p className="text-small text-soft">
            found <Num value={guard.value} unit={guard.unit} />, limit{' '}
            <Num value={guard.limit} unit={guard.unit} />; {guard.source}
          </p>
        </li>
      ))}
    </ul>
  )
}
