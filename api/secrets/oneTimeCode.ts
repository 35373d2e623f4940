import { Secret, TOTP } from 'otpauth'

/** RFC 6238 with what every app takes: HMAC-SHA-1, six digits, steps of 30 s. */
const PERIOD_SECONDS = 30
const PARAMETERS = { algorithm: 'SHA1', digits: 6, period: PERIOD_SECONDS } as const
/** 160 bits, as RFC 4226, 4, recommends. */
const SECRET_BYTES = 20
/** A code of the step before or after is taken too: clocks differ, and people type (RFC 6238, 5.2). */
const STEPS_OFF = 1

/** The package takes other scripts' figures for ours. */
const FORM = /^[0-9]{6}$/

/** A new secret, in base32. */
export const newSecret = (): string => new Secret({ size: SECRET_BYTES }).base32

/** What an app reads from the QR code. */
export const secretUri = (secret: string, account: string): string =>
  new TOTP({
    ...PARAMETERS,
    issuer: 'Emberline',
    label: account,
    secret: Secret.fromBase32(secret),
  }).toString()

/** The time step a code belongs to; null for a code that is not good at `atMs`. */
export function stepOfCode(secret: string, code: string, atMs: number): number | null {
  if (!FORM.test(code)) return null
  const totp = new TOTP({ ...PARAMETERS, secret: Secret.fromBase32(secret) })
  const delta = totp.validate({ token: code, timestamp: atMs, window: STEPS_OFF })
  return delta === null ? null : Math.floor(atMs / 1000 / PERIOD_SECONDS) + delta
}
