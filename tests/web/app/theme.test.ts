import { afterEach, describe, expect, it } from 'vitest'
import { systemTurns } from './browser.ts'
import { chooseTheme } from '../../../web/src/app/theme.ts'

const shown = (): string | undefined => document.documentElement.dataset['theme']

afterEach(() => {
  systemTurns('light')
  localStorage.clear()
})

describe('the theme', () => {
  it('follows the system while nothing else is chosen', () => {
    chooseTheme('system')
    expect(shown()).toBe('day')
    systemTurns('dark')
    expect(shown()).toBe('night')
    systemTurns('light')
    expect(shown()).toBe('day')
  })

  it.each(['day', 'night'] as const)('stays %s once chosen, whatever the system does', (choice) => {
    chooseTheme(choice)
    systemTurns('dark')
    expect(shown()).toBe(choice)
    systemTurns('light')
    expect(shown()).toBe(choice)
    expect(localStorage.getItem('emberline.theme')).toBe(choice)
  })

  it('goes back to the system', () => {
    chooseTheme('night')
    chooseTheme('system')
    expect(shown()).toBe('day')
  })
})
