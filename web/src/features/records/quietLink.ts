/** Links that stand in rows of links: ember everywhere would shout. */
export const QUIET_LINK =
  'underline decoration-faint decoration-1 underline-offset-3 hover:text-ember hover:decoration-ember'
