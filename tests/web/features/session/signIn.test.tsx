import { cleanup, fireEvent, screen, waitFor } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { openAt, standInServer, whereNow } from '../../app/session.ts'

const typeIn = (label: string, text: string): void => {
  fireEvent.change(screen.getByLabelText(label), { target: { value: text } })
}
const press = (name: string): void => {
  fireEvent.click(screen.getByRole('button', { name }))
}

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

describe('signing in', () => {
  it('is asked of a stranger, and leads to the page they wanted', async () => {
    standInServer(false)
    await openAt('/evaluations?from=afar')
    await screen.findByRole('heading', { name: 'Sign in' })
    expect(whereNow()).toBe('/sign-in?to=%2Fevaluations%3Ffrom%3Dafar')
    typeIn('E-mail', 'ines@example.org')
    typeIn('Password', 'seven quiet larches')
    press('Sign in')
    expect(await screen.findByRole('heading', { name: 'Evaluations' })).toBeDefined()
    expect(whereNow()).toBe('/evaluations?from=afar')
  })

  it('is one press for the people of a demo group', async () => {
    standInServer(false)
    await openAt('/sign-in?to=/histories')
    fireEvent.click(await screen.findByRole('button', { name: 'Ines Aalto' }))
    expect(await screen.findByRole('heading', { name: 'Histories' })).toBeDefined()
  })

  it('says what is wrong with the credentials, keeps what was typed, and can be tried again', async () => {
    standInServer(false)
    await openAt('/sign-in')
    await screen.findByRole('heading', { name: 'Sign in' })
    typeIn('E-mail', 'ines@example.org')
    typeIn('Password', 'wrong')
    press('Sign in')
    const alert = await screen.findByRole('alert')
    expect(alert.textContent).toContain('E-mail address and password do not go together')
    expect(alert.textContent).not.toContain('another tab')
    expect(screen.getByLabelText<HTMLInputElement>('E-mail').value).toBe('ines@example.org')
    expect(screen.getByLabelText<HTMLInputElement>('Password').value).toBe('wrong')
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Sign in' }).disabled).toBe(false)
  })

  it('says so when the server cannot be reached', async () => {
    const server = standInServer(false)
    await openAt('/sign-in')
    await screen.findByRole('button', { name: 'Ines Aalto' })
    server.away = true
    press('Ines Aalto')
    expect((await screen.findByRole('alert')).textContent).toContain('The server could not be reached.')
  })
})

describe('signing out', () => {
  const signOut = async (): Promise<void> => {
    fireEvent.click(await screen.findByRole('button', { name: /^Ines Aalto/ }))
    press('Sign out')
  }

  it('ends at the sign-in, and the pages are closed again', async () => {
    const server = standInServer(true)
    await openAt('/histories')
    await signOut()
    await waitFor(() => expect(whereNow()).toBe('/sign-in'))
    expect(server.signedIn).toBe(false)
  })

  it('says so when it fails, and that one is still signed in', async () => {
    const server = standInServer(true)
    await openAt('/histories')
    await screen.findByRole('heading', { name: 'Histories' })
    server.away = true
    await signOut()
    const alert = await screen.findByRole('alert')
    expect(alert.textContent).toContain('The server could not be reached.')
    expect(alert.textContent).toContain('You are still signed in.')
    expect(whereNow()).toBe('/histories')
  })
})
