import { useSyncExternalStore } from 'react'

export type ThemeChoice = 'system' | 'day' | 'night'

const KEY = 'emberline.theme'
const listeners = new Set<() => void>()

function stored(): ThemeChoice {
  try {
    const choice = localStorage.getItem(KEY)
    return choice === 'day' || choice === 'night' ? choice : 'system'
  } catch {
    return 'system'
  }
}

let choice = stored()
const dark = matchMedia('(prefers-color-scheme: dark)')

function apply(): void {
  const night = choice === 'night' || (choice === 'system' && dark.matches)
  document.documentElement.dataset['theme'] = night ? 'night' : 'day'
  for (const listener of listeners) listener()
}

dark.addEventListener('change', apply)

export function chooseTheme(next: ThemeChoice): void {
  choice = next
  try {
    localStorage.setItem(KEY, next)
  } catch {
    // Without storage the choice lasts until the page is closed.
  }
  apply()
}

/** The theme chosen, for the switch. */
export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    () => choice,
  )
}
