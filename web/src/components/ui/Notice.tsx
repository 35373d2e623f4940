import type { ReactNode } from 'react'
import { ApiProblem, saysSignedOut } from '../../lib/apiProblem.ts'

/** What went wrong, what was kept, what to do. */
export function ErrorNotice({ error, children }: { error: Error; children?: ReactNode }) {
  const problem = error instanceof ApiProblem ? error : null
  return (
    <div role="alert" className="border-l-2 border-fault py-1 pl-3">
      <p className="font-semibold">{problem?.title ?? 'Something went wrong'}</p>
      <p className="text-soft">{error.message}</p>
      {problem?.faults.map((fault) => (
        <p key={fault.path} className="text-small text-fault">
          <code className="font-mono">{fault.path === '' ? 'input' : fault.path}</code>: {fault.message}
        </p>
      ))}
      {saysSignedOut(error) ? (
        <p>
          <a href="/sign-in" target="_blank" rel="noreferrer" className="link">
            Sign in in another tab
          </a>
          , then go on here.
        </p>
      ) : null}
      {problem?.requestId === undefined || problem.status < 500 ? null : (
        <p className="text-caption text-soft">Request {problem.requestId}</p>
      )}
      {children}
    </div>
  )
}

/** A place where nothing is yet: what belongs here, and the next step. */
export function EmptyState({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div className="mx-auto grid max-w-lg gap-2 py-16 text-center">
      <p className="font-serif text-title">{title}</p>
      <div className="text-soft">{children}</div>
    </div>
  )
}

/** Keeps the place of something on its way. */
export function Skeleton({ label, className = 'h-6' }: { label: string; className?: string }) {
  return (
    <div role="status" aria-label={label} className={`rounded bg-sunk ${className}`}>
      <span className="sr-only">{label}</span>
    </div>
  )
}
