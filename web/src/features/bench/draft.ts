/** The Bench in its address: what is chosen, what was changed, and the window. */
import type { CandidateInput, HistoryInput } from '#core/wire/index'
import type { TemperatureWindow } from '../../components/charts/window.ts'
import { ANNIHILATION_TITLES, ASSUMPTION_ORDER, BATH_TITLES, MECHANISM_TITLES } from '../../lib/describe.tsx'

/** A record and one of its revisions. */
export interface RevisionChoice {
  recordId: string
  number: number
}

/** What differs from the chosen revisions. */
export interface Draft {
  history?: HistoryInput
  candidate?: CandidateInput
}

export interface BenchAddress {
  history: RevisionChoice | null
  candidate: RevisionChoice | null
  draft: Draft
  window: TemperatureWindow | null
  /** The address names a draft that was too long for it, and the tab that kept it is another one. */
  draftMissing?: boolean
}

const choiceText = ({ recordId, number }: RevisionChoice): string => `${recordId}@${number}`

function readChoice(text: string | null): RevisionChoice | null {
  const match = /^([0-9a-f-]{36})@(\d+)$/.exec(text ?? '')
  return match ? { recordId: match[1]!, number: Number(match[2]) } : null
}

/** JSON in the letters that an address takes as they are (base64url, RFC 4648). */
export function encodeDraft(draft: Draft): string {
  const bytes = new TextEncoder().encode(JSON.stringify(draft))
  // Letter by letter: a pasted table has more bytes than a call takes arguments.
  return btoa(Array.from(bytes, (byte) => String.fromCharCode(byte)).join(''))
    .replace(/\+/g, '-')
    .replace(/\//g, '_')
    .replace(/=+$/, '')
}

const isObject = (value: unknown): value is Record<string, unknown> =>
  value !== null && typeof value === 'object'

const EXPANSION_KINDS: readonly unknown[] = ['radiation', 'fluid', 'early-matter', 'entropy-step']

const isBathTable = (value: unknown): boolean =>
  Array.isArray(value) && value.every((row) => isObject(row) && typeof row['temperatureGeV'] === 'number')

/** Whether the forms can show it; whether it can be computed from is for the core to say. */
const isHistory = (value: unknown): boolean =>
  isObject(value) &&
  ASSUMPTION_ORDER.every((group) => group in value) &&
  isObject(value['bath']) &&
  String(value['bath']['treatment']) in BATH_TITLES &&
  (value['bath']['treatment'] !== 'uploaded' || isBathTable(value['bath']['points'])) &&
  isObject(value['neutrinos']) &&
  Array.isArray(value['extraSpecies']) &&
  value['extraSpecies'].every((species) => isObject(species) && isObject(species['coupling'])) &&
  isObject(value['expansion']) &&
  EXPANSION_KINDS.includes(value['expansion']['kind']) &&
  isObject(value['today'])

const isAnnihilation = (value: unknown): boolean =>
  isObject(value) && String(value['kind']) in ANNIHILATION_TITLES

const isCandidate = (value: unknown): boolean => {
  if (!isObject(value) || !(String(value['mechanism']) in MECHANISM_TITLES)) return false
  switch (value['mechanism']) {
    case 'freeze-out':
    case 'asymmetric':
      return isAnnihilation(value['annihilation'])
    case 'freeze-in-decay':
      return isObject(value['parent'])
    case 'freeze-in-scattering':
      return isObject(value['scattering'])
    case 'freeze-in-ultraviolet':
      return isObject(value['ultraviolet'])
    default:
      return true
  }
}

/** The parts of a decoded value that are a history and a candidate. */
function recognised(value: unknown): Draft {
  if (!isObject(value)) return {}
  return {
    ...(isHistory(value['history']) ? { history: value['history'] as HistoryInput } : {}),
    ...(isCandidate(value['candidate']) ? { candidate: value['candidate'] as CandidateInput } : {}),
  }
}

/** The draft in a text, or none when the text is not one: a mangled link still opens. */
export function decodeDraft(text: string | null): Draft {
  if (!text) return {}
  try {
    const bytes = Uint8Array.from(atob(text.replace(/-/g, '+').replace(/_/g, '/')), (letter) =>
      letter.charCodeAt(0),
    )
    return recognised(JSON.parse(new TextDecoder().decode(bytes)))
  } catch {
    return {}
  }
}

/** Longer drafts stay out of the address: servers and proxies refuse request lines of more than about 8 kB. */
const MOST_IN_ADDRESS = 6000

const KEPT = 'kept.'

/** Name of a long draft, by which the tab that keeps it knows it again: FNV-1a of its text. */
function nameOf(encoded: string): string {
  let hash = 0x811c9dc5
  for (let i = 0; i < encoded.length; i++) hash = Math.imul(hash ^ encoded.charCodeAt(i), 0x01000193)
  return `${KEPT}${(hash >>> 0).toString(36)}`
}

/** Whether the draft is too long for the address. */
export const isTooLong = (encoded: string): boolean => encoded.length > MOST_IN_ADDRESS

const draftText = (encoded: string): string => (isTooLong(encoded) ? nameOf(encoded) : encoded)

/** The draft an address names: in it, or, for a long one, kept by this tab. */
function readDraft(text: string | null, kept: string | null): Pick<BenchAddress, 'draft' | 'draftMissing'> {
  if (!text?.startsWith(KEPT)) return { draft: decodeDraft(text) }
  return kept !== null && nameOf(kept) === text
    ? { draft: decodeDraft(kept) }
    : { draft: {}, draftMissing: true }
}

function readWindow(text: string | null): TemperatureWindow | null {
  const [hotGeV, coldGeV] = (text ?? '').split(',').map(Number)
  return hotGeV && coldGeV && hotGeV > coldGeV && coldGeV > 0 ? { hotGeV, coldGeV } : null
}

/** `kept` is the long draft this tab keeps, encoded. */
export function readAddress(search: string, kept: string | null = null): BenchAddress {
  const query = new URLSearchParams(search)
  return {
    history: readChoice(query.get('history')),
    candidate: readChoice(query.get('candidate')),
    window: readWindow(query.get('window')),
    ...readDraft(query.get('draft'), kept),
  }
}

/** Whether the draft of an address is too long for it, so that only the tab that keeps it knows it. */
export const isKeptByTab = (search: string): boolean =>
  new URLSearchParams(search).get('draft')?.startsWith(KEPT) ?? false

export function writeAddress({ history, candidate, draft, window }: BenchAddress): string {
  const query = new URLSearchParams()
  if (history) query.set('history', choiceText(history))
  if (candidate) query.set('candidate', choiceText(candidate))
  if (draft.history || draft.candidate) query.set('draft', draftText(encodeDraft(draft)))
  if (window) query.set('window', `${window.hotGeV.toPrecision(4)},${window.coldGeV.toPrecision(4)}`)
  const text = query.toString().replace(/%40/g, '@').replace(/%2C/g, ',')
  return text === '' ? '' : `?${text}`
}
