import { cleanup, fireEvent, screen } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import EvaluationsPage from '../../../../web/src/features/evaluations/EvaluationsPage.tsx'
import { evaluationOf, renderPage, serve, uuid } from '../records/support.tsx'

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

const show = () => renderPage(EvaluationsPage, '/evaluations', '/evaluations')

describe('the list of evaluations', () => {
  it('tells the number, how it stands, and which revisions it came from', async () => {
    serve({ '/evaluations': { body: { items: [evaluationOf(1)], next: null } } })
    show()
    const link = await screen.findByRole('link', { name: '0.1205' })
    expect(link.getAttribute('href')).toBe(`/evaluations/${uuid(1)}`)
    const cells = [...link.closest('tr')!.cells].map((cell) => cell.textContent)
    expect(cells.slice(1, 5)).toEqual([
      '0.42 % above, 0.42 σ',
      'Standard@1',
      'Thermal fermion@1',
      'Ines Aalto',
    ])
    expect(cells.at(-1)).toBe('0')
    expect(screen.queryByRole('button', { name: 'Load older evaluations' })).toBeNull()
  })

  it('reads older ones when told to, until there are none', async () => {
    serve({
      '/evaluations?limit=50': { body: { items: [evaluationOf(1)], next: 'older' } },
      '/evaluations?limit=50&cursor=older': {
        body: { items: [evaluationOf(2, { omegaH2: 5.5 })], next: null },
      },
    })
    show()
    fireEvent.click(await screen.findByRole('button', { name: 'Load older evaluations' }))
    expect(await screen.findByRole('link', { name: '5.5' })).toBeDefined()
    expect(screen.getByRole('link', { name: '0.1205' })).toBeDefined()
    expect(screen.queryByRole('button', { name: 'Load older evaluations' })).toBeNull()
  })

  it('keeps what it shows when older ones cannot be read', async () => {
    serve({ '/evaluations?limit=50': { body: { items: [evaluationOf(1)], next: 'older' } } })
    show()
    fireEvent.click(await screen.findByRole('button', { name: 'Load older evaluations' }))
    expect(await screen.findByRole('alert')).toBeDefined()
    expect(screen.getByRole('link', { name: '0.1205' })).toBeDefined()
  })
})
