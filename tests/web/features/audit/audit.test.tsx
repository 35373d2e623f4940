import { cleanup, fireEvent, screen, waitFor } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import type { AuditEntry } from '#core/wire/index'
import AuditPage from '../../../../web/src/features/audit/AuditPage.tsx'
import { auditCsv } from '../../../../web/src/features/audit/auditCsv.ts'
import { renderPage, serve, uuid } from '../records/support.tsx'

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const entry = (id: number, over: Partial<AuditEntry> = {}): AuditEntry => ({
  id: uuid(id),
  createdAt: `2026-03-0${id}T09:00:00Z`,
  actor: { id: uuid(900), name: 'Ines Aalto' },
  apiKeyId: null,
  action: 'history.revise',
  subjectId: uuid(100),
  detail: { name: 'Standard', revision: 2 },
  fromAddress: '192.0.2.4',
  fromAgent: 'a browser',
  requestId: uuid(70),
  ...over,
})

const show = () => renderPage(AuditPage, '/audit', '/audit')

describe('the audit log', () => {
  it('says in words who did what to which record', async () => {
    serve({
      '/audit': {
        body: {
          items: [
            entry(1),
            entry(2, { actor: { id: uuid(901), name: null }, action: 'key.revoke', apiKeyId: null }),
            entry(3, { actor: null, action: 'something.new', subjectId: null, detail: {} }),
          ],
          next: null,
        },
      },
    })
    show()
    const link = await screen.findByRole('link', { name: 'Standard, revision 2' })
    expect(link.getAttribute('href')).toBe(`/histories/${uuid(100)}`)
    expect(link.closest('tr')!.textContent).toContain('revised a history')
    expect(screen.getByText('former member').closest('tr')!.textContent).toContain('revoked an API key')
    expect(screen.getByText('Emberline').closest('tr')!.textContent).toContain('something.new')
  })

  it('asks the server for one kind, one person and whole days, and keeps that in the address', async () => {
    const fetched = serve({ '/audit': { body: { items: [entry(1)], next: null } } })
    show()
    await screen.findByText('revised a history')
    fireEvent.change(screen.getByLabelText('Show'), { target: { value: 'history' } })
    fireEvent.change(screen.getByLabelText('Until'), { target: { value: '2026-03-01' } })
    const asked = () => new URL(fetched.mock.lastCall![0] as string, 'http://here').searchParams
    await waitFor(() => expect(asked().get('until')).not.toBeNull())
    expect(asked().get('action')).toBe('history')
    expect(asked().get('until')).toBe(new Date('2026-03-02T00:00').toISOString())
    fireEvent.click(await screen.findByRole('button', { name: 'Ines Aalto' }))
    await waitFor(() => expect(asked().get('actorId')).toBe(uuid(900)))
  })

  it('is written as a table with every field', () => {
    const [head, row] = auditCsv([entry(1, { fromAgent: '=cmd' })]).split('\r\n')
    expect(head).toContain('time (UTC),person')
    expect(row).toBe(
      `2026-03-01T09:00:00Z,Ines Aalto,${uuid(900)},,history.revise,${uuid(100)},"{""name"":""Standard"",""revision"":2}",192.0.2.4,'=cmd,${uuid(70)}`,
    )
  })
})
