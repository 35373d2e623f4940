/** Every kind of problem the API answers with; the kind is the last part of the document's `type`. */
export const PROBLEMS = {
  'malformed-body': { status: 400, title: 'The body of the request could not be read' },
  'not-signed-in': { status: 401, title: 'Nobody is signed in' },
  'wrong-credentials': { status: 401, title: 'E-mail address and password do not go together' },
  'bad-key': { status: 401, title: 'The API key is not valid' },
  'key-scope': { status: 403, title: 'The API key does not reach this far' },
  'second-factor-needed': { status: 401, title: 'The code of your second factor is needed' },
  'wrong-code': { status: 401, title: 'The code is not right' },
  'not-allowed': { status: 403, title: 'Your role does not allow this' },
  'no-group': { status: 403, title: 'Your account is in no group' },
  'other-site': { status: 403, title: 'The request came from another site' },
  'not-found': { status: 404, title: 'There is nothing here' },
  'guest-link-closed': { status: 404, title: 'This link opens nothing' },
  'second-factor-set': { status: 409, title: 'There is a second factor already' },
  'stale-parent': { status: 409, title: 'A newer revision was saved meanwhile' },
  'link-not-valid': { status: 410, title: 'This link is not valid any more' },
  'too-large': { status: 413, title: 'The body of the request is too large' },
  'not-json': { status: 415, title: 'The body of the request must be JSON' },
  'invalid-input': { status: 422, title: 'The input is at fault' },
  'no-convergence': { status: 422, title: 'No converged number was reached' },
  'too-many-requests': { status: 429, title: 'Too many requests' },
  'too-many-attempts': { status: 429, title: 'Too many attempts' },
  busy: { status: 503, title: 'Too many computations at once' },
  internal: { status: 500, title: 'Something went wrong on the server' },
  'database-away': { status: 503, title: 'The database does not answer' },
} as const satisfies Record<string, { status: number; title: string }>

export type ProblemKind = keyof typeof PROBLEMS

export const problemType = (kind: ProblemKind): string => `urn:emberline:problem:${kind}`
