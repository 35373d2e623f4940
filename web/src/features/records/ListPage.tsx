import type { ReactNode } from 'react'
import { EmptyState } from '../../components/ui/Notice.tsx'
import { Loaded } from './Loaded.tsx'
import type { Loading } from './Loaded.tsx'
import { Page } from './Page.tsx'

interface ListPageProps<T> {
  title: string
  purpose: string
  of: Loading<T[]>
  emptyTitle: string
  emptyStep: ReactNode
  children: (rows: T[]) => ReactNode
}

/** A list with its title, its purpose in a line, and what to do while it is empty. */
export function ListPage<T>({ title, purpose, of, emptyTitle, emptyStep, children }: ListPageProps<T>) {
  return (
    <Page title={title}>
      <header>
        <h1>{title}</h1>
        <p className="text-soft">{purpose}</p>
      </header>
      <Loaded of={of} what={title.toLowerCase()}>
        {(rows) =>
          rows.length === 0 ? <EmptyState title={emptyTitle}>{emptyStep}</EmptyState> : children(rows)
        }
      </Loaded>
    </Page>
  )
}
