import { InputError } from '#core/wire/index'
import { requireGoodPassword } from '#api/services/passwordPolicy'
import { describe, expect, it } from 'vitest'

const PERSONAL = ['hana.kowalczyk@larchvalley.example', 'Hana Kowalczyk', 'Larch Valley group']

function fault(password: string): string {
  try {
    requireGoodPassword(password, 'password', PERSONAL)
    return 'none'
  } catch (error) {
    if (error instanceof InputError) return error.faults[0]?.message ?? ''
    throw error
  }
}

describe('a password', () => {
  it.each([
    'seven quiet larches',
    'ünïcode pässwörd',
    '                x',
    'qzjx vkpw',
    '😀😃😄😁😆😅🤣😂',
    'x7'.repeat(3) + 'y6',
  ])('of any kind of characters will do: %s', (password) => expect(fault(password)).toBe('none'))

  it('has 8 characters at least, counted as people count', () => {
    expect(fault('kq7zv1p')).toContain('8 characters or more')
    expect(fault('😀😃😄😁😆😅🤣')).toContain('8 characters or more')
    expect(fault('kq7zv1pw')).toBe('none')
  })

  it('has 256 characters at most', () => {
    const long = Array.from({ length: 256 }, (_, index) => String.fromCharCode(97 + ((index * 7) % 26))).join(
      '',
    )
    expect(fault(long)).toBe('none')
    expect(fault(`${long}x`)).toContain('at most 256')
  })

  // From lists of passwords found in breaches; from memory.
  it.each(['password', 'Password123', 'qwertyuiop', 'iloveyou1', '1q2w3e4r', 'LETMEIN1', 'pass word'])(
    'is none of those tried first: %s',
    (password) => expect(fault(password)).not.toBe('none'),
  )

  it.each(['aaaaaaaa', 'abababab', 'xyzxyzxyz'])('is no repetition: %s', (password) =>
    expect(fault(password)).toContain('tried first'),
  )

  it.each([
    'kowalczyk',
    'Kowalczyk1987!',
    'larchvalley',
    'hana.kowalczyk@larchvalley.example',
    'emberline2026',
  ])('is no name of one’s own: %s', (password) =>
    expect(fault(password)).toContain('a name that belongs to you'),
  )
})
