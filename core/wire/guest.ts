import { z } from 'zod'
import { evidenceBundle } from './evidence.ts'
import { evaluation, historyRevision, person } from './records.ts'
import { candidateInput } from './candidate.ts'
import { historyInput } from './history.ts'

/** What a guest may be shown. */
export const guestLinkKind = z.enum(['evaluation', 'history-revision']).meta({ id: 'GuestLinkKind' })
export type GuestLinkKind = z.output<typeof guestLinkKind>

const moment = z.iso.datetime().describe('UTC, ISO 8601')

export const guestLink = z
  .object({
    id: z.uuid(),
    kind: guestLinkKind,
    subjectId: z.uuid().describe('The evaluation, or the revision of a history'),
    note: z.string(),
    createdBy: person,
    createdAt: moment,
    expiresAt: moment.nullable().describe('null when it does not expire'),
    lastUsedAt: moment.nullable(),
    revokedAt: moment.nullable(),
  })
  .meta({ id: 'GuestLink' })
export type GuestLink = z.output<typeof guestLink>

export const createGuestLinkRequest = z
  .strictObject({
    kind: guestLinkKind,
    subjectId: z.uuid(),
    note: z.string().trim().max(200).default('').describe('Whom it is for'),
    days: z
      .number()
      .int()
      .min(1)
      .max(3660)
      .nullable()
      .default(90)
      .describe('Days until it expires; null for never'),
  })
  .meta({ id: 'CreateGuestLinkRequest' })

/** A new link with its token, which is told this once. */
export const createGuestLinkResult = z
  .object({
    link: guestLink,
    token: z.string().describe('Stands behind # in the address /guest#TOKEN, so that no log holds it'),
  })
  .meta({ id: 'CreateGuestLinkResult' })
export type CreateGuestLinkResult = z.output<typeof createGuestLinkResult>

export const guestLinkQuery = z.object({
  subjectId: z.uuid().optional().describe('Links to one evaluation or one revision of a history'),
})
export const guestLinkList = z.object({ items: z.array(guestLink) })

export const openGuestLinkRequest = z
  .strictObject({ token: z.string().min(1).max(200) })
  .meta({ id: 'OpenGuestLinkRequest' })

/** What a guest sees: one evaluation with its inputs, or one revision of a history; nothing else of the group. */
export const guestView = z
  .discriminatedUnion('kind', [
    z.object({
      kind: z.literal('evaluation'),
      groupName: z.string(),
      expiresAt: moment.nullable(),
      evaluation,
      history: historyInput,
      candidate: candidateInput,
      evidence: evidenceBundle,
    }),
    z.object({
      kind: z.literal('history-revision'),
      groupName: z.string(),
      expiresAt: moment.nullable(),
      name: z.string(),
      revision: historyRevision,
    }),
  ])
  .meta({ id: 'GuestView' })
export type GuestView = z.output<typeof guestView>
