import type { BenchReport } from '#core/bench/types'
import { MEASURED_DENSITY } from '#core/constants/measured'
import { AbundanceBar } from '../../components/charts/AbundanceBar.tsx'
import { verdict } from '../../components/charts/verdict.ts'
import { Formula } from '../../components/ui/Formula.tsx'
import { Disclosure } from '../../components/ui/Disclosure.tsx'
import { CopyNum, Num } from '../../components/ui/Num.tsx'
import { OmegaH2 } from '../../components/ui/symbols.tsx'
import { meaningfulDigits } from '../../lib/number.ts'

const MOST_DIGITS = 4

/** The number, how sure the arithmetic is of it, and how it stands against the sky. */
export function Answer({ report, stale }: { report: BenchReport; stale: boolean }) {
  const { omegaH2, numericalError } = report.result
  const judged = verdict(omegaH2, MEASURED_DENSITY)
  return (
    <section aria-labelledby="answer-title" aria-busy={stale}>
      <h2 id="answer-title" className="sr-only">
        Relic abundance
      </h2>
      <div className="flex flex-wrap items-end gap-x-10 gap-y-3">
        <div>
          <p className="flex items-baseline gap-4 leading-none">
            <span className="text-[1.9rem] text-soft">
              <OmegaH2 />
            </span>
            <output
              className="text-[length:var(--size-answer)] leading-none"
              data-testid="omega"
              data-value={omegaH2}
            >
              <CopyNum value={omegaH2} digits={meaningfulDigits(numericalError, MOST_DIGITS)} />
            </output>
          </p>
          <p className="pt-2.5 text-small text-soft">
            numerical error <Num value={numericalError} digits={1} />
            {report.band ? (
              <>
                , bath’s own band{' '}
                <span title={report.band.because}>
                  <Num value={report.band.low} /> to <Num value={report.band.high} />
                </span>
              </>
            ) : null}
          </p>
        </div>
        <div className="min-w-64 flex-1">
          <AbundanceBar
            omegaH2={omegaH2}
            measured={MEASURED_DENSITY}
            band={report.band}
            verdict={judged.words}
          />
        </div>
      </div>
    </section>
  )
}

const OUTCOME = 'border-y border-rule py-2.5'

/** What physics has to object, with the number each objection rests on. */
export function Guards({ report }: { report: BenchReport }) {
  const { guards } = report.result
  const looked = report.guardsLookedAt
  return (
    <section aria-label="Guards" className={OUTCOME}>
      {guards.length === 0 ? (
        <details>
          <summary className="list-none">
            <span className="font-semibold">Nothing raised.</span>{' '}
            <span className="text-soft">{looked.length} guards looked at</span>{' '}
            <span className="link float-right">all</span>
          </summary>
          <ul className="grid gap-0.5 pt-2 text-small text-soft sm:grid-cols-2">
            {looked.map((guard) => (
              <li key={guard.code}>{guard.title}</li>
            ))}
          </ul>
        </details>
      ) : (
        <ul className="grid gap-2">
          {guards.map((guard) => (
            <li key={guard.code + guard.message} className="border-l-2 border-ember pl-3">
              <p>{guard.message}</p>
              <p className="text-small text-soft">
                <Num value={guard.value} digits={3} unit={guard.unit} /> against{' '}
                <Num value={guard.limit} digits={3} unit={guard.unit} /> · {guard.source}
              </p>
            </li>
          ))}
        </ul>
      )}
    </section>
  )
}

/** Every quantity the answer is made of, with its formula and source. */
export function Workings({ report }: { report: BenchReport }) {
  return (
    <Disclosure summary="How this number comes about">
      <div className="overflow-x-auto">
        <table className="w-full text-small">
          <thead>
            <tr className="text-left text-soft">
              <th className="pr-4 font-normal">Quantity</th>
              <th className="pr-4 font-normal">Value</th>
              <th className="pr-4 font-normal">Formula</th>
              <th className="font-normal">Source</th>
            </tr>
          </thead>
          <tbody className="rows align-top">
            {report.workings.map((working) => (
              <tr key={working.symbol}>
                <td className="py-1.5 pr-4">
                  <i>
                    <Formula text={working.symbol} />
                  </i>{' '}
                  <span className="text-soft">{working.name}</span>
                </td>
                <td className="py-1.5 pr-4">
                  <Num value={working.value} digits={6} unit={working.unit} />
                </td>
                <td className="py-1.5 pr-4">
                  <Formula text={working.formula} />
                </td>
                <td className="py-1.5 text-soft">{working.source}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Disclosure>
  )
}
