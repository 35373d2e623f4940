import { queryOptions } from '@tanstack/react-query'
import type {
  Account,
  Invitation,
  OwnGroup,
  OwnSession,
  NewSecondFactor,
  ReceivedInvitation,
  RecoveryCodeList,
  Role,
  SessionInfo,
} from '#core/wire/index'
import { api } from '../lib/api.ts'

export const accountQuery = queryOptions({
  queryKey: ['account'],
  queryFn: () => api<Account>('GET', '/account'),
})

export const ownGroupsQuery = queryOptions({
  queryKey: ['session', 'groups'],
  queryFn: async () => (await api<{ items: OwnGroup[] }>('GET', '/session/groups')).items,
})

export const ownSessionsQuery = queryOptions({
  queryKey: ['account', 'sessions'],
  queryFn: async () => (await api<{ items: OwnSession[] }>('GET', '/account/sessions')).items,
})

export const invitationsQuery = queryOptions({
  queryKey: ['invitations'],
  queryFn: async () => (await api<{ items: Invitation[] }>('GET', '/invitations?limit=200')).items,
})

export const receivedInvitationQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitation', token],
    queryFn: () => api<ReceivedInvitation>('POST', '/invitations/read', { token }),
    staleTime: Infinity,
  })

export const chooseGroup = (groupId: string): Promise<SessionInfo> =>
  api('POST', '/session/group', { groupId })

export const rename = (name: string): Promise<Account> => api('POST', '/account/name', { name })

export const changePassword = (currentPassword: string, newPassword: string): Promise<void> =>
  api('POST', '/account/password', { currentPassword, newPassword })

export const changeEmail = (email: string, currentPassword: string): Promise<void> =>
  api('POST', '/account/email', { email, currentPassword })

export const sendVerification = (): Promise<void> => api('POST', '/account/email/verification')

export const beginSecondFactor = (currentPassword: string): Promise<NewSecondFactor> =>
  api('POST', '/account/second-factor', { currentPassword })

export const confirmSecondFactor = (code: string): Promise<RecoveryCodeList> =>
  api('POST', '/account/second-factor/confirm', { code })

export const giveUpSecondFactor = (currentPassword: string, code: string): Promise<void> =>
  api('POST', '/account/second-factor/give-up', { currentPassword, code })

export const renewRecoveryCodes = (currentPassword: string, code: string): Promise<RecoveryCodeList> =>
  api('POST', '/account/recovery-codes', { currentPassword, code })

export const endSession = (id: string): Promise<void> => api('DELETE', `/account/sessions/${id}`)

export const endOtherSessions = (): Promise<void> => api('DELETE', '/account/sessions')

export const confirmEmail = (token: string): Promise<void> => api('POST', '/email-confirmations', { token })

export const forgotPassword = (email: string): Promise<void> => api('POST', '/forgotten-passwords', { email })

export const resetPassword = (token: string, newPassword: string): Promise<void> =>
  api('POST', '/password-resets', { token, newPassword })

export const invite = (email: string, role: Role): Promise<Invitation> =>
  api('POST', '/invitations', { email, role })

export const withdrawInvitation = (id: string): Promise<void> => api('DELETE', `/invitations/${id}`)

export const acceptInvitation = (request: {
  token: string
  name?: string
  password: string
  code?: string
}): Promise<SessionInfo> => api('POST', '/invitations/accept', request)

export const foundFirstGroup = (request: {
  token: string
  groupName: string
  name: string
  email: string
  password: string
}): Promise<SessionInfo> => api('POST', '/first-group', request)
