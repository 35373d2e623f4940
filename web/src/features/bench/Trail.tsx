import { useEffect, useState } from 'react'
import { Num } from '../../components/ui/Num.tsx'
import { ASSUMPTION_TITLES, ASSUMPTION_ORDER } from '../../lib/describe.tsx'
import type { BenchView } from './useBenchAnswer.ts'
import type { BenchInputs } from './useDraft.ts'

/** One thing tried in this sitting. */
interface TrailStep extends BenchInputs {
  words: string
  omegaH2: number
}

const SETTLED_MS = 1200
const MOST_STEPS = 8

/** What changed from one look to the next, in a few words. */
function wordsFor(before: TrailStep | undefined, now: BenchInputs): string {
  if (!before) return 'as it was opened'
  const groups = ASSUMPTION_ORDER.filter(
    (group) => JSON.stringify(before.history[group]) !== JSON.stringify(now.history[group]),
  ).map((group) => ASSUMPTION_TITLES[group].toLowerCase())
  if (JSON.stringify(before.candidate) !== JSON.stringify(now.candidate)) groups.push('candidate')
  return groups.length === 0 ? 'the same again' : groups.join(', ')
}

function followed(steps: readonly TrailStep[], view: BenchView): readonly TrailStep[] {
  if (!view.report || !view.request || view.faults.length > 0) return steps
  const { history, candidate } = view.request
  const last = steps[0]
  if (last && JSON.stringify([last.history, last.candidate]) === JSON.stringify([history, candidate]))
    return steps
  return [
    { history, candidate, words: wordsFor(last, view.request), omegaH2: view.report.result.omegaH2 },
    ...steps,
  ].slice(0, MOST_STEPS)
}

/** The steps tried in this sitting, newest first; any of them can be returned to. */
export function Trail({ view, onReturn }: { view: BenchView; onReturn: (inputs: BenchInputs) => void }) {
  const [steps, setSteps] = useState<readonly TrailStep[]>([])
  useEffect(() => {
    const timer = setTimeout(() => setSteps((before) => followed(before, view)), SETTLED_MS)
    return () => clearTimeout(timer)
  }, [view])
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
              className="flex w-full justify-between gap-3 py-2 text-left hover:text-ember"
              onClick={() => onReturn(step)}
            >
              <span className="text-soft">{step.words}</span>
              <Num value={step.omegaH2} />
            </button>
          </li>
        ))}
      </ol>
    </section>
  )
}
