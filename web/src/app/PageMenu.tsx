import { useCallback, useId, useRef, useState } from 'react'
import { NavLink } from 'react-router-dom'
import { useDismissal } from './useDismissal.ts'

/** A page stands here once it works. */
const PAGES = [
  ['/bench', 'Bench'],
  ['/histories', 'Histories'],
  ['/candidates', 'Candidates'],
  ['/evaluations', 'Evaluations'],
] as const

const Pages = () =>
  PAGES.map(([to, label]) => (
    <NavLink
      key={to}
      to={to}
      className="border-b-2 border-transparent px-0.5 py-3 text-soft hover:text-ink aria-[current=page]:border-ember aria-[current=page]:font-semibold aria-[current=page]:text-ink"
    >
      {label}
    </NavLink>
  ))

/** The pages, side by side where there is room. */
export const PageRow = () => (
  <nav aria-label="Pages" className="hidden gap-6 md:flex">
    <Pages />
  </nav>
)

/** The pages behind a button, on narrow screens. */
export function PageMenu() {
  const [open, setOpen] = useState(false)
  const around = useRef<HTMLDivElement>(null)
  const button = useRef<HTMLButtonElement>(null)
  const close = useCallback(() => setOpen(false), [])
  useDismissal(open, close, around, button)
  const id = useId()
  return (
    <div ref={around} className="md:hidden">
      <button
        ref={button}
        type="button"
        className="py-3 text-soft hover:text-ink"
        aria-expanded={open}
        aria-controls={id}
        onClick={() => setOpen(!open)}
      >
        Menu
      </button>
      {open ? (
        <nav
          id={id}
          aria-label="Pages"
          className="absolute inset-x-0 top-full z-30 grid border-b border-rule bg-paper px-4 pb-3 shadow-lg"
        >
          <Pages />
        </nav>
      ) : null}
    </div>
  )
}
