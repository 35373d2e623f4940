import { useMemo, useState } from 'react'
import type { BathRow } from '#core/wire/index'
import { Field } from '../../../components/ui/Field.tsx'
import { Select } from '../../../components/ui/Select.tsx'
import { useFaultWithin } from '../faults.tsx'
import { bathTableText, columnsOf, readBathTable, recalled } from './bathTable.ts'

const SINGLE_COLUMN = [
  { value: 'gS', label: 'g_s; g_ρ follows from dρ = T ds' },
  { value: 'gRho', label: 'g_ρ; g_s follows from dρ = T ds' },
] as const

/** A table of the whole bath, pasted. */
export function BathTableField({
  path,
  value,
  onChange,
}: {
  path: string
  value: BathRow[]
  onChange: (rows: BathRow[]) => void
}) {
  const [typed, setTyped] = useState<{ text: string; rows: BathRow[] | null } | null>(null)
  const columns = columnsOf(value)
  const single = columns.length === 1 ? columns[0]! : 'gS'
  // The text counts only while it stands for the rows shown: undo or reset replace it.
  const text = typed !== null && (typed.rows === null || typed.rows === value) ? typed.text : null
  const shown = useMemo(() => text ?? bathTableText(value), [text, value])
  const fault = useFaultWithin(path)
  const read = useMemo(() => (text === null ? null : readBathTable(text, single)), [text, single])
  return (
    <>
      <Field
        label="Rows of T in GeV with g_ρ, g_s or both"
        hint="Pasted columns do, with or without their names; lines that begin with # are left out. From at most 0.1 to at least 1 GeV, no step of T above a factor of ten; outside the rows ideal gases go on."
        fault={read && 'message' in read ? read.message : fault}
      >
        {(control) => (
          <textarea
            {...control}
            className="input min-h-40 font-mono text-small"
            spellCheck={false}
            value={shown}
            onChange={(event) => {
              const result = readBathTable(event.target.value, single)
              const rows = 'rows' in result ? result.rows : null
              setTyped({ text: event.target.value, rows })
              if (rows) onChange(rows)
            }}
          />
        )}
      </Field>
      {columns.length === 1 ? (
        <Select
          label="The column beside T"
          value={single}
          options={SINGLE_COLUMN}
          onChange={(column) => onChange(recalled(value, column))}
        />
      ) : null}
    </>
  )
}
