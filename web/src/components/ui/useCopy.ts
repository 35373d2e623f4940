import { useEffect, useState } from 'react'

/** What became of copying: nothing asked yet, done, or not allowed by the browser, as on a page without TLS. */
export type Copying = 'idle' | 'copied' | 'refused'

/** How long "copied" stands, ms. */
const STANDS = 2500

/** Puts text on the clipboard and tells what became of it. */
export function useCopy(): [Copying, (text: string) => Promise<void>] {
  const [state, setState] = useState<Copying>('idle')
  useEffect(() => {
    if (state !== 'copied') return
    const timer = setTimeout(() => setState('idle'), STANDS)
    return () => clearTimeout(timer)
  }, [state])
  const copy = async (text: string): Promise<void> => {
    try {
      await navigator.clipboard.writeText(text)
      setState('copied')
    } catch {
      setState('refused')
    }
  }
  return [state, copy]
}
