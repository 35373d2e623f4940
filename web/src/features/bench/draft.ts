/** The Bench in its address: what is chosen, what was changed, and the window. */
import type { CandidateInput, HistoryInput } from '#core/wire/index'
import { ASSUMPTION_ORDER, BATH_TITLES, MECHANISM_TITLES } from '../../lib/describe.tsx'

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

export interface TemperatureWindow {
  hotGeV: number
  coldGeV: number
}

export interface BenchAddress {
  history: RevisionChoice | null
  candidate: RevisionChoice | null
  draft: Draft
  window: TemperatureWindow | null
}

const choiceText = ({ recordId, number }: RevisionChoice): string => `${recordId}@${number}`

function readChoice(text: string | null): RevisionChoice | null {
  const match = /^([0-9a-f-]{36})@(\d+)$/.exec(text ?? '')
  return match ? { recordId: match[1]!, number: Number(match[2]) } : null
}

/** JSON in the letters that an address takes as they are (base64url, RFC 4648). */
export function encodeDraft(draft: Draft): string {
  const bytes = new TextEncoder().encode(JSON.stringify(draft))
  return btoa(String.fromCharCode(...bytes))
    .replace(/\+/g, '-')
    .replace(/\//g, '_')
    .replace(/=+$/, '')
}

const isObject = (value: unknown): value is Record<string, unknown> =>
  value !== null && typeof value === 'object'

/** Whether the forms can show it; whether it can be computed from is for the core to say. */
const isHistory = (value: unknown): boolean =>
  isObject(value) &&
  ASSUMPTION_ORDER.every((group) => group in value) &&
  isObject(value['bath']) &&
  String(value['bath']['treatment']) in BATH_TITLES
const isCandidate = (value: unknown): boolean =>
  isObject(value) && String(value['mechanism']) in MECHANISM_TITLES

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

function readWindow(text: string | null): TemperatureWindow | null {
  const [hotGeV, coldGeV] = (text ?? '').split(',').map(Number)
  return hotGeV && coldGeV && hotGeV > coldGeV && coldGeV > 0 ? { hotGeV, coldGeV } : null
}

export function readAddress(search: string): BenchAddress {
  const query = new URLSearchParams(search)
  return {
    history: readChoice(query.get('history')),
    candidate: readChoice(query.get('candidate')),
    draft: decodeDraft(query.get('draft')),
    window: readWindow(query.get('window')),
  }
}

export function writeAddress({ history, candidate, draft, window }: BenchAddress): string {
  const query = new URLSearchParams()
  if (history) query.set('history', choiceText(history))
  if (candidate) query.set('candidate', choiceText(candidate))
  if (draft.history || draft.candidate) query.set('draft', encodeDraft(draft))
  if (window) query.set('window', `${window.hotGeV.toPrecision(4)},${window.coldGeV.toPrecision(4)}`)
  const text = query.toString().replace(/%40/g, '@').replace(/%2C/g, ',')
  return text === '' ? '' : `?${text}`
}
