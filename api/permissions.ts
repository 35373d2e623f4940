import type { KeyScope, Role } from '#core/wire/index'

const EVERYONE = ['lead', 'author', 'reader'] as const
const WRITERS = ['lead', 'author'] as const
const LEADS = ['lead'] as const

interface Rule {
  roles: readonly Role[]
  /** The least an API key must be allowed to do it; null for what is done in a browser only. */
  scope: KeyScope | null
}

/** Who may do what: the only place where roles and scopes are named. */
const MAY = {
  read: { roles: EVERYONE, scope: 'read' },
  compute: { roles: EVERYONE, scope: 'compute' },
  'save-revision': { roles: WRITERS, scope: 'write' },
  'save-evaluation': { roles: WRITERS, scope: 'write' },
  'guest-links': { roles: WRITERS, scope: 'write' },
  'all-guest-links': { roles: LEADS, scope: 'write' },
  'own-keys': { roles: EVERYONE, scope: null },
  'all-keys': { roles: LEADS, scope: null },
  'read-audit-log': { roles: LEADS, scope: 'read' },
  /** One’s own account, whichever the role. */
  'keep-account': { roles: EVERYONE, scope: null },
  invite: { roles: LEADS, scope: null },
} as const satisfies Record<string, Rule>

export type Action = keyof typeof MAY

const SCOPES: readonly KeyScope[] = ['read', 'compute', 'write']

export const rolesThatMay = (action: Action): readonly Role[] => MAY[action].roles

export const scopeFor = (action: Action): KeyScope | null => MAY[action].scope

export const may = (role: Role, action: Action): boolean => rolesThatMay(action).includes(role)

/** Whether a key of this scope reaches as far as the action; its holder's role is asked apart. */
export function keyMay(scope: KeyScope, action: Action): boolean {
  const needed = scopeFor(action)
  return needed !== null && SCOPES.indexOf(scope) >= SCOPES.indexOf(needed)
}
