import { Link } from 'react-router-dom'
import { EmptyState } from '../components/ui/Notice.tsx'

export function NotFoundPage() {
  return (
    <main id="main" className="px-6">
      <title>Not found · Emberline</title>
      <EmptyState title="There is no page at this address">
        It may have been mistyped, or what it showed belongs to another group. <br />
        <Link className="link" to="/bench">
          Go to the Bench
        </Link>
      </EmptyState>
    </main>
  )
}
