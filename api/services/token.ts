import { SignJWT, jwtVerify } from 'jose'

const ISSUER = 'emberline'

/** Signs the id of a session into a token, and reads it back. */
export interface SessionTokens {
  issue(sessionId: string, expiresAt: Date): Promise<string>
  /** The id of the session; null for a token that is forged, altered or past its time. */
  read(token: string): Promise<string | null>
}

export function sessionTokens(secret: string): SessionTokens {
  const key = new TextEncoder().encode(secret)
  return {
    issue: (sessionId, expiresAt) =>
      new SignJWT({ sid: sessionId })
        .setProtectedHeader({ alg: 'HS256' })
        .setIssuer(ISSUER)
        .setIssuedAt()
        .setExpirationTime(expiresAt)
        .sign(key),
    async read(token) {
      try {
        const { payload } = await jwtVerify(token, key, { algorithms: ['HS256'], issuer: ISSUER })
        return typeof payload['sid'] === 'string' ? payload['sid'] : null
      } catch {
        return null
      }
    },
  }
}
