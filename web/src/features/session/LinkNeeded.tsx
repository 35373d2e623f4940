import { Link } from 'react-router-dom'

/** Where a page is opened without the token its link carries. */
export const LinkNeeded = ({ what }: { what: string }) => (
  <p>
    This page is opened by {what}, whole: part of the address is missing.{' '}
    <Link to="/sign-in" className="link">
      Sign in
    </Link>
  </p>
)
