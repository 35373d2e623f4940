import {
  CORE_VERSION,
  computeAbundance,
  computeAttribution,
  computeConversion,
  computeHistory,
  computeLaboratory,
  computePropagation,
  computeSolve,
  evidenceOf,
  publishedValues,
} from '#core/index'
import { abundanceRequest, digestOf, parseInput } from '#core/wire/index'
import type { CandidateInput, HistoryInput } from '#core/wire/index'

/** What the API document shows for an endpoint. Numbers are computed by the core, so that they cannot go stale. */
export interface EndpointExample {
  body?: unknown
  answer?: unknown
}

const IDS = {
  user: '5f2b8c1e-7a64-4d0b-9a53-0c7d6c1f2a10',
  group: '0b9e4f6a-2c3d-4e8f-8b71-6d5a4c3b2a1f',
  history: 'a3d1c5e7-9b2f-4c6d-8e0a-1f3b5d7c9e2a',
  historyRevision: 'c4e6a8b0-1d3f-4527-9c8e-7a6b5c4d3e2f',
  candidate: 'd5f7b9c1-2e40-4638-8d9f-8b7c6d5e4f30',
  candidateRevision: 'e608cad2-3f51-4749-9ea0-9c8d7e6f5041',
  nextRevision: '08a1b2c3-4d5e-4f60-8a7b-9c8d7e6f5a4b',
  guestLink: '3bd4e5f6-7081-4293-8dae-2f3a4b5c6d7e',
  key: '19b2c3d4-5e6f-4071-8b9c-0d1e2f3a4b5c',
  auditEntry: '2ac3d4e5-6f70-4182-9cad-1e2f3a4b5c6d',
  invitation: '1b2c3d4e-5f60-4718-8293-a4b5c6d7e8f9',
  session: '2c3d4e5f-6071-4829-93a4-b5c6d7e8f90a',
  evaluation: 'f719dbe3-4062-485a-8fb1-ad9e8f706152',
}
const AT = '2026-10-01T09:20:00.000Z'

const person = { id: IDS.user, name: 'Mateo Adeyemi' }
const historyWritten = { bath: { treatment: 'fit-2018', band: 0 } }
const candidateWritten = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
}

const session = {
  user: { ...person, email: 'mateo@larchvalley.example' },
  group: { id: IDS.group, name: 'Larch Valley group', baselineRevisionId: IDS.historyRevision },
  role: 'author',
  expiresAt: '2026-10-15T09:20:00.000Z',
}

const key = {
  id: IDS.key,
  owner: person,
  name: 'Tables for the paper',
  scope: 'compute',
  beginning: 'ember_Qm4x',
  createdAt: AT,
  expiresAt: '2026-12-30T09:20:00.000Z',
  lastUsedAt: null,
  revokedAt: null,
}

const keyExamples: Record<string, EndpointExample> = {
  listKeys: { answer: { items: [key] } },
  createKey: {
    body: { name: key.name, scope: key.scope, days: 90 },
    answer: { key, secret: 'ember_Qm4x…, 49 characters' },
  },
  revokeKey: { answer: { ...key, revokedAt: '2026-10-02T08:00:00.000Z' } },
}

const guestLink = {
  id: IDS.guestLink,
  kind: 'evaluation',
  subjectId: IDS.evaluation,
  note: 'For the referee',
  createdBy: person,
  createdAt: AT,
  expiresAt: null,
  lastUsedAt: null,
  revokedAt: null,
}

const guestLinkExamples: Record<string, EndpointExample> = {
  listGuestLinks: { answer: { items: [guestLink] } },
  createGuestLink: {
    body: { kind: 'evaluation', subjectId: IDS.evaluation, note: guestLink.note, days: null },
    answer: { link: guestLink, token: 'Yk3v…, 43 characters' },
  },
  revokeGuestLink: { answer: { ...guestLink, revokedAt: '2026-10-02T08:00:00.000Z' } },
}

const auditExample = {
  id: IDS.auditEntry,
  createdAt: AT,
  actor: person,
  apiKeyId: null,
  action: 'history.create',
  subjectId: IDS.history,
  detail: { name: 'The 2018 fit' },
  fromAddress: '192.0.2.17',
  fromAgent: 'Mozilla/5.0',
  requestId: '7a1c0e52-6f0d-4a4e-9a53-7d1f6c1f2a10',
}

function recordExamples(
  noun: string,
  name: string,
  id: string,
  revisionId: string,
  written: unknown,
  input: unknown,
) {
  const capital = noun.charAt(0).toUpperCase() + noun.slice(1)
  const head = {
    id: revisionId,
    number: 1,
    parentId: null,
    author: person,
    createdAt: AT,
    note: 'First guess',
    digest: digestOf(input),
    input,
  }
  const summary = { id, name, createdAt: AT, updatedAt: AT, revisionCount: 1, head }
  const revised = { ...head, id: IDS.nextRevision, number: 2, parentId: revisionId, note: 'After Thursday' }
  return {
    [`list${capital}Records`]: { answer: { items: [summary], next: null } },
    [`read${capital}`]: { answer: { ...summary, revisions: [head] } },
    [`create${capital}`]: {
      body: { name, note: head.note, input: written },
      answer: { ...summary, revisions: [head] },
    },
    [`revise${capital}`]: {
      body: { parentId: revisionId, note: revised.note, input: written },
      answer: { ...summary, revisionCount: 2, head: revised, revisions: [revised, head] },
    },
  }
}

