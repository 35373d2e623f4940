import {
  acceptInvitationRequest,
  foundGroupRequest,
  invitation,
  inviteRequest,
  listQuery,
  pageOf,
  readInvitationRequest,
  receivedInvitation,
  sessionInfo,
} from '#core/wire/index'
import { z } from 'zod'
import { endpoint } from './endpoint.ts'

const tag = 'invitations'

export const listInvitationsEndpoint = endpoint({
  id: 'listInvitations',
  method: 'get',
  path: '/invitations',
  tag,
  summary: 'List the group’s invitations, newest first',
  may: 'invite',
  query: listQuery,
  status: 200,
  answer: pageOf(invitation),
  answerIs: 'One page of invitations',
})

export const inviteEndpoint = endpoint({
  id: 'invite',
  method: 'post',
  path: '/invitations',
  tag,
  summary: 'Invite an address into the group: a link goes there, good for one use in seven days',
  may: 'invite',
  body: inviteRequest,
  status: 201,
  answer: invitation,
  answerIs: 'The invitation; one that was open for the address is withdrawn',
  problems: ['too-many-attempts'],
})

export const withdrawInvitationEndpoint = endpoint({
  id: 'withdrawInvitation',
  method: 'delete',
  path: '/invitations/{id}',
  tag,
  summary: 'Withdraw an open invitation',
  may: 'invite',
  params: z.object({ id: z.uuid() }),
  status: 204,
  answerIs: 'The link leads nowhere any more',
})

export const readInvitationEndpoint = endpoint({
  id: 'readInvitation',
  method: 'post',
  path: '/invitations/read',
  tag,
  summary: 'Read the invitation of a link, by its token',
  may: 'anyone',
  body: readInvitationRequest,
  status: 200,
  answer: receivedInvitation,
  answerIs: 'Who invites whom, as what',
  problems: ['link-not-valid'],
})

export const acceptInvitationEndpoint = endpoint({
  id: 'acceptInvitation',
  method: 'post',
  path: '/invitations/accept',
  tag,
  summary: 'Accept an invitation, with a new account or with the one the address has, and sign in',
  may: 'anyone',
  body: acceptInvitationRequest,
  status: 201,
  answer: sessionInfo,
  answerIs: 'Who has signed in, in which group, as what',
  problems: ['link-not-valid', 'too-many-attempts', 'second-factor-needed', 'wrong-code'],
})

export const foundFirstGroupEndpoint = endpoint({
  id: 'foundFirstGroup',
  method: 'post',
  path: '/first-group',
  tag,
  summary: 'Make the first group and its lead, once, by the token the server printed at its start',
  may: 'anyone',
  body: foundGroupRequest,
  status: 201,
  answer: sessionInfo,
  answerIs: 'The lead has signed in',
  problems: ['link-not-valid'],
})
