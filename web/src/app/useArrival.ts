import { useEffect, useRef } from 'react'
import { useLocation } from 'react-router-dom'

/** Moves the focus to what the page is about, so that reading and the Tab key go on there. */
export function focusMain(): void {
  const main = document.getElementById('main')
  if (!main) return
  main.tabIndex = -1
  main.focus({ preventScroll: true })
}

/** After a change of page the focus goes along; the first page leaves it where the browser put it. */
export function useArrival(): void {
  const { pathname } = useLocation()
  const arrivedAt = useRef(pathname)
  useEffect(() => {
    if (arrivedAt.current === pathname) return
    arrivedAt.current = pathname
    focusMain()
  }, [pathname])
}
