import { createHash, randomBytes } from 'node:crypto'

/** How many are handed out at a time. */
export const RECOVERY_CODES = 10
const LENGTH = 16
/** Thirty-two signs without i, l, o and u, which look like others: five bits each. */
const SIGNS = '0123456789abcdefghjkmnpqrstvwxyz'

/** A new code of 80 random bits, in groups of four to be copied by hand. */
export function newRecoveryCode(): string {
  const signs = [...randomBytes(LENGTH)].map((byte) => SIGNS.charAt(byte % SIGNS.length))
  return signs.join('').replaceAll(/(.{4})(?=.)/g, '$1-')
}

const bare = (code: string): string => code.toLowerCase().replaceAll(/[\s-]/g, '')

/** Whether a text has the form of one, however it was typed. */
export const isRecoveryCode = (code: string): boolean => bare(code).length === LENGTH

export const hashOfRecoveryCode = (code: string): string =>
  createHash('sha256').update(bare(code)).digest('hex')
