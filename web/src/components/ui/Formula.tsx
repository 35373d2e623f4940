import type { ReactNode } from 'react'

/** Subscripts as the core writes them: _eq, _Pl, _s,0, or one letter; superscripts as ^(3/4). */
const SCRIPTS = /_(eq|eff|Pl|s,0|[A-Za-zα-ω])|\^\(([^)]*)\)/g

/** A formula of plain text, with its sub- and superscripts set as such. */
export function Formula({ text }: { text: string }) {
  const parts: ReactNode[] = []
  let from = 0
  for (const match of text.matchAll(SCRIPTS)) {
    parts.push(text.slice(from, match.index))
    const [whole, sub, sup] = match
    parts.push(sub === undefined ? <sup key={match.index}>{sup}</sup> : <sub key={match.index}>{sub}</sub>)
    from = match.index + whole.length
  }
  parts.push(text.slice(from))
  return <span className="font-serif">{parts}</span>
}
