/** What revisions say, in words and in numbers. */
import type { CandidateInput, HistoryInput } from '#core/wire/index'
import {
  ASSUMPTION_ORDER,
  ASSUMPTION_TITLES,
  describeAssumption,
  describeCandidate,
  MECHANISM_TITLES,
} from '../../lib/describe.tsx'
import { fieldsOf } from './fields.ts'
import { FieldTable } from './FieldTable.tsx'

/** Paths begin with `root` when one is given: `history.bath.treatment`. */
export function HistoryInputs({ input, root = '' }: { input: HistoryInput; root?: string }) {
  return (
    <div className="rows">
      {ASSUMPTION_ORDER.map((group) => (
        <div key={group} className="grid gap-1 py-2.5">
          <h3 className="font-sans text-small text-soft">{ASSUMPTION_TITLES[group]}</h3>
          <p>{describeAssumption(group, input)}</p>
          <FieldTable
            caption={`${ASSUMPTION_TITLES[group]}, field by field`}
            fields={fieldsOf(input[group], root + group)}
          />
        </div>
      ))}
    </div>
  )
}

export function CandidateInputs({ input, root = '' }: { input: CandidateInput; root?: string }) {
  return (
    <div className="grid gap-1 py-2.5">
      <h3 className="font-sans text-small text-soft">{MECHANISM_TITLES[input.mechanism]}</h3>
      <p>{describeCandidate(input)}</p>
      <FieldTable
        caption="Candidate, field by field"
        fields={fieldsOf(input).map(({ path, value }) => ({ path: root + path, value }))}
      />
    </div>
  )
}
