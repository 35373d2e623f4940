import {
  createGuestLinkRequest,
  createGuestLinkResult,
  guestLink,
  guestLinkList,
  guestLinkQuery,
  guestView,
  openGuestLinkRequest,
} from '#core/wire/index'
import { endpoint } from './endpoint.ts'
import { byId } from './records.ts'

const tag = 'guest-links'

export const listGuestLinksEndpoint = endpoint({
  id: 'listGuestLinks',
  method: 'get',
  path: '/guest-links',
  tag,
  summary: 'List the group’s guest links, newest first, or those to one thing',
  may: 'read',
  query: guestLinkQuery,
  status: 200,
  answer: guestLinkList,
  answerIs: 'The links, without their tokens',
})

export const createGuestLinkEndpoint = endpoint({
  id: 'createGuestLink',
  method: 'post',
  path: '/guest-links',
  tag,
  summary: 'Make a link that shows one evaluation or one revision of a history to whoever has it',
  may: 'guest-links',
  body: createGuestLinkRequest,
  status: 201,
  answer: createGuestLinkResult,
  answerIs: 'The link with its token, which is told this once',
  problems: ['not-found'],
})

export const revokeGuestLinkEndpoint = endpoint({
  id: 'revokeGuestLink',
  method: 'delete',
  path: '/guest-links/{id}',
  tag,
  summary: 'Revoke a guest link: one’s own, or for a lead anyone’s; it ends at once',
  may: 'guest-links',
  params: byId,
  status: 200,
  answer: guestLink,
  answerIs: 'The link, revoked',
})

export const openGuestLinkEndpoint = endpoint({
  id: 'openGuestLink',
  method: 'post',
  path: '/guest',
  tag,
  summary: 'What a guest link shows; nothing is signed in to',
  may: 'anyone',
  body: openGuestLinkRequest,
  status: 200,
  answer: guestView,
  answerIs: 'The one thing the link opens',
  problems: ['guest-link-closed'],
})
