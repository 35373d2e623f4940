import type { ButtonHTMLAttributes, ReactNode } from 'react'

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  variant?: 'primary' | 'quiet' | 'link'
  /** Work is under way: the button waits and says so. */
  busy?: boolean
  children: ReactNode
}

/** How what is pressed looks, for links that stand as buttons too. */
export const BUTTON_LOOK = {
  primary:
    'rounded-[5px] bg-ink px-3.5 py-1.5 font-semibold text-on-ink hover:opacity-90 disabled:opacity-50',
  quiet:
    'rounded-[5px] border border-rule bg-raised px-3.5 py-1.5 font-medium hover:border-faint disabled:opacity-50',
  link: 'link disabled:opacity-50',
} as const

export function Button({
  variant = 'quiet',
  busy = false,
  children,
  className = '',
  disabled,
  ...rest
}: ButtonProps) {
  return (
    <button
      type="button"
      {...rest}
      disabled={disabled || busy}
      aria-busy={busy}
      className={`${BUTTON_LOOK[variant]} ${className}`}
    >
      {children}
      {busy ? <span aria-hidden="true"> …</span> : null}
    </button>
  )
}
