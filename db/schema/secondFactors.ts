import { bigint, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment } from './columns.ts'
import { users } from './users.ts'

/** A person's secret for one-time codes (RFC 6238), sealed; in force once a code of it was shown. */
export const secondFactors = pgTable('second_factors', {
  userId: uuid('user_id')
    .primaryKey()
    .references(() => users.id, { onDelete: 'cascade' }),
  sealedSecret: text('sealed_secret').notNull(),
  createdAt: createdAt(),
  /** Null until a code was shown, and again once the factor is given up. */
  confirmedAt: moment('confirmed_at'),
  /** The time step of the newest code taken: no code of it or before it is taken again. */
  lastStep: bigint('last_step', { mode: 'number' }),
})
