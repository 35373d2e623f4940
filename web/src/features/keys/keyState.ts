import type { ApiKey, KeyScope } from '#core/wire/index'

export const SCOPES = [
  { value: 'read', label: 'read', hint: 'Read what the group has.' },
  { value: 'compute', label: 'compute', hint: 'Read, and compute without saving.' },
  { value: 'write', label: 'write', hint: 'Read, compute, and save revisions and evaluations.' },
] as const satisfies readonly { value: KeyScope; label: string; hint: string }[]

export type KeyState = 'in force' | 'expired' | 'revoked'

/** Whether a key still opens anything. */
export function keyState(key: Pick<ApiKey, 'expiresAt' | 'revokedAt'>, now: number): KeyState {
  if (key.revokedAt !== null) return 'revoked'
  return Date.parse(key.expiresAt) <= now ? 'expired' : 'in force'
}
