import { zoomed } from './window.ts'
import type { TemperatureWindow } from './window.ts'

/** What a key asks of a chart. */
export type KeyAction =
  | { kind: 'cursor'; cursorGeV: number | null }
  | { kind: 'window'; window: TemperatureWindow }
  | { kind: 'reset' }

/** Parts of the window's width, in ln T, of a step and of a large one. */
const STEP = 1 / 100
const LARGE_STEP = 1 / 10

const ZOOM_IN = 0.7

/** Where the cursor is taken to be before it is anywhere: the middle of the window. */
export const cursorOrMiddle = (cursorGeV: number | null, { hotGeV, coldGeV }: TemperatureWindow): number =>
  Math.min(hotGeV, Math.max(coldGeV, cursorGeV ?? Math.sqrt(hotGeV * coldGeV)))

/** Arrows and page keys move the cursor, Home and End take it to the ends, + and - zoom about it, 0 resets, Escape clears; null for any other key. */
export function keyAction(
  key: string,
  window: TemperatureWindow,
  cursorGeV: number | null,
): KeyAction | null {
  const from = cursorOrMiddle(cursorGeV, window)
  const width = Math.log(window.hotGeV / window.coldGeV)
  const moved = (share: number): KeyAction => ({
    kind: 'cursor',
    cursorGeV: cursorOrMiddle(from * Math.exp(share * width), window),
  })
  switch (key) {
    case 'ArrowLeft':
    case 'ArrowUp':
      return moved(STEP)
    case 'ArrowRight':
    case 'ArrowDown':
      return moved(-STEP)
    case 'PageUp':
      return moved(LARGE_STEP)
    case 'PageDown':
      return moved(-LARGE_STEP)
    case 'Home':
      return { kind: 'cursor', cursorGeV: window.hotGeV }
    case 'End':
      return { kind: 'cursor', cursorGeV: window.coldGeV }
    case '+':
    case '=':
      return { kind: 'window', window: zoomed(window, from, ZOOM_IN) }
    case '-':
      return { kind: 'window', window: zoomed(window, from, 1 / ZOOM_IN) }
    case '0':
      return { kind: 'reset' }
    case 'Escape':
      return { kind: 'cursor', cursorGeV: null }
    default:
      return null
  }
}