function evaluationExamples(
  history: HistoryInput,
  candidate: CandidateInput,
): Record<string, EndpointExample> {
  const result = computeAbundance({ history, candidate })
  const evaluation = {
    id: IDS.evaluation,
    history: { id: IDS.historyRevision, number: 1, recordId: IDS.history, name: 'The 2018 fit' },
    candidate: { id: IDS.candidateRevision, number: 1, recordId: IDS.candidate, name: 'Standard WIMP' },
    author: person,
    createdAt: AT,
    coreVersion: CORE_VERSION,
    inputDigest: digestOf({ history, candidate }),
    result,
  }
  return {
    listEvaluations: { answer: { items: [evaluation], next: null } },
    readEvaluation: { answer: evaluation },
    createEvaluation: {
      body: {
        historyRevisionId: IDS.historyRevision,
        candidateRevisionId: IDS.candidateRevision,
        shownOmegaH2: result.omegaH2,
      },
      answer: {
        evaluation,
        shown: { relativeDifference: 0, allowed: Math.max(1e-9, result.numericalError), agrees: true },
      },
    },
    readEvidence: { answer: evidenceOf(evaluation, { history, candidate }, session.group.name) },
    openGuestLink: {
      body: { token: 'Yk3v…, 43 characters' },
      answer: {
        kind: 'evaluation',
        groupName: session.group.name,
        expiresAt: null,
        evaluation,
        history,
        candidate,
        evidence: evidenceOf(evaluation, { history, candidate }, session.group.name),
      },
    },
    computeAbundance: { body: { history: historyWritten, candidate: candidateWritten }, answer: result },
  }
}

const account = {
  ...session.user,
  emailVerified: true,
  hasPassword: true,
  secondFactor: { inForce: true, recoveryCodesLeft: 9 },
  createdAt: AT,
}
const invitation = {
  id: IDS.invitation,
  email: 'ida@larchvalley.example',
  role: 'reader',
  invitedBy: person,
  createdAt: AT,
  expiresAt: '2026-10-08T09:20:00.000Z',
  state: 'open',
}
const token = 'x9Qm3vT0S1eKf4bN7cRwYz2uHj5gLp8dA6iXoVtE1sGkMnBqZrCfWyUhJlPaDxOi'
const recoveryCodes = ['9x2k-m4tz-0c7w-hq5e', 'v8rn-3jd6-ya1b-pg2s']
const password = 'three or four words'
const newPassword = 'four other words here'

const accountExamples: Record<string, EndpointExample> = {
  listOwnGroups: { answer: { items: [{ id: IDS.group, name: session.group.name, role: session.role }] } },
  chooseGroup: { body: { groupId: IDS.group }, answer: session },
  readAccount: { answer: account },
  renameAccount: { body: { name: 'Mateo Adeyemi' }, answer: account },
  changePassword: { body: { currentPassword: password, newPassword } },
  changeEmail: { body: { email: 'mateo@institute.example', currentPassword: password } },
  confirmEmail: { body: { token } },
  forgotPassword: { body: { email: session.user.email } },
  resetPassword: { body: { token, newPassword } },
  beginSecondFactor: {
    body: { currentPassword: password },
    answer: {
      secret: 'JBSWY3DPEHPK3PXPJBSWY3DPEHPK3PXP',
      uri: 'otpauth://totp/Emberline:mateo%40larchvalley.example?secret=JBSWY3DPEHPK3PXPJBSWY3DPEHPK3PXP',
      qrSvg: '<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 45 45"><path d="M4 4h7v7H4z"/></svg>',
    },
  },
  confirmSecondFactor: { body: { code: '492039' }, answer: { recoveryCodes } },
  giveUpSecondFactor: { body: { currentPassword: password, code: '492039' } },
  renewRecoveryCodes: { body: { currentPassword: password, code: '492039' }, answer: { recoveryCodes } },
  listOwnSessions: {
    answer: {
      items: [
        {
          id: IDS.session,
          current: true,
          group: session.group.name,
          userAgent: 'Mozilla/5.0 (X11; Linux x86_64; rv:140.0) Gecko/20100101 Firefox/140.0',
          address: '192.0.2.7',
          createdAt: AT,
          lastUsedAt: AT,
          expiresAt: session.expiresAt,
        },
      ],
    },
  },
  listInvitations: { answer: { items: [invitation], next: null } },
  invite: { body: { email: invitation.email, role: invitation.role }, answer: invitation },
  readInvitation: {
    body: { token },
    answer: {
      email: invitation.email,
      role: invitation.role,
      groupName: session.group.name,
      inviterName: person.name,
      hasAccount: false,
    },
  },
  acceptInvitation: {
    body: { token, name: 'Ida Lindqvist', password },
    answer: {
      ...session,
      user: { id: IDS.user, name: 'Ida Lindqvist', email: invitation.email },
      role: 'reader',
    },
  },
  foundFirstGroup: {
    body: {
      token,
      groupName: session.group.name,
      name: person.name,
      email: session.user.email,
      password,
    },
    answer: { ...session, role: 'lead', group: { ...session.group, baselineRevisionId: null } },
  },
}

