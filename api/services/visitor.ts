import type { RequestOrigin } from '../middleware/caller.ts'

/** Who asks, as far as it can be told before anybody has signed in. */
export interface Visitor {
  /** The network address; an IPv6 one cut to the part that is one party's. */
  address: string
  userAgent: string
  /** The same for the audit log. */
  from: RequestOrigin
  /** The token by which a browser that signed in before is known. */
  deviceToken: string | null
}
