import { cleanup, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it } from 'vitest'
import { ErrorNotice } from '../../../../web/src/components/ui/Notice.tsx'
import { ApiProblem } from '../../../../web/src/lib/apiProblem.ts'

const problem = (over: object): ApiProblem =>
  new ApiProblem({
    type: 'urn:emberline:problem:internal',
    title: 'Something went wrong on the server',
    status: 500,
    instance: 'request-1',
    ...over,
  })

const words = (): string => screen.getByRole('alert').textContent

afterEach(cleanup)

describe('the notice of an error', () => {
  it('names the request when the server itself failed, for whoever reads its log', () => {
    render(<ErrorNotice error={problem({})} />)
    expect(words()).toContain('Request request-1')
  })

  it('leaves the request out when the person can mend it', () => {
    render(<ErrorNotice error={problem({ status: 422, title: 'The input is at fault' })} />)
    expect(words()).toContain('The input is at fault')
    expect(words()).not.toContain('request-1')
  })

  it('lists every fault by its path', () => {
    const faults = [
      { path: 'candidate.massGeV', message: 'allowed: above 0' },
      { path: '', message: 'allowed: an object' },
    ]
    render(<ErrorNotice error={problem({ status: 422, faults })} />)
    expect(words()).toContain('candidate.massGeV: allowed: above 0')
    expect(words()).toContain('input: allowed: an object')
  })

  it('opens the sign-in beside a page whose session has ended, so that nothing on it is lost', () => {
    const type = 'urn:emberline:problem:not-signed-in'
    render(<ErrorNotice error={problem({ type, status: 401, title: 'Nobody is signed in' })} />)
    const link = screen.getByRole('link', { name: 'Sign in in another tab' })
    expect(link.getAttribute('href')).toBe('/sign-in')
    expect(link.getAttribute('target')).toBe('_blank')
  })
})
