import type { AnyPgColumn } from 'drizzle-orm/pg-core'
import { desc, sql } from 'drizzle-orm'
import type { SQL } from 'drizzle-orm'

/** Where a page of a newest-first list ended. */
export interface Position {
  createdAt: Date
  id: string
}

export interface PageRequest {
  limit: number
  after: Position | null
}

export interface Page<Row> {
  rows: Row[]
  next: Position | null
}

interface Keyset {
  createdAt: AnyPgColumn
  id: AnyPgColumn
}

export const newestFirst = (keyset: Keyset): SQL[] => [desc(keyset.createdAt), desc(keyset.id)]

/** The rows that come after `position` in newest-first order; no condition at the start of the list. */
export function older(keyset: Keyset, position: Position | null): SQL | undefined {
  if (position === null) return undefined
  const moment = position.createdAt.toISOString()
  return sql`(${keyset.createdAt}, ${keyset.id}) < (${moment}::timestamptz, ${position.id}::uuid)`
}

/** Cuts a result that was asked for one row more than the page holds. */
export function cutPage<Row extends Position>(rows: Row[], limit: number): Page<Row> {
  const shown = rows.slice(0, limit)
  const last = shown.at(-1)
  const more = rows.length > limit && last !== undefined
  return { rows: shown, next: more ? { createdAt: last.createdAt, id: last.id } : null }
}
