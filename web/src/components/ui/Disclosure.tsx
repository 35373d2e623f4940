import type { ReactNode } from 'react'

/** A heading that opens to more. */
export function Disclosure({ summary, children }: { summary: ReactNode; children: ReactNode }) {
  return (
    <details className="group border-t border-rule py-2">
      <summary className="list-none text-small font-semibold marker:hidden hover:text-ember">
        <span
          aria-hidden="true"
          className="mr-1.5 inline-block text-soft transition-transform group-open:rotate-90"
        >
          ›
        </span>
        {summary}
      </summary>
      <div className="pt-2">{children}</div>
    </details>
  )
}
