import { useState, useSyncExternalStore } from 'react'

/**
 * The temperature, GeV, that pointer or keys are at; null when nowhere. One for all charts of a page, kept outside of
 * React's state: it moves with every frame, and only what is drawn at it may be drawn anew.
 */
export interface Cursor {
  readonly read: () => number | null
  readonly move: (temperatureGeV: number | null) => void
  readonly follow: (heard: () => void) => () => void
}

export function createCursor(): Cursor {
  let at: number | null = null
  const followers = new Set<() => void>()
  return {
    read: () => at,
    move(temperatureGeV) {
      if (temperatureGeV === at) return
      at = temperatureGeV
      followers.forEach((heard) => heard())
    },
    follow(heard) {
      followers.add(heard)
      return () => void followers.delete(heard)
    },
  }
}

/** A cursor for the page that makes it. */
export const usePageCursor = (): Cursor => useState(createCursor)[0]

/** Where the cursor is, GeV; whoever asks is drawn anew as it moves. */
export const useCursorAt = (cursor: Cursor): number | null => useSyncExternalStore(cursor.follow, cursor.read)
