import { describe, expect, it } from 'vitest'
import { keyAction } from '../../../../web/src/components/charts/chartKeys.ts'
import { between, shifted, withEnd, zoomed } from '../../../../web/src/components/charts/window.ts'

const WINDOW = { hotGeV: 100, coldGeV: 0.01 }
const SPAN = { hotGeV: 1e4, coldGeV: 1e-4 }

describe('the window of temperatures', () => {
  it('zooms about a temperature that stays in its place', () => {
    const { hotGeV, coldGeV } = zoomed(WINDOW, 10, 0.5)
    expect(hotGeV).toBeCloseTo(10 * Math.sqrt(10))
    expect(coldGeV).toBeCloseTo(10 / Math.sqrt(1000))
  })

  it('stays as it is rather than become too narrow or too wide to show anything', () => {
    expect(zoomed(WINDOW, 1, 0.001)).toBe(WINDOW)
    expect(zoomed(WINDOW, 1, 10)).toBe(WINDOW)
  })

  it('is what was dragged over, in either direction, and nothing for a click', () => {
    expect(between(0.1, 10)).toEqual({ hotGeV: 10, coldGeV: 0.1 })
    expect(between(10, 0.1)).toEqual({ hotGeV: 10, coldGeV: 0.1 })
    expect(between(1, 1.1)).toBeNull()
  })

  it('keeps its ends inside the span and in their order', () => {
    expect(withEnd(WINDOW, 'hot', 1e9, SPAN)).toEqual({ hotGeV: 1e4, coldGeV: 0.01 })
    expect(withEnd(WINDOW, 'cold', 0, SPAN)).toEqual({ hotGeV: 100, coldGeV: 1e-4 })
    const squeezed = withEnd(WINDOW, 'hot', 1e-3, SPAN)
    expect(squeezed.hotGeV).toBeGreaterThan(squeezed.coldGeV)
    const other = withEnd(WINDOW, 'cold', 1e3, SPAN)
    expect(other.hotGeV).toBeGreaterThan(other.coldGeV)
  })

  it('moves as a whole, keeping its width, up to the end of the span', () => {
    const moved = shifted(WINDOW, 1e6, SPAN)
    expect(moved.hotGeV).toBeCloseTo(1e4)
    expect(moved.hotGeV / moved.coldGeV).toBeCloseTo(1e4)
  })
})

describe('the keys of a chart', () => {
  const cursorAfter = (key: string, cursorGeV: number | null): number | null => {
    const action = keyAction(key, WINDOW, cursorGeV)
    if (action?.kind !== 'cursor') throw new Error(`${key} does not move the cursor`)
    return action.cursorGeV
  }

  it('move the cursor to the hot at the left and to the cold at the right', () => {
    expect(cursorAfter('ArrowLeft', 1)).toBeGreaterThan(1)
    expect(cursorAfter('ArrowRight', 1)).toBeLessThan(1)
    expect(cursorAfter('ArrowRight', null)).toBeLessThan(1)
  })

  it('hold the cursor inside the window', () => {
    expect(cursorAfter('PageUp', 99)).toBe(100)
    expect(cursorAfter('End', 1)).toBe(0.01)
    expect(cursorAfter('ArrowLeft', 1e5)).toBe(100)
  })

  it('zoom, reset, clear, and leave every other key alone', () => {
    expect(keyAction('+', WINDOW, 1)).toEqual({ kind: 'window', window: zoomed(WINDOW, 1, 0.7) })
    expect(keyAction('0', WINDOW, 1)).toEqual({ kind: 'reset' })
    expect(cursorAfter('Escape', 1)).toBeNull()
    expect(keyAction('Tab', WINDOW, 1)).toBeNull()
  })
})
