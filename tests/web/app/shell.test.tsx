import { cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { openAt, standInServer, whereNow } from './session.ts'
import { queryClient } from '../../../web/src/app/queryClient.ts'
import { router } from '../../../web/src/app/router.tsx'
import { sessionQuery } from '../../../web/src/api/session.ts'

const pageIs = (name: string) => screen.findByRole('heading', { level: 1, name })
const ended = () => screen.queryByText('Your session has ended.')
const account = () => screen.getByRole('button', { name: /^Ines Aalto/ })

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

describe('the frame of the pages', () => {
  it('takes the focus along to a new page, and leaves it alone on the first', async () => {
    standInServer(true)
    await openAt('/histories')
    await pageIs('Histories')
    expect(document.activeElement).toBe(document.body)
    fireEvent.click(screen.getByRole('link', { name: 'Candidates' }))
    await pageIs('Candidates')
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('main')))
  })

  it('skips to the content without writing a fragment into the address', async () => {
    standInServer(true)
    await openAt('/histories')
    await pageIs('Histories')
    fireEvent.click(screen.getByRole('link', { name: 'Skip to content' }))
    expect(document.activeElement).toBe(screen.getByRole('main'))
    expect(router.state.location.hash).toBe('')
  })

  it('marks the page one is on', async () => {
    standInServer(true)
    await openAt('/candidates')
    await pageIs('Candidates')
    const pages = within(screen.getAllByRole('navigation', { name: 'Pages' })[0]!)
    expect(pages.getByRole('link', { current: 'page' }).textContent).toBe('Candidates')
  })

  it('says that an address leads nowhere, and where to go instead', async () => {
    standInServer(true)
    await openAt('/nowhere')
    expect(await screen.findByText('There is no page at this address')).toBeDefined()
    expect(screen.getByRole('link', { name: 'Go to the Bench' }).getAttribute('href')).toBe('/bench')
  })
})

describe('the account menu', () => {
  it('closes by Escape, which gives the focus back, and by a press elsewhere', async () => {
    standInServer(true)
    await openAt('/histories')
    fireEvent.click(await screen.findByRole('button', { name: /^Ines Aalto/ }))
    expect(screen.getByText(/author of Larch Valley group/)).toBeDefined()
    fireEvent.keyDown(document, { key: 'Escape' })
    expect(account().getAttribute('aria-expanded')).toBe('false')
    expect(document.activeElement).toBe(account())
    fireEvent.click(account())
    fireEvent.pointerDown(screen.getByRole('button', { name: 'Sign out' }))
    expect(account().getAttribute('aria-expanded')).toBe('true')
    fireEvent.pointerDown(screen.getByRole('main'))
    expect(account().getAttribute('aria-expanded')).toBe('false')
  })

  it('switches the theme and keeps the choice', async () => {
    standInServer(true)
    await openAt('/histories')
    fireEvent.click(await screen.findByRole('button', { name: /^Ines Aalto/ }))
    fireEvent.click(screen.getByRole('radio', { name: 'Night' }))
    expect(document.documentElement.dataset['theme']).toBe('night')
    expect(localStorage.getItem('emberline.theme')).toBe('night')
    fireEvent.click(screen.getByRole('radio', { name: 'Day' }))
    expect(document.documentElement.dataset['theme']).toBe('day')
  })
})

describe('a session that ends meanwhile', () => {
  it('is told above the page once the server refuses something, and the page stays', async () => {
    const server = standInServer(true)
    await openAt('/histories')
    await pageIs('Histories')
    server.signedIn = false
    fireEvent.click(screen.getByRole('link', { name: 'Evaluations' }))
    expect(await screen.findByText('Your session has ended.')).toBeDefined()
    expect(screen.getByRole('heading', { name: 'Evaluations' })).toBeDefined()
    fireEvent.click(screen.getByRole('button', { name: 'Sign in and go on' }))
    await waitFor(() => expect(whereNow()).toMatch(/^\/sign-in\?to=/))
  })

  it('is no longer told once one has signed in again in another tab', async () => {
    const server = standInServer(true)
    await openAt('/histories')
    await pageIs('Histories')
    server.signedIn = false
    await queryClient.invalidateQueries({ queryKey: sessionQuery.queryKey })
    await waitFor(() => expect(ended()).not.toBeNull())
    server.signedIn = true
    fireEvent.click(screen.getByRole('link', { name: 'Candidates' }))
    await pageIs('Candidates')
    await waitFor(() => expect(ended()).toBeNull())
  })
})
