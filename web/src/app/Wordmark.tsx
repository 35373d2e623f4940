import { Link } from 'react-router-dom'

/** The name, with an ember cooling along a line. */
export function Wordmark() {
  return (
    <Link to="/bench" className="flex items-center gap-2.5 font-serif text-[1.35rem]">
      <svg viewBox="0 0 34 12" width="34" height="12" aria-hidden="true">
        <path d="M1 6h11" stroke="var(--ramp-2)" strokeWidth="2" strokeLinecap="round" />
        <path d="M22 6h11" stroke="var(--ramp-5)" strokeWidth="2" strokeLinecap="round" />
        <circle cx="17" cy="6" r="4.2" fill="var(--ember)" />
      </svg>
      Emberline
    </Link>
  )
}
