import { describe, expect, it } from 'vitest'
import { LeastRecentlyUsed } from '#core/numerics/leastRecentlyUsed'

describe('a memo of the last values used', () => {
  it('makes a value once while it is held, and forgets the one unused for longest', () => {
    const made: string[] = []
    const memo = new LeastRecentlyUsed<string>(2)
    const get = (key: string): string =>
      memo.get(key, () => {
        made.push(key)
        return key.toUpperCase()
      })
    expect([get('a'), get('b'), get('a'), get('c'), get('a')]).toEqual(['A', 'B', 'A', 'C', 'A'])
    expect(made).toEqual(['a', 'b', 'c'])
    get('b')
    expect(made).toEqual(['a', 'b', 'c', 'b'])
  })
})
