import { useEffect } from 'react'
import type { RefObject } from 'react'
import { useLocation } from 'react-router-dom'

/** Closes what opened from a button: by Escape, which gives the focus back, by a press elsewhere, and on leaving the page. */
export function useDismissal(
  open: boolean,
  close: () => void,
  around: RefObject<HTMLElement | null>,
  button: RefObject<HTMLElement | null>,
): void {
  const { key } = useLocation()
  useEffect(() => {
    if (!open) return
    const onPress = ({ target }: PointerEvent): void => {
      if (target instanceof Node && !around.current?.contains(target)) close()
    }
    const onKey = (event: KeyboardEvent): void => {
      if (event.key !== 'Escape') return
      close()
      button.current?.focus()
    }
    document.addEventListener('pointerdown', onPress)
    document.addEventListener('keydown', onKey)
    return () => {
      document.removeEventListener('pointerdown', onPress)
      document.removeEventListener('keydown', onKey)
    }
  }, [open, close, around, button])
  useEffect(() => close, [key, close])
}
