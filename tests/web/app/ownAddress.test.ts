import { describe, expect, it } from 'vitest'
import { ownAddress, signInFor } from '../../../web/src/app/ownAddress.ts'

describe('the address to go on to after signing in', () => {
  it.each(['/evaluations', '/histories/5?revision=2', '/bench?window=1000,1e-4'])(
    'is %s when asked for',
    (to) => {
      expect(ownAddress(to)).toBe(to)
    },
  )

  it.each([
    null,
    '',
    'evaluations',
    'https://example.org',
    '//example.org',
    '/\\example.org',
    '/\t/example.org',
    '/.//example.org',
    '//',
    'javascript:alert(1)',
  ])('is the Bench when %j is asked for, which is no page of this product', (to) => {
    expect(ownAddress(to)).toBe('/bench')
  })

  it('is never the sign-in itself', () => {
    expect(ownAddress('/sign-in?to=/bench')).toBe('/bench')
  })

  it('comes through the sign-in unchanged', () => {
    const page = '/bench?history=a@1&candidate=b@2#there'
    const carried = new URL(signInFor(page), location.origin).searchParams.get('to')
    expect(carried).toBe(page)
  })
})
