/** What reading a record gives; times are dates here and become text at the API's edge. */
export interface StoredRevision<Input> {
  id: string
  number: number
  parentId: string | null
  author: { id: string; name: string }
  createdAt: Date
  note: string
  digest: string
  input: Input
}

export interface StoredSummary<Input> {
  id: string
  name: string
  createdAt: Date
  updatedAt: Date
  revisionCount: number
  head: StoredRevision<Input>
}

export interface StoredRecord<Input> extends StoredSummary<Input> {
  /** Newest first. */
  revisions: StoredRevision<Input>[]
}

/** What a new revision says; who says it, and in which group. */
export interface RevisionDraft<Input> {
  groupId: string
  authorId: string
  note: string
  /** SHA-256 of the RFC 8785 form of `input`. */
  digest: string
  input: Input
  /** Now, unless given: the seed dates its revisions itself. */
  createdAt?: Date
}

/** What an evaluation needs of a revision. */
export interface RevisionContent<Input> {
  id: string
  recordId: string
  input: Input
}

export type Appended =
  | { outcome: 'appended'; revisionId: string }
  | { outcome: 'no-such-record' }
  | { outcome: 'stale-parent'; newest: { id: string; number: number } }
