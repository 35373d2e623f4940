import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { sessionQuery } from '../../api/session.ts'
import { BUTTON_LOOK } from '../../components/ui/Button.tsx'

/** Records begin on the Bench, as a change of what stands there saved under a name of its own; readers save nothing. */
export function NewOnBench({ kind }: { kind: 'history' | 'candidate' }) {
  const { data: session } = useQuery(sessionQuery)
  if (!session || session.role === 'reader') return null
  return (
    <Link to="/bench" className={BUTTON_LOOK.quiet}>
      New {kind} on the Bench
    </Link>
  )
}
