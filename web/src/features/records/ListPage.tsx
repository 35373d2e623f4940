import type { ReactNode } from 'react'
import { EmptyState } from '../../components/ui/Notice.tsx'
import { Loaded } from './Loaded.tsx'
import type { Loading } from './Loaded.tsx'
import { Page } from './Page.tsx'

interface ListPageProps<T> {
  title: string
  purpose: string
  /** How another one is made. */
  action?: ReactNode
  of: Loading<T[]>
  /** What stands above the list whether or not it is empty, such as filters that the server applies. */
  above?: ReactNode
  emptyTitle: string
  emptyStep: ReactNode
  children: (rows: T[]) => ReactNode
}

/** A list with its title, its purpose in a line, and what to do while it is empty. */
export function ListPage<T>(props: ListPageProps<T>) {
  const { title, purpose, action, of, above, emptyTitle, emptyStep, children } = props
  return (
    <Page title={title}>
      <header className="flex flex-wrap items-end justify-between gap-x-8 gap-y-3">
        <div>
          <h1>{title}</h1>
          <p className="text-soft">{purpose}</p>
        </div>
        {action}
      </header>
      {above}
      <Loaded of={of} what={title.toLowerCase()}>
        {(rows) =>
          rows.length === 0 ? <EmptyState title={emptyTitle}>{emptyStep}</EmptyState> : children(rows)
        }
      </Loaded>
    </Page>
  )
}
