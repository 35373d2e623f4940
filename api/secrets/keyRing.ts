import type { Database } from '#db/database'
import { addSigningKey, listSigningKeys } from '#db/queries/signingKeys'
import type { StoredSigningKey } from '#db/queries/signingKeys'
import { calculateJwkThumbprint, createLocalJWKSet, exportJWK, generateKeyPair, importJWK } from 'jose'
import type { CryptoKey, JWK, JWTVerifyGetKey } from 'jose'
import type { Sealer } from './sealer.ts'

export const SIGNING_ALGORITHM = 'EdDSA'
/** A key signs for this long, then the next does. */
const ROTATION_DAYS = 30
/** And is believed until what it signed has run out: a session lasts fourteen days. */
const BELIEVED_DAYS = 45
/** How long another server's new key may go unnoticed here; an unknown one is looked for at once. */
const FRESH_MS = 60_000
/** But not for every forged token anew. */
const LOOK_AGAIN_MS = 2_000
const DAY_MS = 86_400_000

const ageDays = (at: Date): number => (Date.now() - at.getTime()) / DAY_MS

interface Keys {
  /** What signs now. */
  kid: string
  signingKey: CryptoKey
  /** Picks the public key a token names, among those believed (a JWK set, RFC 7517). */
  publicKey: JWTVerifyGetKey
  kids: ReadonlySet<string>
  readAt: number
}

/** The keys that sign sessions, kept in the database for all servers and replaced by the calendar. */
export interface KeyRing {
  current(): Promise<{ kid: string; key: CryptoKey }>
  /** Knows the key of this id if any server of ours has made it. */
  publicKeys(kid: string | undefined): Promise<JWTVerifyGetKey>
}

async function makeKey(db: Database, sealer: Sealer, newestSeen: string | null): Promise<void> {
  const { privateKey } = await generateKeyPair(SIGNING_ALGORITHM, { extractable: true })
  const jwk = await exportJWK(privateKey)
  const kid = await calculateJwkThumbprint(jwk)
  await addSigningKey(db, { kid, sealedJwk: await sealer.seal(JSON.stringify(jwk)) }, newestSeen)
}

interface Opened {
  kid: string
  jwk: JWK
  createdAt: Date
}

/** A key sealed by a secret that was replaced since is as good as none: whoever it signed in signs in again. */
async function openAll(stored: readonly StoredSigningKey[], sealer: Sealer): Promise<Opened[]> {
  const opened = await Promise.all(
    stored.map(async ({ kid, sealedJwk, createdAt }) => {
      const text = await sealer.open(sealedJwk).catch(() => null)
      return text === null ? [] : [{ kid, jwk: JSON.parse(text) as JWK, createdAt }]
    }),
  )
  return opened.flat()
}

const publicPart = ({ kid, jwk: { kty, crv, x } }: Opened): JWK =>
  ({ kid, kty, crv, x, alg: SIGNING_ALGORITHM, use: 'sig' }) as JWK

async function keysFrom(opened: readonly Opened[]): Promise<Keys> {
  const [newest] = opened
  if (newest === undefined) throw new Error('there is no key to sign sessions with')
  return {
    kid: newest.kid,
    signingKey: (await importJWK(newest.jwk, SIGNING_ALGORITHM)) as CryptoKey,
    publicKey: createLocalJWKSet({ keys: opened.map(publicPart) }),
    kids: new Set(opened.map(({ kid }) => kid)),
    readAt: Date.now(),
  }
}

export function keyRing(db: Database, sealer: Sealer): KeyRing {
  let keys: Promise<Keys> | undefined

  const read = async () => {
    const stored = await listSigningKeys(db)
    const believed = stored.filter(({ createdAt }) => ageDays(createdAt) < BELIEVED_DAYS)
    return { opened: await openAll(believed, sealer), newestSeen: stored[0]?.kid ?? null }
  }

  const load = async (): Promise<Keys> => {
    const { opened, newestSeen } = await read()
    const [newest] = opened
    if (newest !== undefined && ageDays(newest.createdAt) < ROTATION_DAYS) return keysFrom(opened)
    await makeKey(db, sealer, newestSeen)
    return keysFrom((await read()).opened)
  }

  const reload = (): Promise<Keys> => {
    const loading = load()
    keys = loading
    // What failed is asked for again, not remembered.
    loading.catch(() => {
      if (keys === loading) keys = undefined
    })
    return loading
  }

  const atMost = async (ageMs: number): Promise<Keys> => {
    const known = await keys
    return known === undefined || Date.now() - known.readAt > ageMs ? reload() : known
  }

  return {
    async current() {
      const { kid, signingKey } = await atMost(FRESH_MS)
      return { kid, key: signingKey }
    },
    async publicKeys(kid) {
      const known = await atMost(FRESH_MS)
      const isKnown = kid !== undefined && known.kids.has(kid)
      return (isKnown ? known : await atMost(LOOK_AGAIN_MS)).publicKey
    },
  }
}
