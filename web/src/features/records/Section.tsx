import { useId } from 'react'
import type { ReactNode } from 'react'

/** A part of a page under a heading of its own. */
export function Section({ title, children }: { title: string; children: ReactNode }) {
  const id = useId()
  return (
    <section aria-labelledby={id} className="grid grid-cols-[minmax(0,1fr)] content-start gap-2">
      <h2 id={id} className="border-b border-rule pb-1">
        {title}
      </h2>
      {children}
    </section>
  )
}
