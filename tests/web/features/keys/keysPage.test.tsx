import { cleanup, fireEvent, screen, within } from '@testing-library/react'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { ApiKey, Role } from '#core/wire/index'
import KeysPage from '../../../../web/src/features/keys/KeysPage.tsx'
import { keyState } from '../../../../web/src/features/keys/keyState.ts'
import { renderPage, serve, sessionOf, uuid } from '../records/support.tsx'

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const key = (id: number, over: Partial<ApiKey> = {}): ApiKey => ({
  id: uuid(id),
  owner: { id: uuid(900), name: 'Ines Aalto' },
  name: `key ${id}`,
  scope: 'read',
  beginning: 'ember_Ab12',
  createdAt: '2026-03-01T09:00:00Z',
  expiresAt: '2999-01-01T00:00:00Z',
  lastUsedAt: null,
  revokedAt: null,
  ...over,
})

const as = (role: Role) => ({ body: { ...sessionOf(null), role } })
const show = () => renderPage(KeysPage, '/keys', '/keys')

describe('the page of API keys', () => {
  beforeEach(() => {
    serve({
      '/keys?of=me': {
        body: {
          items: [
            key(1),
            key(2, { revokedAt: '2026-03-02T00:00:00Z' }),
            key(3, { expiresAt: '2026-01-01T00:00:00Z' }),
          ],
        },
      },
      '/session': as('author'),
    })
  })

  it('tells which keys are in force and offers to revoke those alone', async () => {
    show()
    const row = async (name: string) => (await screen.findByText(name)).closest('tr')!
    expect(within(await row('key 1')).getByRole('button', { name: 'Revoke key 1' })).toBeDefined()
    expect((await row('key 2')).textContent).toContain('revoked')
    expect((await row('key 3')).textContent).toContain('expired')
    expect(screen.getAllByRole('button', { name: /^Revoke/ })).toHaveLength(1)
  })

  it('asks before it revokes, for that cannot be undone', async () => {
    show()
    fireEvent.click(await screen.findByRole('button', { name: 'Revoke key 1' }))
    expect(screen.getByRole('dialog').textContent).toContain('cannot be undone')
    fireEvent.click(screen.getByRole('button', { name: 'Keep it' }))
    expect(screen.queryByRole('dialog')).toBeNull()
  })

  it('offers a lead everyone’s keys, and others their own alone', async () => {
    show()
    await screen.findByText('key 1')
    expect(screen.queryByLabelText('Everyone’s')).toBeNull()
    cleanup()
    serve({
      '/keys?of=me': { body: { items: [] } },
      '/keys?of=group': { body: { items: [key(7, { owner: { id: uuid(5), name: 'Someone Else' } })] } },
      '/session': as('lead'),
    })
    show()
    expect(await screen.findByText('No key yet')).toBeDefined()
    fireEvent.click(await screen.findByLabelText('Everyone’s'))
    expect(await screen.findByText('Someone Else')).toBeDefined()
  })

  it('offers a reader no key that saves', async () => {
    serve({ '/keys?of=me': { body: { items: [] } }, '/session': as('reader') })
    show()
    await screen.findByText('No key yet')
    fireEvent.click(screen.getByRole('button', { name: 'New key' }))
    const choices = within(screen.getByLabelText('It may')).getAllByRole('option')
    expect(choices.map(({ textContent }) => textContent)).toEqual(['read', 'compute'])
  })
})

describe('the state of a key', () => {
  it('is judged by the clock at the moment it expires', () => {
    const at = Date.parse('2026-05-05T12:00:00Z')
    const expiring = key(1, { expiresAt: '2026-05-05T12:00:00Z' })
    expect(keyState(expiring, at - 1)).toBe('in force')
    expect(keyState(expiring, at)).toBe('expired')
  })
})
