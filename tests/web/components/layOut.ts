import { vi } from 'vitest'

/** Gives every element a width, which jsdom, having no layout, does not. */
export function layOut(width: number): void {
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe(): void {}
      disconnect(): void {}
    },
  )
  vi.spyOn(HTMLElement.prototype, 'clientWidth', 'get').mockReturnValue(width)
}
