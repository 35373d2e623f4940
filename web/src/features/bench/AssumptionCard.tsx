import type { ReactNode } from 'react'
import type { AssumptionFactor } from '#core/bench/types'
import type { AssumptionGroup, HistoryInput } from '#core/wire/index'
import { Button } from '../../components/ui/Button.tsx'
import { ASSUMPTION_TITLES, describeAssumption } from '../../lib/describe.tsx'
import { equal } from './equal.ts'
import { RULED } from './forms/ruled.ts'
import { AssumptionForm } from './forms/HistoryForms.tsx'

interface CardProps {
  group: AssumptionGroup
  history: HistoryInput
  baseline: HistoryInput
  factor: AssumptionFactor | undefined
  open: boolean
  onToggle: () => void
  onChange: (history: HistoryInput) => void
}

/** One group of assumptions as a ruled line: its choice, its own effect on the abundance, and its form when open. */
export function AssumptionCard({ group, history, baseline, factor, open, onToggle, onChange }: CardProps) {
  const differs = !equal(history[group], baseline[group])
  return (
    <li>
      <h3 className="font-sans">
        <button
          type="button"
          aria-expanded={open}
          className="grid w-full grid-cols-[1fr_auto] gap-x-3 py-2.5 text-left hover:bg-raised"
          onClick={onToggle}
        >
          <span>
            <span className="block text-small text-soft">{ASSUMPTION_TITLES[group]}</span>
            <span className="font-normal">
              {differs ? <Dot /> : null}
              {describeAssumption(group, history)}
            </span>
          </span>
          <FactorMark factor={factor} />
        </button>
      </h3>
      {open ? (
        <div className={`border-l-2 border-rule pb-3 pl-3 ${RULED}`}>
          <AssumptionForm group={group} history={history} onChange={onChange} />
          {differs ? (
            <Button variant="link" onClick={() => onChange({ ...history, [group]: baseline[group] })}>
              Back to the baseline’s
            </Button>
          ) : null}
        </div>
      ) : null}
    </li>
  )
}

const Dot = () => (
  <>
    <span aria-hidden="true" className="mr-1.5 inline-block size-1.5 rounded-full bg-ember align-middle" />
    <span className="sr-only">differs from the baseline: </span>
  </>
)

/** Width of the mark for a factor e, px. */
const PX_PER_E_FOLD = 26
const MOST_PX = 31

/** ×1.925 over a small bar about one: filled to the right when it raises the abundance, outlined to the left when it lowers it. */
function FactorMark({ factor }: { factor: AssumptionFactor | undefined }): ReactNode {
  const value = factor?.oneAtATime
  if (value === undefined || value === null)
    return <span className="w-16 text-right text-small text-soft">{factor ? 'not computable' : ''}</span>
  const size = Math.min(MOST_PX, Math.abs(Math.log(value)) * PX_PER_E_FOLD)
  const rises = value > 1
  return (
    <span className="w-16 text-right">
      <span className="number text-small">× {factorText(value)}</span>
      <svg aria-hidden="true" width="64" height="10" viewBox="0 0 64 10" className="block">
        <path d="M32 1v8" stroke="var(--faint)" />
        {size > 0.5 ? (
          <rect
            x={rises ? 32 : 32 - size}
            y="2.5"
            width={size}
            height="5"
            fill={rises ? 'var(--ember)' : 'none'}
            stroke="var(--ember)"
          />
        ) : null}
      </svg>
    </span>
  )
}

/** A factor with the digits that tell it from one. */
export function factorText(value: number): string {
  if (Math.abs(value - 1) < 5e-7) return '1'
  if (value >= 1e4 || value < 1e-3) return value.toExponential(2)
  return String(Number(value.toPrecision(Math.abs(value - 1) < 0.01 ? 5 : 4)))
}
