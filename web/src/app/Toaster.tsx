import { Toaster as Sonner } from 'sonner'

/** Messages that pass; loaded after the page. */
export default function Toaster() {
  return (
    <Sonner
      position="bottom-right"
      toastOptions={{
        style: {
          background: 'var(--raised)',
          color: 'var(--ink)',
          borderColor: 'var(--rule)',
          fontFamily: 'var(--font-sans)',
        },
      }}
    />
  )
}
