import { Field } from '../../components/ui/Field.tsx'
import type { Chosen } from './revisions.ts'
import type { SaveAs } from './useSave.ts'

interface SaveAsChoiceProps {
  what: 'History' | 'Candidate'
  chosen: Chosen<{ number: number }>
  value: SaveAs
  onChange: (value: SaveAs) => void
}

/** The next revision of its record, or a record of its own. */
export function SaveAsChoice({ what, chosen, value, onChange }: SaveAsChoiceProps) {
  const { name, newest, revision } = chosen
  const from = revision.number === newest.number ? '' : `, made from revision ${revision.number}`
  return (
    <fieldset className="grid gap-1 border-t border-rule pt-2">
      <legend className="text-small font-semibold">{what}</legend>
      <label className="flex gap-2">
        <input
          type="radio"
          name={what}
          checked={value.as === 'revision'}
          onChange={() => onChange({ as: 'revision', parentId: newest.id })}
          className="accent-[var(--ember)]"
        />
        Revision {newest.number + 1} of “{name}”{from}
      </label>
      <label className="flex gap-2">
        <input
          type="radio"
          name={what}
          checked={value.as === 'new'}
          onChange={() => onChange({ as: 'new', name: `${name}, changed`.slice(0, 120) })}
          className="accent-[var(--ember)]"
        />
        A record of its own
      </label>
      {value.as === 'new' ? (
        <Field label={`Name of the new ${what.toLowerCase()}`}>
          {(control) => (
            <input
              {...control}
              className="input"
              required
              maxLength={120}
              value={value.name}
              onChange={(event) => onChange({ as: 'new', name: event.target.value })}
            />
          )}
        </Field>
      ) : null}
    </fieldset>
  )
}
