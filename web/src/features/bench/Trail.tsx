import type { ReactNode } from 'react'
import { Num } from '../../components/ui/Num.tsx'
import {
  ASSUMPTION_ORDER,
  ASSUMPTION_TITLES,
  describeAssumption,
  describeCandidate,
} from '../../lib/describe.tsx'
import { equal } from './equal.ts'
import type { TrailStep } from './trail.ts'

/** What was tried, told by what changed from the step before it. */
function wordsFor(before: TrailStep | undefined, now: TrailStep): ReactNode {
  if (before?.names.history !== now.names.history) return now.names.history
  if (before.names.candidate !== now.names.candidate) return now.names.candidate
  const groups = ASSUMPTION_ORDER.filter((group) => !equal(before.history[group], now.history[group]))
  const [first] = groups
  const sameCandidate = equal(before.candidate, now.candidate)
  if (!first) return sameCandidate ? 'the same again' : describeCandidate(now.candidate)
  if (groups.length === 1 && sameCandidate)
    return (
      <>
        {ASSUMPTION_TITLES[first]}: {describeAssumption(first, now.history)}
      </>
    )
  return [...groups.map((group) => ASSUMPTION_TITLES[group]), ...(sameCandidate ? [] : ['Candidate'])].join(
    ', ',
  )
}

/** The steps tried in this sitting, newest first; any of them can be returned to. */
export function Trail({
  steps,
  onReturn,
}: {
  steps: readonly TrailStep[]
  onReturn: (step: TrailStep) => void
}) {
  if (steps.length < 2) return null
  return (
    <section aria-labelledby="trail-title">
      <h2 id="trail-title" className="pb-1 font-sans text-small font-semibold text-soft">
        Trail
      </h2>
      <ol className="rows border-y border-rule text-small">
        {steps.map((step, index) => (
          <li key={steps.length - index}>
            <button
              type="button"
              className="flex w-full items-baseline justify-between gap-3 py-2 text-left hover:text-ember"
              onClick={() => onReturn(step)}
            >
              <span className="text-soft">{wordsFor(steps[index + 1], step)}</span>
              <Num value={step.omegaH2} />
            </button>
          </li>
        ))}
      </ol>
    </section>
  )
}
