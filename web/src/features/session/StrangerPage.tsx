import type { ReactNode } from 'react'
import { Wordmark } from '../../app/Wordmark.tsx'

interface StrangerPageProps {
  title: string
  purpose?: ReactNode
  children: ReactNode
}

/** The frame of the pages before the sign-in. */
export const StrangerPage = ({ title, purpose, children }: StrangerPageProps) => (
  <main id="main" className="mx-auto grid w-full max-w-md gap-6 px-5 py-14">
    <title>{`${title} · Emberline`}</title>
    <Wordmark />
    <div>
      <h1>{title}</h1>
      {purpose === undefined ? null : <p className="text-soft">{purpose}</p>}
    </div>
    {children}
  </main>
)
