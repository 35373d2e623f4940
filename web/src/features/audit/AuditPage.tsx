import { useInfiniteQuery, useMutation } from '@tanstack/react-query'
import { useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'
import { auditQuery, wholeAudit } from '../../api/audit.ts'
import type { AuditFilter } from '../../api/audit.ts'
import { Button } from '../../components/ui/Button.tsx'
import { Field } from '../../components/ui/Field.tsx'
import { ErrorNotice } from '../../components/ui/Notice.tsx'
import { Select } from '../../components/ui/Select.tsx'
import { saveFile } from '../../lib/saveFile.ts'
import { ListPage } from '../records/ListPage.tsx'
import { AuditTable } from './AuditTable.tsx'
import { auditCsv } from './auditCsv.ts'
import { KINDS } from './actionWords.ts'

const DAY = /^\d{4}-\d{2}-\d{2}$/

/** The filter in the address; whole days, by the reader's own clock. */
function filterOf(search: URLSearchParams): AuditFilter {
  const kind = KINDS.find(({ value }) => value === search.get('kind'))?.value ?? ''
  const from = search.get('from') ?? ''
  const until = search.get('until') ?? ''
  const person = search.get('person')
  const dayAfter = new Date(`${until}T00:00`)
  if (DAY.test(until)) dayAfter.setDate(dayAfter.getDate() + 1)
  return {
    ...(kind === '' ? {} : { action: kind }),
    ...(person === null ? {} : { actorId: person }),
    ...(DAY.test(from) ? { from: new Date(`${from}T00:00`).toISOString() } : {}),
    ...(DAY.test(until) ? { until: dayAfter.toISOString() } : {}),
  }
}

/** Who did what to which record: for leads. */
export default function AuditPage() {
  const [search, setSearch] = useSearchParams()
  const filter = filterOf(search)
  const query = useInfiniteQuery(auditQuery(filter))
  const pages = query.data?.pages
  const entries = useMemo(() => pages?.flatMap((page) => page.items), [pages])
  const save = useMutation({
    mutationFn: () => wholeAudit(filter),
    onSuccess: (all) => saveFile(new Blob([auditCsv(all)], { type: 'text/csv' }), 'audit-log.csv'),
  })
  const set = (name: string, value: string): void => {
    const next = new URLSearchParams(search)
    if (value === '') next.delete(name)
    else next.set(name, value)
    setSearch(next, { replace: true })
  }
  const kind = KINDS.find(({ value }) => value === search.get('kind'))?.value ?? ''
  return (
    <ListPage
      title="Audit log"
      purpose="Who did what to which record, when and from where. Entries are added and never changed."
      action={
        <Button busy={save.isPending} onClick={() => save.mutate()}>
          Save as CSV
        </Button>
      }
      of={{ data: entries, error: query.error, refetch: query.refetch }}
      above={
        <div className="flex flex-wrap items-end gap-x-5">
          <Select label="Show" value={kind} options={KINDS} onChange={(value) => set('kind', value)} />
          <DayField label="From" value={search.get('from') ?? ''} onChange={(value) => set('from', value)} />
          <DayField
            label="Until"
            value={search.get('until') ?? ''}
            onChange={(value) => set('until', value)}
          />
          {search.get('person') === null ? null : (
            <p className="pb-3">
              <Button variant="link" onClick={() => set('person', '')}>
                Show everyone again
              </Button>
            </p>
          )}
          {save.error ? <ErrorNotice error={save.error} /> : null}
        </div>
      }
      emptyTitle="Nothing here"
      emptyStep={<p>No entry fits these filters.</p>}
    >
      {(rows) => <AuditTable entries={rows} more={query} onPerson={(id) => set('person', id)} />}
    </ListPage>
  )
}

function DayField({
  label,
  value,
  onChange,
}: {
  label: string
  value: string
  onChange: (value: string) => void
}) {
  return (
    <Field label={label}>
      {(control) => (
        <input
          {...control}
          type="date"
          className="input"
          value={value}
          onChange={(event) => onChange(event.target.value)}
        />
      )}
    </Field>
  )
}
