import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { FormEvent } from 'react'
import type { GuestLink, GuestLinkKind } from '#core/wire/index'
import { createGuestLink, guestLinksQuery, revokeGuestLink } from '../../api/guestLinks.ts'
import { sessionQuery } from '../../api/session.ts'
import { Button } from '../../components/ui/Button.tsx'
import { Dialog } from '../../components/ui/Dialog.tsx'
import { Field } from '../../components/ui/Field.tsx'
import { ErrorNotice } from '../../components/ui/Notice.tsx'
import { Select } from '../../components/ui/Select.tsx'
import { useCopy } from '../../components/ui/useCopy.ts'
import { Loaded } from '../records/Loaded.tsx'
import { Moment } from '../records/Moment.tsx'

interface Subject {
  kind: GuestLinkKind
  subjectId: string
  /** What is shown, as in “this evaluation”. */
  what: string
}

/** Who outside the group can see one thing, and the way to let them or no longer. */
export function GuestLinks(subject: Subject) {
  const { data: session } = useQuery(sessionQuery)
  const links = useQuery(guestLinksQuery(subject.subjectId))
  const [asking, setAsking] = useState(false)
  const mayMake = session?.role === 'lead' || session?.role === 'author'
  return (
    <div className="grid justify-items-start gap-2">
      <Loaded of={links} what="guest links">
        {(all) =>
          all.length === 0 ? (
            <p className="text-soft">
              None. A guest link shows {subject.what} and nothing else of the group.
            </p>
          ) : (
            <ul className="rows w-full">
              {all.map((link) => (
                <LinkLine
                  key={link.id}
                  link={link}
                  mayRevoke={session?.role === 'lead' || (mayMake && link.createdBy.id === session?.user.id)}
                />
              ))}
            </ul>
          )
        }
      </Loaded>
      {mayMake ? <Button onClick={() => setAsking(true)}>New guest link</Button> : null}
      {asking ? <NewLink subject={subject} onClose={() => setAsking(false)} /> : null}
    </div>
  )
}

const isOver = (link: GuestLink, now: number): boolean =>
  link.revokedAt !== null || (link.expiresAt !== null && Date.parse(link.expiresAt) <= now)

function LinkLine({ link, mayRevoke }: { link: GuestLink; mayRevoke: boolean }) {
  const queries = useQueryClient()
  const [now] = useState(() => Date.now())
  const revoke = useMutation({
    mutationFn: () => revokeGuestLink(link.id),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['guest-links'] }),
  })
  const over = isOver(link, now)
  return (
    <li className="grid gap-0.5 py-2 text-small">
      <p className="flex flex-wrap items-baseline gap-x-3">
        <span className={over ? 'text-soft line-through' : 'font-semibold'}>
          {link.note === '' ? 'without a note' : link.note}
        </span>
        {over ? (
          <span className="text-soft">{link.revokedAt === null ? 'expired' : 'revoked'}</span>
        ) : mayRevoke ? (
          <Button
            variant="link"
            busy={revoke.isPending}
            aria-label={`Revoke the link ${link.note}`}
            onClick={() => revoke.mutate()}
          >
            revoke
          </Button>
        ) : null}
      </p>
      <p className="text-soft">
        {link.createdBy.name}, <Moment at={link.createdAt} />;{' '}
        {link.expiresAt === null ? (
          'does not expire'
        ) : (
          <>
            until <Moment at={link.expiresAt} />
          </>
        )}
        ;{' '}
        {link.lastUsedAt === null ? (
          'never opened'
        ) : (
          <>
            last opened <Moment at={link.lastUsedAt} />
          </>
        )}
      </p>
      {revoke.error ? <ErrorNotice error={revoke.error} /> : null}
    </li>
  )
}

const TIMES = [
  { value: '7', label: 'a week' },
  { value: '90', label: '90 days' },
  { value: '366', label: 'a year' },
  { value: 'never', label: 'without end' },
] as const

function NewLink({ subject, onClose }: { subject: Subject; onClose: () => void }) {
  const [note, setNote] = useState('')
  const [days, setDays] = useState<(typeof TIMES)[number]['value']>('90')
  const queries = useQueryClient()
  const make = useMutation({
    mutationFn: () =>
      createGuestLink({
        kind: subject.kind,
        subjectId: subject.subjectId,
        note,
        days: days === 'never' ? null : Number(days),
      }),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['guest-links'] }),
  })
  const submit = (event: FormEvent): void => {
    event.preventDefault()
    make.mutate()
  }
  const close = (open: boolean): void => {
    if (!open) onClose()
  }
  if (make.data)
    return (
      <Dialog
        open
        onOpenChange={close}
        title="Copy the link now"
        description="It is not kept here and cannot be shown again. Whoever has it sees this one thing."
      >
        <NewAddress address={`${location.origin}/guest#${make.data.token}`} />
        <div className="flex justify-end">
          <Button variant="primary" onClick={onClose}>
            I have it
          </Button>
        </div>
      </Dialog>
    )
  return (
    <Dialog
      open
      onOpenChange={close}
      title="New guest link"
      description={`Shows ${subject.what} to whoever has the link: to read, to recompute and to take the evidence, without signing in.`}
    >
      <form onSubmit={submit} className="grid gap-1">
        <Field label="Whom it is for" hint="Such as “referee of the letter”. Guests do not see it.">
          {(control) => (
            <input
              {...control}
              className="input"
              maxLength={200}
              autoComplete="off"
              value={note}
              onChange={(event) => setNote(event.target.value)}
            />
          )}
        </Field>
        <Select label="It opens for" value={days} options={TIMES} onChange={setDays} />
        {make.error ? <ErrorNotice error={make.error} /> : null}
        <div className="flex justify-end gap-2 pt-2">
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" busy={make.isPending}>
            Make the link
          </Button>
        </div>
      </form>
    </Dialog>
  )
}

function NewAddress({ address }: { address: string }) {
  const [state, copy] = useCopy()
  return (
    <>
      <p className="rounded border border-rule bg-raised p-3">
        <code className="font-mono text-small break-all select-all">{address}</code>
      </p>
      <p className="flex flex-wrap items-baseline gap-3">
        <Button onClick={() => void copy(address)}>Copy the link</Button>
        <span role="status" className="text-small text-soft">
          {state === 'copied' ? 'Copied.' : ''}
          {state === 'refused' ? 'The browser does not let this page copy: select it instead.' : ''}
        </span>
      </p>
    </>
  )
}
