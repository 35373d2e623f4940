import { SignJWT, decodeProtectedHeader, errors, jwtVerify } from 'jose'
import { SIGNING_ALGORITHM } from '../secrets/keyRing.ts'
import type { KeyRing } from '../secrets/keyRing.ts'

const ISSUER = 'emberline'

/** Signs the id of a session into a token, and reads it back. */
export interface SessionTokens {
  issue(sessionId: string, expiresAt: Date): Promise<string>
  /** The id of the session; null for a token that is forged, altered or past its time. */
  read(token: string): Promise<string | null>
}

function kidOf(token: string): string | undefined | null {
  try {
    return decodeProtectedHeader(token).kid
  } catch {
    return null
  }
}

export function sessionTokens(ring: KeyRing): SessionTokens {
  return {
    async issue(sessionId, expiresAt) {
      const { kid, key } = await ring.current()
      return new SignJWT({ sid: sessionId })
        .setProtectedHeader({ alg: SIGNING_ALGORITHM, kid })
        .setIssuer(ISSUER)
        .setIssuedAt()
        .setExpirationTime(expiresAt)
        .sign(key)
    },
    async read(token) {
      const kid = kidOf(token)
      if (kid === null || kid === undefined) return null
      // A database that is away is no forgery: that error goes on.
      const publicKeys = await ring.publicKeys(kid)
      try {
        const options = { algorithms: [SIGNING_ALGORITHM], issuer: ISSUER }
        const { payload } = await jwtVerify(token, publicKeys, options)
        return typeof payload['sid'] === 'string' ? payload['sid'] : null
      } catch (error) {
        if (error instanceof errors.JOSEError) return null
        throw error
      }
    },
  }
}
