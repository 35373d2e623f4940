import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import type { CreateKeyResult } from '#core/wire/index'
import { keysQuery } from '../../api/keys.ts'
import type { KeysOf } from '../../api/keys.ts'
import { sessionQuery } from '../../api/session.ts'
import { Button } from '../../components/ui/Button.tsx'
import { SegmentedChoice } from '../../components/ui/SegmentedChoice.tsx'
import { ListPage } from '../records/ListPage.tsx'
import { KeyTable } from './KeyTable.tsx'
import { NewKeyDialog } from './NewKeyDialog.tsx'
import { NewSecret } from './NewSecret.tsx'

const WHOSE = [
  { value: 'me', label: 'My keys' },
  { value: 'group', label: 'Everyone’s' },
] as const satisfies readonly { value: KeysOf; label: string }[]

/** Keys for scripts: one's own, and for a lead the whole group's. */
export default function KeysPage() {
  const { data: session } = useQuery(sessionQuery)
  const [search, setSearch] = useSearchParams()
  const isLead = session?.role === 'lead'
  const of: KeysOf = isLead && search.get('of') === 'group' ? 'group' : 'me'
  const query = useQuery(keysQuery(of))
  const [asking, setAsking] = useState(false)
  const [made, setMade] = useState<CreateKeyResult | null>(null)
  return (
    <>
      <ListPage
        title="API keys"
        purpose="For scripts that read, compute or save as you. A key does what your role may do, and no more."
        action={
          <div className="flex flex-wrap items-center gap-4">
            {isLead ? (
              <SegmentedChoice
                label="Whose keys"
                value={of}
                options={WHOSE}
                onChange={(value) => setSearch(value === 'me' ? {} : { of: value }, { replace: true })}
              />
            ) : null}
            <Button variant="primary" onClick={() => setAsking(true)}>
              New key
            </Button>
          </div>
        }
        of={query}
        emptyTitle="No key yet"
        emptyStep={
          <p>
            A key lets a script ask what you may ask. How it is used stands in the{' '}
            <Link to="/reference" className="link">
              API reference
            </Link>
            .
          </p>
        }
      >
        {(keys) => <KeyTable keys={keys} showOwners={of === 'group'} />}
      </ListPage>
      {asking ? (
        <NewKeyDialog
          mayWrite={session !== null && session !== undefined && session.role !== 'reader'}
          onClose={() => setAsking(false)}
          onMade={(result) => {
            setAsking(false)
            setMade(result)
          }}
        />
      ) : null}
      {made ? <NewSecret made={made} onClose={() => setMade(null)} /> : null}
    </>
  )
}
