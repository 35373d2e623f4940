import { randomBytes, randomUUID } from 'node:crypto'
import { computeAbundance } from '#core/index'
import { candidateInput, digestOf, historyInput } from '#core/wire/index'
import { connect, withGroup } from '#db/database'
import { candidateQueries } from '#db/queries/candidates'
import { insertEvaluation } from '#db/queries/evaluations'
import { insertGuestLink } from '#db/queries/guestLinks'
import { historyQueries } from '#db/queries/histories'
import { insertInvitation } from '#db/queries/invitations'
import { insertKey } from '#db/queries/apiKeys'
import type { GroupTransaction } from '#db/database'
import { insertAuditEntry } from '#db/queries/auditEntries'
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

/** A key of a member, with an entry in the audit log; nobody knows its secret. */
async function saveKey(tx: GroupTransaction, group: TestGroup, holder: Member): Promise<string> {
  const id = await insertKey(tx, {
    groupId: group.id,
    userId: holder.id,
    name: 'set by a test',
    scope: 'read',
    secretHash: randomBytes(32).toString('hex'),
    beginning: 'ember_abcd',
    expiresAt: new Date(Date.now() + 86_400_000),
  })
  await insertAuditEntry(tx, {
    groupId: group.id,
    actorId: holder.id,
    apiKeyId: null,
    action: 'key.create',
    subjectId: id,
    detail: { name: 'set by a test' },
    fromAddress: '192.0.2.1',
    fromAgent: null,
    requestId: null,
  })
  return id
}

/** Stores a history, a candidate, an evaluation of the two, a key, a guest link and an invitation, through the server's own role and queries. */
export async function saveOneOfEach(serverUrl: string, group: TestGroup, keyHolder = group.reader) {
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
      const keyId = await saveKey(tx, group, keyHolder)
      const guestLinkId = await insertGuestLink(tx, {
        groupId: group.id,
        kind: 'evaluation',
        subjectId: evaluationId,
        note: 'set by a test',
        tokenHash: randomBytes(32).toString('hex'),
        createdBy: (keyHolder.role === 'reader' ? author : keyHolder).id,
        expiresAt: null,
      })
      const { id: invitationId } = await insertInvitation(tx, {
        id: randomUUID(),
        groupId: group.id,
        email: `guest@${group.name.toLowerCase()}.example`,
        role: 'reader',
        invitedBy: group.lead.id,
        secretHash: '0'.repeat(64),
        expiresAt: new Date(Date.now() + 3_600_000),
      })
      return {
        groupId: group.id,
        history: savedHistory,
        candidate: savedCandidate,
        evaluationId,
        keyId,
        guestLinkId,
        invitationId,
      }
    })
  } finally {
    await close()
  }
}
