import { chooseGroupRequest, ownGroups, sessionInfo, signInRequest } from '#core/wire/index'
import { endpoint } from './endpoint.ts'

const tag = 'session'

export const signInEndpoint = endpoint({
  id: 'signIn',
  method: 'post',
  path: '/session',
  tag,
  summary: 'Sign in; the answer sets the session’s cookie',
  may: 'anyone',
  body: signInRequest,
  status: 201,
  answer: sessionInfo,
  answerIs: 'Who has signed in, in which group, as what',
  problems: ['wrong-credentials', 'second-factor-needed', 'wrong-code', 'no-group', 'too-many-attempts'],
})

export const whoAmIEndpoint = endpoint({
  id: 'whoAmI',
  method: 'get',
  path: '/session',
  tag,
  summary: 'Who is signed in',
  may: 'read',
  status: 200,
  answer: sessionInfo,
  answerIs: 'Who is signed in, in which group, as what',
})

export const listOwnGroupsEndpoint = endpoint({
  id: 'listOwnGroups',
  method: 'get',
  path: '/session/groups',
  tag,
  summary: 'The groups one belongs to, among which the session can be turned',
  may: 'keep-account',
  status: 200,
  answer: ownGroups,
  answerIs: 'The groups by name',
})

export const chooseGroupEndpoint = endpoint({
  id: 'chooseGroup',
  method: 'post',
  path: '/session/group',
  tag,
  summary: 'Turn the session to another of one’s groups',
  may: 'keep-account',
  body: chooseGroupRequest,
  status: 200,
  answer: sessionInfo,
  answerIs: 'Who is signed in, in which group now, as what there',
  problems: ['not-found'],
})

export const signOutEndpoint = endpoint({
  id: 'signOut',
  method: 'delete',
  path: '/session',
  tag,
  summary: 'Sign out: the session is revoked and the cookie cleared; no error when nobody was signed in',
  may: 'anyone',
  status: 204,
  answerIs: 'Nobody is signed in any more',
})
