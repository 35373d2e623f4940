import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { CopyNum, Num } from '../../../../web/src/components/ui/Num.tsx'

const OMEGA = 0.11951785676836917

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

describe('a number on the page', () => {
  it('is set with its power of ten raised and its unit beside it', () => {
    const { container } = render(<Num value={2.2e-26} digits={2} unit="cm³/s" />)
    expect(container.textContent).toBe('2.2 × 10−26 cm³/s')
    expect(container.querySelector('sup')!.textContent).toBe('−26')
  })

  it('shows the digits asked for and copies all of them', async () => {
    const writeText = vi.fn(() => Promise.resolve())
    vi.stubGlobal('navigator', { clipboard: { writeText } })
    render(<CopyNum value={OMEGA} digits={4} />)
    const button = screen.getByRole('button', { name: `Copy ${OMEGA}` })
    expect(button.textContent).toBe('0.1195')
    fireEvent.click(button)
    expect(await screen.findByText('copied')).toBeDefined()
    expect(writeText).toHaveBeenCalledWith(String(OMEGA))
  })

  it.each([
    ['has no clipboard', {}],
    ['forbids it', { clipboard: { writeText: () => Promise.reject(new Error('NotAllowed')) } }],
  ])('stands written out in full when the browser %s', async (_why, navigator) => {
    vi.stubGlobal('navigator', navigator)
    render(<CopyNum value={OMEGA} digits={4} />)
    fireEvent.click(screen.getByRole('button'))
    expect((await screen.findByText(/select to copy/)).textContent).toContain(String(OMEGA))
  })
})
