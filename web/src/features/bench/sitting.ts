/** What this tab remembers of the Bench until it is closed: leaving the page loses nothing. */
import { encodeDraft, isTooLong, readAddress } from './draft.ts'
import type { BenchAddress, Draft } from './draft.ts'

export interface Sitting {
  /** The Bench of an address; of the last look, when the address says nothing. */
  open(search: string): BenchAddress
  keep(search: string, draft: Draft): void
}

/** One for each person: whoever signs in next on this tab does not inherit a draft. */
export function sittingOf(userId: string, store: Storage = sessionStorage): Sitting {
  const lastAddress = `emberline.bench.${userId}`
  const longDraft = `${lastAddress}.draft`
  return {
    open: (search) =>
      readAddress(search === '' ? (store.getItem(lastAddress) ?? '') : search, store.getItem(longDraft)),
    keep(search, draft) {
      const encoded = encodeDraft(draft)
      try {
        store.setItem(lastAddress, search)
        if (isTooLong(encoded)) store.setItem(longDraft, encoded)
      } catch {
        // A full or forbidden store: the draft stands on the Bench all the same, and the bar says it is not saved.
        store.removeItem(longDraft)
      }
    },
  }
}
