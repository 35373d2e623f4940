import { timestamp, uuid } from 'drizzle-orm/pg-core'

/** A moment in UTC, to the millisecond: what JavaScript keeps, so that a cursor compares exactly. */
export const moment = (name: string) => timestamp(name, { withTimezone: true, precision: 3, mode: 'date' })

export const createdAt = () => moment('created_at').notNull().defaultNow()

export const primaryId = () => uuid('id').primaryKey().defaultRandom()
