import {
  account,
  beginSecondFactorRequest,
  changeEmailRequest,
  changePasswordRequest,
  confirmEmailRequest,
  confirmSecondFactorRequest,
  forgottenPasswordRequest,
  newSecondFactor,
  ownSessions,
  recoveryCodeList,
  renameRequest,
  resetPasswordRequest,
  secondFactorRequest,
} from '#core/wire/index'
import { z } from 'zod'
import { endpoint } from './endpoint.ts'

const tag = 'account'
const may = 'keep-account'

export const readAccountEndpoint = endpoint({
  id: 'readAccount',
  method: 'get',
  path: '/account',
  tag,
  summary: 'Read one’s own account',
  may,
  status: 200,
  answer: account,
  answerIs: 'The account',
})

export const renameAccountEndpoint = endpoint({
  id: 'renameAccount',
  method: 'post',
  path: '/account/name',
  tag,
  summary: 'Change the name one’s groups know one by',
  may,
  body: renameRequest,
  status: 200,
  answer: account,
  answerIs: 'The account as it is now',
})

export const changePasswordEndpoint = endpoint({
  id: 'changePassword',
  method: 'post',
  path: '/account/password',
  tag,
  summary: 'Change one’s password; every other session ends, and a mail tells of it',
  may,
  body: changePasswordRequest,
  status: 204,
  answerIs: 'The new password holds',
  problems: ['too-many-attempts'],
})

export const changeEmailEndpoint = endpoint({
  id: 'changeEmail',
  method: 'post',
  path: '/account/email',
  tag,
  summary: 'Ask for another e-mail address: a link goes there, and the address changes once it is opened',
  may,
  body: changeEmailRequest,
  status: 204,
  answerIs: 'A mail is on its way; the answer is the same for an address that is taken',
  problems: ['too-many-attempts'],
})

export const sendVerificationEndpoint = endpoint({
  id: 'sendVerification',
  method: 'post',
  path: '/account/email/verification',
  tag,
  summary: 'Have a link sent to one’s address, to show that it is one’s own',
  may,
  status: 204,
  answerIs: 'The mail is on its way',
  problems: ['too-many-attempts'],
})

export const listSessionsEndpoint = endpoint({
  id: 'listOwnSessions',
  method: 'get',
  path: '/account/sessions',
  tag,
  summary: 'List the browsers one is signed in with, used last first',
  may,
  status: 200,
  answer: ownSessions,
  answerIs: 'The sessions in force',
})

export const revokeSessionEndpoint = endpoint({
  id: 'revokeOwnSession',
  method: 'delete',
  path: '/account/sessions/{id}',
  tag,
  summary: 'End one of one’s sessions',
  may,
  params: z.object({ id: z.uuid() }),
  status: 204,
  answerIs: 'The session has ended',
})

export const revokeOtherSessionsEndpoint = endpoint({
  id: 'revokeOtherSessions',
  method: 'delete',
  path: '/account/sessions',
  tag,
  summary: 'End all one’s sessions but the one asking',
  may,
  status: 204,
  answerIs: 'No other session is in force',
})

export const confirmEmailEndpoint = endpoint({
  id: 'confirmEmail',
  method: 'post',
  path: '/email-confirmations',
  tag,
  summary:
    'Show that an address is one’s own, by the token of the link sent there; completes a change of address',
  may: 'anyone',
  body: confirmEmailRequest,
  status: 204,
  answerIs: 'The address is confirmed; after a change the old one is told',
  problems: ['link-not-valid'],
})

export const forgottenPasswordEndpoint = endpoint({
  id: 'forgotPassword',
  method: 'post',
  path: '/forgotten-passwords',
  tag,
  summary: 'Have a link for a new password sent, if the address has an account; the answer does not tell',
  may: 'anyone',
  body: forgottenPasswordRequest,
  status: 204,
  answerIs: 'A mail is on its way, if there is an account',
  problems: ['too-many-attempts'],
})

export const resetPasswordEndpoint = endpoint({
  id: 'resetPassword',
  method: 'post',
  path: '/password-resets',
  tag,
  summary: 'Choose a new password by the token of the link sent; every session ends',
  may: 'anyone',
  body: resetPasswordRequest,
  status: 204,
  answerIs: 'The new password holds',
  problems: ['link-not-valid'],
})

export const beginSecondFactorEndpoint = endpoint({
  id: 'beginSecondFactor',
  method: 'post',
  path: '/account/second-factor',
  tag,
  summary: 'Get a secret for one-time codes (RFC 6238); in force once a code of it is confirmed',
  may,
  body: beginSecondFactorRequest,
  status: 200,
  answer: newSecondFactor,
  answerIs: 'The secret, told this once',
  problems: ['second-factor-set', 'too-many-attempts'],
})

export const confirmSecondFactorEndpoint = endpoint({
  id: 'confirmSecondFactor',
  method: 'post',
  path: '/account/second-factor/confirm',
  tag,
  summary: 'Put the second factor in force by a code of it',
  may,
  body: confirmSecondFactorRequest,
  status: 200,
  answer: recoveryCodeList,
  answerIs: 'Ten recovery codes, told this once',
  problems: ['wrong-code', 'too-many-attempts'],
})

export const giveUpSecondFactorEndpoint = endpoint({
  id: 'giveUpSecondFactor',
  method: 'post',
  path: '/account/second-factor/give-up',
  tag,
  summary: 'Give the second factor up, by password and code',
  may,
  body: secondFactorRequest,
  status: 204,
  answerIs: 'The password alone is asked for from now on',
  problems: ['wrong-code', 'too-many-attempts'],
})

export const renewRecoveryCodesEndpoint = endpoint({
  id: 'renewRecoveryCodes',
  method: 'post',
  path: '/account/recovery-codes',
  tag,
  summary: 'Get new recovery codes; those of before are void',
  may,
  body: secondFactorRequest,
  status: 200,
  answer: recoveryCodeList,
  answerIs: 'Ten recovery codes, told this once',
  problems: ['wrong-code', 'too-many-attempts'],
})
