/** What each entry of the log says in words; an action not known here is shown as it is. */
const ACTIONS: Record<string, string> = {
  'history.create': 'made a history',
  'history.revise': 'revised a history',
  'candidate.create': 'made a candidate',
  'candidate.revise': 'revised a candidate',
  'evaluation.create': 'stored an evaluation',
  'key.create': 'made an API key',
  'key.revoke': 'revoked an API key',
  'guest-link.create': 'made a guest link',
  'guest-link.revoke': 'revoked a guest link',
  'session.open': 'signed in',
  'session.close': 'signed out',
  'session.turn': 'turned to this group',
  'session.end': 'ended a session of theirs',
  'account.rename': 'changed their name',
  'account.password': 'changed their password',
  'account.email': 'changed their address',
  'account.second-factor': 'changed their second factor',
  'invitation.create': 'invited somebody',
  'invitation.withdraw': 'withdrew an invitation',
  'invitation.accept': 'accepted an invitation',
  'group.create': 'made the group',
}

export const actionWords = (action: string): string => ACTIONS[action] ?? action

/** Kinds of record the log can be narrowed to. */
export const KINDS = [
  { value: '', label: 'everything' },
  { value: 'history', label: 'histories' },
  { value: 'candidate', label: 'candidates' },
  { value: 'evaluation', label: 'evaluations' },
  { value: 'key', label: 'API keys' },
  { value: 'guest-link', label: 'guest links' },
  { value: 'session', label: 'signing in and out' },
  { value: 'account', label: 'accounts' },
  { value: 'invitation', label: 'invitations' },
] as const