/** A question with its answer by this core. */
const worked = (body: unknown, answer: (input: unknown) => unknown): EndpointExample => ({
  body,
  answer: answer(body),
})

const kination = { expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1 } }

/** One of each kind of question; the samples are few, so that making them costs little. */
const questionExamples = {
  computeSolve: worked(
    {
      history: historyWritten,
      candidate: candidateWritten,
      solveFor: 'candidate.annihilation.sWaveCm3PerS',
      targetOmegaH2: 0.12,
      between: [1e-26, 1e-25],
    },
    computeSolve,
  ),
  computeAttribute: worked(
    {
      baseline: { bath: { treatment: 'thresholds' } },
      variant: { ...historyWritten, ...kination },
      candidate: candidateWritten,
    },
    computeAttribution,
  ),
  computePropagate: worked(
    {
      history: historyWritten,
      candidate: candidateWritten,
      distributions: [
        { path: 'candidate.massGeV', kind: 'normal', mean: 100, standardDeviation: 2 },
        { path: 'history.bath.band', kind: 'uniform', low: -1, high: 1 },
      ],
      samples: 32,
      seed: 7,
      histogramBins: 4,
    },
    computePropagation,
  ),
  computeConvert: worked(
    { from: { quantity: 'temperatureGeV', values: [1, 0.001] }, to: ['timeS', 'redshift'] },
    computeConversion,
  ),
  computeLaboratory: worked(
    {
      history: historyWritten,
      measured: {
        parentMassGeV: { value: 300, minus: 3, plus: 3 },
        lifetimeS: { value: 1e-11, minus: 2e-12, plus: 2e-12 },
        massGeV: { value: 1e-5, minus: 1e-6, plus: 1e-6 },
      },
      parent: { degreesOfFreedom: 4, statistics: 'fermion' },
      samples: 32,
      seed: 7,
    },
    computeLaboratory,
  ),
  computeBatch: {
    body: {
      items: [
        { what: 'convert', input: { from: { quantity: 'temperatureGeV', values: [1] }, to: ['timeS'] } },
        { what: 'convert', input: { from: { quantity: 'gS', values: [10] }, to: ['timeS'] } },
      ],
    },
    answer: {
      items: [
        {
          status: 'done',
          result: computeConversion({ from: { quantity: 'temperatureGeV', values: [1] }, to: ['timeS'] }),
        },
        {
          status: 'failed',
          problem: {
            type: 'urn:emberline:problem:invalid-input',
            title: 'The input is at fault',
            status: 422,
            detail: 'One field does not fit; see the faults. Nothing was saved.',
            faults: [
              { path: 'from.quantity', message: 'allowed: a quantity that rises or falls throughout' },
            ],
          },
        },
      ],
    },
  },
  publishedValues: {
    answer: { coreVersion: CORE_VERSION, values: publishedValues().slice(0, 3) },
  },
}

/** Examples by the id of their endpoint. */
export function examples(): Record<string, EndpointExample> {
  const { history, candidate } = parseInput(abundanceRequest, {
    history: historyWritten,
    candidate: candidateWritten,
  })
  const rowsAsked = { history: historyWritten, temperaturesGeV: [100, 1, 0.15, 0.001] }
  return {
    health: { answer: { status: 'ok' } },
    info: { answer: { coreVersion: CORE_VERSION, awaitsFirstGroup: false, demo: false, demoSignIns: [] } },
    ...accountExamples,
    signIn: { body: { email: session.user.email, password: 'three or four words' }, answer: session },
    whoAmI: { answer: session },
    ...recordExamples('history', 'The 2018 fit', IDS.history, IDS.historyRevision, historyWritten, history),
    ...recordExamples(
      'candidate',
      'Standard WIMP',
      IDS.candidate,
      IDS.candidateRevision,
      candidateWritten,
      candidate,
    ),
    ...evaluationExamples(history, candidate),
    ...keyExamples,
    ...guestLinkExamples,
    listAuditEntries: { answer: { items: [auditExample], next: null } },
    ...questionExamples,
    computeHistory: { body: rowsAsked, answer: computeHistory(rowsAsked) },
  }
}
