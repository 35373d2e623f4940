import { Dialog as Radix } from 'radix-ui'
import type { ReactNode } from 'react'

interface DialogProps {
  open: boolean
  onOpenChange: (open: boolean) => void
  title: string
  description?: string
  children: ReactNode
}

/** A question that must be answered before going on. Escape and the cross close it. */
export function Dialog({ open, onOpenChange, title, description, children }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-black/40" />
        <Radix.Content
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
          className="fixed top-1/2 left-1/2 z-50 grid max-h-[90dvh] w-[min(34rem,calc(100vw-2rem))] -translate-x-1/2 -translate-y-1/2 gap-3 overflow-auto rounded-[8px] border border-rule bg-paper p-6 shadow-xl"
        >
          <Radix.Title className="font-serif text-title font-medium">{title}</Radix.Title>
          {description === undefined ? null : (
            <Radix.Description className="text-soft">{description}</Radix.Description>
          )}
          {children}
          <Radix.Close
            aria-label="Close"
            className="absolute top-3 right-3 rounded px-2 py-1 text-soft hover:text-ink"
          >
            ×
          </Radix.Close>
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
