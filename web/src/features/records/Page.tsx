import type { ReactNode } from 'react'

/** The frame of a page of records; its title is also the window's. */
export function Page({ title, children }: { title: string; children: ReactNode }) {
  return (
    <main
      id="main"
      className="mx-auto grid w-full max-w-[76rem] grid-cols-[minmax(0,1fr)] gap-5 px-(--gutter) py-7 max-md:px-4"
    >
      <title>{`${title} · Emberline`}</title>
      {children}
    </main>
  )
}
