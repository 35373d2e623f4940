import { computeAbundance } from '#core/index'
import { candidateInput, digestOf, historyInput } from '#core/wire/index'
import { connect, withGroup } from '#db/database'
import { candidateQueries } from '#db/queries/candidates'
import { insertEvaluation } from '#db/queries/evaluations'
import { historyQueries } from '#db/queries/histories'
import type { Member, TestGroup } from './groups.ts'

export const history = historyInput.parse({ bath: { treatment: 'thresholds' } })
export const candidate = candidateInput.parse({
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
})

export interface Saved {
  recordId: string
  revisionId: string
}

const draft = <Input>(group: TestGroup, author: Member, input: Input) => ({
  groupId: group.id,
  authorId: author.id,
  note: 'set by a test',
  digest: digestOf(input),
  input,
})

/** Stores a history, a candidate and an evaluation of the two, through the server's own role and queries. */
export async function saveOneOfEach(serverUrl: string, group: TestGroup) {
  const { db, close } = connect(serverUrl, () => undefined)
  const input = { history, candidate }
  try {
    return await withGroup(db, group.id, async (tx) => {
      const { author } = group
      const savedHistory = await historyQueries.create(
        tx,
        `${group.name} history`,
        draft(group, author, history),
      )
      const savedCandidate = await candidateQueries.create(
        tx,
        `${group.name} candidate`,
        draft(group, author, candidate),
      )
      const evaluationId = await insertEvaluation(tx, {
        groupId: group.id,
        authorId: author.id,
        history: { id: savedHistory.revisionId, recordId: savedHistory.recordId },
        candidate: { id: savedCandidate.revisionId, recordId: savedCandidate.recordId },
        coreVersion: 'test',
        inputDigest: digestOf(input),
        result: computeAbundance(input),
      })
      return { history: savedHistory, candidate: savedCandidate, evaluationId }
    })
  } finally {
    await close()
  }
}
