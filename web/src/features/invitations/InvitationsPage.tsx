import { useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { toast } from 'sonner'
import type { Invitation, Role } from '#core/wire/index'
import { invitationsQuery, invite, withdrawInvitation } from '../../api/account.ts'
import { sessionQuery } from '../../api/session.ts'
import { Button } from '../../components/ui/Button.tsx'
import { EmptyState, ErrorNotice } from '../../components/ui/Notice.tsx'
import { Select } from '../../components/ui/Select.tsx'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'
import { Loaded } from '../records/Loaded.tsx'
import { Moment } from '../records/Moment.tsx'
import { Page } from '../records/Page.tsx'
import { Section } from '../records/Section.tsx'

const ROLES = [
  { value: 'reader', label: 'reader: reads and computes' },
  { value: 'author', label: 'author: saves revisions and evaluations too' },
  { value: 'lead', label: 'lead: decides for the group' },
] as const satisfies readonly { value: Role; label: string }[]

/** For leads: who was invited into the group, and the way to invite. */
export default function InvitationsPage() {
  const { data: session } = useQuery(sessionQuery)
  if (session && session.role !== 'lead')
    return (
      <Page title="Invitations">
        <EmptyState title="Invitations are a lead’s to send">
          You are {session.role === 'author' ? 'an author' : 'a reader'} of {session.group.name}; ask a lead.
        </EmptyState>
      </Page>
    )
  return (
    <Page title="Invitations">
      <header>
        <h1>Invitations</h1>
        <p className="text-soft">Nobody comes into the group but by a link sent to their address.</p>
      </header>
      <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1fr)_minmax(0,2fr)]">
        <Section title="Invite">
          <InviteForm />
        </Section>
        <Section title="Sent">
          <InvitationList />
        </Section>
      </div>
    </Page>
  )
}

function InviteForm() {
  const [email, setEmail] = useState('')
  const [role, setRole] = useState<Role>('author')
  const task = useTask()
  const queries = useQueryClient()
  const send = async (): Promise<void> => {
    const sent = await invite(email, role)
    setEmail('')
    toast.success(`The invitation is on its way to ${sent.email}.`)
    await queries.invalidateQueries({ queryKey: invitationsQuery.queryKey })
  }
  return (
    <TaskForm task={task} fields={['email']} submitLabel="Send invitation" onSubmit={send}>
      <TextField
        label="E-mail"
        hint="The link works once and for seven days."
        type="email"
        autoComplete="off"
        fault={faultAt(task.error, 'email')}
        value={email}
        onChange={setEmail}
      />
      <Select label="Role" value={role} options={ROLES} onChange={setRole} />
    </TaskForm>
  )
}

function InvitationList() {
  const query = useQuery(invitationsQuery)
  const queries = useQueryClient()
  const task = useTask()
  const withdraw = ({ id, email }: Invitation): void =>
    task.run(async () => {
      await withdrawInvitation(id)
      await queries.invalidateQueries({ queryKey: invitationsQuery.queryKey })
      toast.success(`The invitation of ${email} is withdrawn.`)
    })
  return (
    <>
      {task.error ? <ErrorNotice error={task.error} /> : null}
      <Loaded of={query} what="invitations">
        {(invitations) =>
          invitations.length === 0 ? (
            <EmptyState title="Nobody was invited yet">
              Whom you invite stands here, until they come.
            </EmptyState>
          ) : (
            <ul className="rows">
              {invitations.map((invitation) => (
                <li key={invitation.id} className="grid gap-0.5 py-2.5">
                  <p className="flex flex-wrap items-baseline gap-x-3">
                    <span className="font-semibold break-all">{invitation.email}</span>
                    <span className="text-small">{invitation.role}</span>
                    <span className="text-small text-soft">{invitation.state}</span>
                    {invitation.state === 'open' ? (
                      <Button
                        variant="link"
                        className="ml-auto text-small"
                        disabled={task.busy}
                        aria-label={`Withdraw the invitation of ${invitation.email}`}
                        onClick={() => withdraw(invitation)}
                      >
                        Withdraw
                      </Button>
                    ) : null}
                  </p>
                  <p className="text-small text-soft">
                    by {invitation.invitedBy.name}, <Moment at={invitation.createdAt} />
                    {invitation.state === 'open' ? (
                      <>
                        , good until <Moment at={invitation.expiresAt} />
                      </>
                    ) : null}
                  </p>
                </li>
              ))}
            </ul>
          )
        }
      </Loaded>
    </>
  )
}
