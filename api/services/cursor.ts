import { InputError } from '#core/wire/index'
import type { Page, PageRequest, Position } from '#db/queries/page'
import { z } from 'zod'

const position = z.tuple([z.iso.datetime(), z.uuid()])

const encode = ({ createdAt, id }: Position): string =>
  Buffer.from(`${createdAt.toISOString()} ${id}`).toString('base64url')

function decode(cursor: string): Position {
  const parsed = position.safeParse(Buffer.from(cursor, 'base64url').toString().split(' '))
  if (!parsed.success) {
    throw new InputError([
      { path: 'cursor', value: cursor, message: 'allowed: the `next` of an earlier page, unchanged' },
    ])
  }
  const [createdAt, id] = parsed.data
  return { createdAt: new Date(createdAt), id }
}

/** What a list request asks of the database. */
export const pageRequest = (query: { limit: number; cursor?: string | undefined }): PageRequest => ({
  limit: query.limit,
  after: query.cursor === undefined ? null : decode(query.cursor),
})

/** A page as it goes over the wire, its rows written by `write`. */
export const pageAnswer = <Row, Item>(page: Page<Row>, write: (row: Row) => Item) => ({
  items: page.rows.map(write),
  next: page.next === null ? null : encode(page.next),
})
