import { useEffect } from 'react'

/** ⌘/Ctrl-Z and ⌘/Ctrl-Shift-Z, outside of text fields, which have an undo of their own. */
export function useUndoKeys(undo: () => void, redo: () => void): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      const inText = event.target instanceof HTMLElement && event.target.closest('input, textarea') !== null
      if (inText || event.key.toLowerCase() !== 'z' || !(event.ctrlKey || event.metaKey)) return
      event.preventDefault()
      if (event.shiftKey) redo()
      else undo()
    }
    addEventListener('keydown', onKey)
    return () => removeEventListener('keydown', onKey)
  }, [undo, redo])
}
