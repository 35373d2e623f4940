import { createHash } from 'node:crypto'
import type { Database } from '#db/database'
import { forgiveAttempt, takeAttempt } from '#db/queries/attempts'
import type { Budget } from '#db/queries/attempts'
import { ProblemError } from '../errors/problemError.ts'

/** How many attempts of each kind a party has within PERIOD_MINUTES; successful ones do not count. */
export interface AttemptLimits {
  /** Signing in from an address, on any account. */
  perAddress: number
  /** Signing in to an account: from devices not known to it, or from one known device. */
  perAccount: number
}

export const DEFAULT_ATTEMPT_LIMITS: AttemptLimits = { perAddress: 50, perAccount: 10 }

const PERIOD_MINUTES = 15

/** A budget of its own for each kind of attempt and party; only a hash of the party is kept. */
export const budget = (kind: string, party: string, limit: number): Budget => ({
  key: createHash('sha256').update(`${kind} ${party}`).digest('hex'),
  limit,
})

export interface Attempts {
  /**
   * Counts an attempt; the function returned forgives it.
   * @throws ProblemError too-many-attempts
   */
  take(budgets: readonly Budget[]): Promise<() => Promise<void>>
}

/** Counts attempts in the database, so that all servers count together and a restart forgets nothing. */
export const attemptCounter = (db: Database): Attempts => ({
  async take(budgets) {
    const taken = await takeAttempt(db, budgets, PERIOD_MINUTES * 60)
    if ('waitSeconds' in taken) {
      const minutes = Math.ceil(taken.waitSeconds / 60)
      throw new ProblemError(
        'too-many-attempts',
        `Too many attempts failed here. Wait ${minutes === 1 ? 'a minute' : `${minutes} minutes`}, then try again.`,
        { retryAfterSeconds: taken.waitSeconds },
      )
    }
    return () => forgiveAttempt(db, taken.attemptIds)
  },
})
