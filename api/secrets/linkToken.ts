import { createHash, randomBytes, randomUUID, timingSafeEqual } from 'node:crypto'

const SECRET_BYTES = 32
const ID_BYTES = 16
/** Base64url without padding of id and secret. */
const TOKEN = /^[A-Za-z0-9_-]{64}$/

export interface MintedToken {
  /** What finds the row. */
  id: string
  /** All that is kept of the secret. */
  secretHash: string
  /** What goes into the link: id and secret in one. */
  token: string
}

const hashOf = (secret: Buffer): string => createHash('sha256').update(secret).digest('hex')

/** A new token: 256 random bits beside the id they are found by. */
export function mintToken(): MintedToken {
  const id = randomUUID()
  const secret = randomBytes(SECRET_BYTES)
  const bytes = Buffer.concat([Buffer.from(id.replaceAll('-', ''), 'hex'), secret])
  return { id, secretHash: hashOf(secret), token: bytes.toString('base64url') }
}

export interface ShownToken {
  id: string
  /** Whether the secret is the one of this hash; takes the same time wherever they differ. */
  matches(secretHash: string): boolean
}

/** Reads what somebody shows as a token; null when it has not the form of one. */
export function readToken(text: string): ShownToken | null {
  if (!TOKEN.test(text)) return null
  const bytes = Buffer.from(text, 'base64url')
  const hex = bytes.subarray(0, ID_BYTES).toString('hex')
  const shown = Buffer.from(hashOf(bytes.subarray(ID_BYTES)), 'hex')
  return {
    id: hex.replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5'),
    matches: (secretHash) => timingSafeEqual(shown, Buffer.from(secretHash, 'hex')),
  }
}
