/** Stands in for what jsdom lacks: the system's choice of theme, and scrolling. Import it before what asks for them. */
const listeners = new Set<() => void>()
let dark = false

const query = {
  get matches() {
    return dark
  },
  addEventListener: (_kind: string, listener: () => void) => void listeners.add(listener),
}

Object.assign(window, { matchMedia: () => query, scrollTo: () => undefined })

export function systemTurns(theme: 'dark' | 'light'): void {
  dark = theme === 'dark'
  for (const listener of listeners) listener()
}
