import { createHash, randomUUID } from 'node:crypto'
import { SignJWT, jwtVerify } from 'jose'

/** A browser that somebody has signed in with, and the accounts it was. */
export interface KnownDevice {
  id: string
  knows(email: string): boolean
}

/** Remembers browsers by a signed cookie, so that a stranger's guesses do not lock them out. It opens nothing. */
export interface KnownDevices {
  read(token: string | null): Promise<KnownDevice | null>
  /** The token to keep after signing in: of the same device, now knowing this account too. */
  remember(token: string | null, email: string): Promise<string>
}

export const DEVICE_LIFETIME_DAYS = 365
const ACCOUNTS_KEPT = 5
const AUDIENCE = 'known device'

const markOf = (email: string): string =>
  createHash('sha256').update(email.toLowerCase()).digest('base64url').slice(0, 22)

interface Contents {
  id: string
  marks: string[]
}

export function knownDevices(secret: string): KnownDevices {
  const key = new TextEncoder().encode(secret)
  const contentsOf = async (token: string | null): Promise<Contents | null> => {
    if (token === null) return null
    try {
      const { payload } = await jwtVerify(token, key, { algorithms: ['HS256'], audience: AUDIENCE })
      const { did, marks } = payload
      return typeof did === 'string' && Array.isArray(marks) ? { id: did, marks: marks.map(String) } : null
    } catch {
      return null
    }
  }
  return {
    async read(token) {
      const contents = await contentsOf(token)
      if (contents === null) return null
      return { id: contents.id, knows: (email) => contents.marks.includes(markOf(email)) }
    },
    async remember(token, email) {
      const { id, marks } = (await contentsOf(token)) ?? { id: randomUUID(), marks: [] }
      const mark = markOf(email)
      const kept = [mark, ...marks.filter((other) => other !== mark)].slice(0, ACCOUNTS_KEPT)
      return new SignJWT({ did: id, marks: kept })
        .setProtectedHeader({ alg: 'HS256' })
        .setAudience(AUDIENCE)
        .setExpirationTime(`${DEVICE_LIFETIME_DAYS}d`)
        .sign(key)
    },
  }
}
