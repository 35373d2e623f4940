import { z } from 'zod'
import { candidateInput } from './candidate.ts'
import { abundanceResult } from './compute.ts'
import { historyInput } from './history.ts'

export const role = z.enum(['lead', 'author', 'reader']).meta({ id: 'Role' })
export type Role = z.output<typeof role>

const id = z.uuid()
const moment = z.iso.datetime().describe('UTC, ISO 8601')
const digest = z
  .string()
  .regex(/^[0-9a-f]{64}$/)
  .describe('SHA-256 of the RFC 8785 form, hexadecimal')
const recordName = z.string().trim().min(1).max(120)
const note = z.string().trim().max(2000)

export const signInRequest = z
  .strictObject({
    email: z.email().max(254),
    password: z.string().min(1).max(1024),
    code: z
      .string()
      .trim()
      .min(1)
      .max(40)
      .optional()
      .describe('Of the second factor, or a recovery code; when the account has one'),
  })
  .meta({ id: 'SignInRequest' })

export const person = z.object({ id, name: z.string() }).meta({ id: 'Person' })
export type Person = z.output<typeof person>

/** Who is signed in, in which group, as what. */
export const sessionInfo = z
  .object({
    user: z.object({ id, name: z.string(), email: z.string() }),
    group: z.object({ id, name: z.string(), baselineRevisionId: id.nullable() }),
    role,
    expiresAt: moment,
  })
  .meta({ id: 'SessionInfo' })
export type SessionInfo = z.output<typeof sessionInfo>

/** What the sign-in page needs before anyone has signed in. */
export const publicInfo = z
  .object({
    coreVersion: z.string(),
    awaitsFirstGroup: z.boolean().describe('Whether the first group has still to be made'),
    demo: z.boolean(),
    demoSignIns: z.array(z.object({ name: z.string(), role, email: z.string(), password: z.string() })),
  })
  .meta({ id: 'PublicInfo' })
export type PublicInfo = z.output<typeof publicInfo>

const revisionOf = <T extends z.ZodType>(input: T) =>
  z.object({
    id,
    number: z.number().int().positive(),
    parentId: id.nullable(),
    author: person,
    createdAt: moment,
    note: z.string(),
    digest,
    input,
  })

export const historyRevision = revisionOf(historyInput).meta({ id: 'HistoryRevision' })
export type HistoryRevision = z.output<typeof historyRevision>
export const candidateRevision = revisionOf(candidateInput).meta({ id: 'CandidateRevision' })
export type CandidateRevision = z.output<typeof candidateRevision>

/** A history without its older revisions. */
export const historySummary = z
  .object({
    id,
    name: z.string(),
    createdAt: moment,
    updatedAt: moment,
    revisionCount: z.number().int(),
    head: historyRevision,
  })
  .meta({ id: 'HistorySummary' })
export type HistorySummary = z.output<typeof historySummary>
export const historyRecord = historySummary
  .extend({ revisions: z.array(historyRevision).describe('Newest first') })
  .meta({ id: 'HistoryRecord' })
export type HistoryRecord = z.output<typeof historyRecord>

export const candidateSummary = z
  .object({
    id,
    name: z.string(),
    createdAt: moment,
    updatedAt: moment,
    revisionCount: z.number().int(),
    head: candidateRevision,
  })
  .meta({ id: 'CandidateSummary' })
export type CandidateSummary = z.output<typeof candidateSummary>
export const candidateRecord = candidateSummary
  .extend({ revisions: z.array(candidateRevision).describe('Newest first') })
  .meta({ id: 'CandidateRecord' })
export type CandidateRecord = z.output<typeof candidateRecord>

export const createHistoryRequest = z
  .strictObject({ name: recordName, note: note.default(''), input: historyInput })
  .meta({ id: 'CreateHistoryRequest' })
export const createCandidateRequest = z
  .strictObject({ name: recordName, note: note.default(''), input: candidateInput })
  .meta({ id: 'CreateCandidateRequest' })

const parentId = id.describe(
  'The revision this one was made from; refused with 409 when it is no longer the newest',
)
export const reviseHistoryRequest = z
  .strictObject({ parentId, note: note.default(''), input: historyInput })
  .meta({ id: 'ReviseHistoryRequest' })
export const reviseCandidateRequest = z
  .strictObject({ parentId, note: note.default(''), input: candidateInput })
  .meta({ id: 'ReviseCandidateRequest' })

const revisionReference = z.object({ id, number: z.number().int(), recordId: id, name: z.string() })

/** A stored result: which revisions, which core, what came out. */
export const evaluation = z
  .object({
    id,
    history: revisionReference,
    candidate: revisionReference,
    author: person,
    createdAt: moment,
    coreVersion: z.string(),
    inputDigest: digest.describe('Of {history, candidate} with defaults filled in'),
    result: abundanceResult,
  })
  .meta({ id: 'Evaluation' })
export type Evaluation = z.output<typeof evaluation>

export const createEvaluationRequest = z
  .strictObject({
    historyRevisionId: id,
    candidateRevisionId: id,
    shownOmegaH2: z
      .number()
      .positive()
      .optional()
      .describe('What the browser showed; the answer says how far the server’s own number lies from it'),
  })
  .meta({ id: 'CreateEvaluationRequest' })

/** The stored evaluation, with the difference from what the browser had shown. */
export const createEvaluationResult = z
  .object({
    evaluation,
    shown: z
      .object({
        relativeDifference: z.number(),
        allowed: z.number().describe('max(1e-9, stated numerical error)'),
        agrees: z.boolean(),
      })
      .nullable(),
  })
  .meta({ id: 'CreateEvaluationResult' })
export type CreateEvaluationResult = z.output<typeof createEvaluationResult>

/** Keyset pagination: newest first; `next` is the cursor of the following page, null at the end. */
export const listQuery = z.object({
  limit: z.coerce.number().int().min(1).max(200).default(100),
  cursor: z.string().max(200).optional(),
})
export const evaluationQuery = listQuery.extend({ historyId: id.optional(), candidateId: id.optional() })
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), next: z.string().nullable() })
