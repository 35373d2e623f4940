import type { Role } from '#core/wire/index'

/** Who may do what: the only place where roles are named. */
const MAY = {
  read: ['lead', 'author', 'reader'],
  compute: ['lead', 'author', 'reader'],
  'save-revision': ['lead', 'author'],
  'save-evaluation': ['lead', 'author'],
} as const satisfies Record<string, readonly Role[]>

export type Action = keyof typeof MAY

export const rolesThatMay = (action: Action): readonly Role[] => MAY[action]

export const may = (role: Role, action: Action): boolean => rolesThatMay(action).includes(role)
