import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { AssumptionFactor } from '#core/bench/types'
import type { AssumptionGroup, HistoryInput, HistoryRevision } from '#core/wire/index'
import { historiesQuery } from '../../api/records.ts'
import { ASSUMPTION_ORDER } from '../../lib/describe.tsx'
import { AssumptionCard } from './AssumptionCard.tsx'
import { equal } from './equal.ts'
import { RecordPicker, RevisionWords } from './RecordPicker.tsx'
import type { Chosen } from './revisions.ts'

interface HistoryPanelProps {
  chosen: Chosen<HistoryRevision>
  history: HistoryInput
  changed: boolean
  baseline: HistoryInput
  baselineName: string | null
  factors: readonly AssumptionFactor[]
  onPick: (recordId: string, number: number) => void
  onChange: (history: HistoryInput) => void
}

/** The history as a stack of assumptions. */
export function HistoryPanel({
  chosen,
  history,
  changed,
  baseline,
  baselineName,
  factors,
  onPick,
  onChange,
}: HistoryPanelProps) {
  const [open, setOpen] = useState<AssumptionGroup | null>(null)
  const { data: histories = [] } = useQuery(historiesQuery)
  const differing = ASSUMPTION_ORDER.filter((group) => !equal(history[group], baseline[group])).length
  return (
    <section aria-labelledby="history-title">
      <h2 id="history-title" className="sr-only">
        History
      </h2>
      <RecordPicker kind="history" chosen={chosen} records={histories} onPick={onPick} />
      <p className="pb-3 text-small text-soft">
        <RevisionWords kind="history" chosen={chosen} changed={changed} />
        {baselineName === null
          ? ' · the group has adopted no baseline'
          : differing === 0
            ? ` · as the baseline, ${baselineName}`
            : ` · ${differing} of ${ASSUMPTION_ORDER.length} differ from the baseline, ${baselineName}`}
      </p>
      <ul className="rows border-y border-rule">
        {ASSUMPTION_ORDER.map((group) => (
          <AssumptionCard
            key={`${chosen.revision.id} ${group}`}
            group={group}
            history={history}
            baseline={baseline}
            factor={factors.find((factor) => factor.group === group)}
            open={open === group}
            onToggle={() => setOpen(open === group ? null : group)}
            onChange={onChange}
          />
        ))}
      </ul>
      <p className="pt-1.5 text-caption text-soft">
        Each factor: the baseline with this line alone changed, over the baseline.
      </p>
    </section>
  )
}
