const HOME = '/bench'

/** The page to go on to after signing in: an address of this product, or the Bench when what is asked for is none. */
export function ownAddress(to: string | null): string {
  if (to === null || !URL.canParse(to, location.origin)) return HOME
  const { origin, pathname, search } = new URL(to, location.origin)
  const own = to.startsWith('/') && origin === location.origin && !pathname.startsWith('//')
  return own && pathname !== '/sign-in' ? pathname + search : HOME
}

/** The sign-in that leads back to `address`, a path with its query. */
export const signInFor = (address: string): string => `/sign-in?to=${encodeURIComponent(address)}`
