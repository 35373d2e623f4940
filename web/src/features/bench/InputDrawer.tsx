import { useEffect, useId, useState } from 'react'
import type { ReactNode } from 'react'
import type { BenchReport } from '#core/bench/types'
import { Button } from '../../components/ui/Button.tsx'
import { Num } from '../../components/ui/Num.tsx'
import { OmegaH2 } from '../../components/ui/symbols.tsx'

/** The left column; on a phone a drawer over the page, with the answer in sight beneath it. */
export function InputDrawer({ report, children }: { report: BenchReport | null; children: ReactNode }) {
  const [open, setOpen] = useState(false)
  const id = useId()
  useEffect(() => {
    if (!open) return
    const onKey = (event: KeyboardEvent): void => {
      if (event.key === 'Escape') setOpen(false)
    }
    addEventListener('keydown', onKey)
    return () => removeEventListener('keydown', onKey)
  }, [open])
  return (
    <div className="border-rule md:border-r">
      <div className="fixed inset-x-0 bottom-0 z-20 flex items-center justify-between gap-3 border-t border-rule bg-paper px-4 py-2 md:hidden">
        <span className="whitespace-nowrap">
          {report ? (
            <>
              <span className="text-soft">
                <OmegaH2 />
              </span>{' '}
              <Num value={report.result.omegaH2} />
            </>
          ) : null}
        </span>
        <Button onClick={() => setOpen(!open)} aria-expanded={open} aria-controls={id}>
          {open ? 'Hide the inputs' : 'Change the inputs'}
        </Button>
      </div>
      <div
        id={id}
        className={`px-4 py-5 max-md:fixed max-md:inset-x-0 max-md:top-[20dvh] max-md:bottom-[3.2rem] max-md:z-20 max-md:overflow-auto max-md:overscroll-contain max-md:border-t max-md:border-rule max-md:bg-paper md:pr-5 md:pl-7 ${open ? '' : 'max-md:hidden'}`}
      >
        {children}
      </div>
    </div>
  )
}
