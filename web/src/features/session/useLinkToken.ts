import { useLocation } from 'react-router-dom'

/** The token of the link this page was opened by: it stands after the #, so that no server logs it. */
export const useLinkToken = (): string => useLocation().hash.slice(1)
