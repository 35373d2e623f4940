import type { AbundanceResult } from '#core/wire/index'
import { and, eq } from 'drizzle-orm'
import type { GroupTransaction } from '../database.ts'
import { candidateRevisions } from '../schema/candidateRevisions.ts'
import { candidates } from '../schema/candidates.ts'
import { evaluations } from '../schema/evaluations.ts'
import { histories } from '../schema/histories.ts'
import { historyRevisions } from '../schema/historyRevisions.ts'
import { users } from '../schema/users.ts'
import { cutPage, newestFirst, older } from './page.ts'
import type { Page, PageRequest } from './page.ts'

interface RevisionReference {
  id: string
  number: number
  recordId: string
  name: string
}

export interface StoredEvaluation {
  id: string
  history: RevisionReference
  candidate: RevisionReference
  author: { id: string; name: string }
  createdAt: Date
  coreVersion: string
  inputDigest: string
  result: AbundanceResult
}

export interface EvaluationDraft {
  groupId: string
  authorId: string
  history: { id: string; recordId: string }
  candidate: { id: string; recordId: string }
  coreVersion: string
  inputDigest: string
  result: AbundanceResult
}

export interface EvaluationFilter {
  historyId?: string | undefined
  candidateId?: string | undefined
}

const selectEvaluations = (tx: GroupTransaction) =>
  tx
    .select({
      id: evaluations.id,
      history: {
        id: historyRevisions.id,
        number: historyRevisions.number,
        recordId: histories.id,
        name: histories.name,
      },
      candidate: {
        id: candidateRevisions.id,
        number: candidateRevisions.number,
        recordId: candidates.id,
        name: candidates.name,
      },
      author: { id: users.id, name: users.name },
      createdAt: evaluations.createdAt,
      coreVersion: evaluations.coreVersion,
      inputDigest: evaluations.inputDigest,
      result: evaluations.result,
    })
    .from(evaluations)
    .innerJoin(historyRevisions, eq(historyRevisions.id, evaluations.historyRevisionId))
    .innerJoin(histories, eq(histories.id, evaluations.historyId))
    .innerJoin(candidateRevisions, eq(candidateRevisions.id, evaluations.candidateRevisionId))
    .innerJoin(candidates, eq(candidates.id, evaluations.candidateId))
    .innerJoin(users, eq(users.id, evaluations.authorId))

export async function listEvaluations(
  tx: GroupTransaction,
  filter: EvaluationFilter,
  page: PageRequest,
): Promise<Page<StoredEvaluation>> {
  const rows = await selectEvaluations(tx)
    .where(
      and(
        filter.historyId === undefined ? undefined : eq(evaluations.historyId, filter.historyId),
        filter.candidateId === undefined ? undefined : eq(evaluations.candidateId, filter.candidateId),
        older(evaluations, page.after),
      ),
    )
    .orderBy(...newestFirst(evaluations))
    .limit(page.limit + 1)
  return cutPage(rows, page.limit)
}

export async function findEvaluation(tx: GroupTransaction, id: string): Promise<StoredEvaluation | null> {
  const [row] = await selectEvaluations(tx).where(eq(evaluations.id, id))
  return row ?? null
}

/** Stores an evaluation and returns its id. */
export async function insertEvaluation(tx: GroupTransaction, draft: EvaluationDraft): Promise<string> {
  const { history, candidate, ...rest } = draft
  const [row] = await tx
    .insert(evaluations)
    .values({
      ...rest,
      historyId: history.recordId,
      historyRevisionId: history.id,
      candidateId: candidate.recordId,
      candidateRevisionId: candidate.id,
      omegaH2: draft.result.omegaH2,
    })
    .returning({ id: evaluations.id })
  if (row === undefined) throw new Error('an insert that raised nothing returned nothing')
  return row.id
}
