import { z } from 'zod'
import { role } from './records.ts'

const id = z.uuid()
const moment = z.iso.datetime().describe('UTC, ISO 8601')
const email = z.email().max(254)
const oneLine = z
  .string()
  .trim()
  .min(1)
  .max(120)
  .regex(/^\P{Cc}*$/u, 'allowed: one line of text, 1 to 120 characters')
const newPassword = z
  .string()
  .min(1)
  .max(1024)
  .describe('8 to 256 characters of any kind; none of the passwords most people use')
const givenPassword = z.string().min(1).max(1024)
const code = z
  .string()
  .trim()
  .min(1)
  .max(40)
  .describe('Of the second factor, or a recovery code; when the account has one')
const linkToken = z.string().min(1).max(200).describe('From the link’s address, after the #')

/** A group one belongs to. */
export const ownGroup = z.object({ id, name: z.string(), role }).meta({ id: 'OwnGroup' })
export type OwnGroup = z.output<typeof ownGroup>
export const ownGroups = z.object({ items: z.array(ownGroup) }).meta({ id: 'OwnGroups' })
export const chooseGroupRequest = z.strictObject({ groupId: id }).meta({ id: 'ChooseGroupRequest' })

/** One’s own account. */
export const account = z
  .object({
    id,
    name: z.string(),
    email: z.string(),
    emailVerified: z.boolean().describe('Whether a link sent to the address was opened'),
    hasPassword: z.boolean(),
    secondFactor: z.object({
      inForce: z.boolean(),
      recoveryCodesLeft: z.number().int(),
    }),
    createdAt: moment,
  })
  .meta({ id: 'Account' })
export type Account = z.output<typeof account>

export const renameRequest = z.strictObject({ name: oneLine }).meta({ id: 'RenameRequest' })
export const changePasswordRequest = z
  .strictObject({ currentPassword: givenPassword, newPassword })
  .meta({ id: 'ChangePasswordRequest' })
export const changeEmailRequest = z
  .strictObject({ email, currentPassword: givenPassword })
  .meta({ id: 'ChangeEmailRequest' })
export const confirmEmailRequest = z.strictObject({ token: linkToken }).meta({ id: 'ConfirmEmailRequest' })
export const forgottenPasswordRequest = z.strictObject({ email }).meta({ id: 'ForgottenPasswordRequest' })
export const resetPasswordRequest = z
  .strictObject({ token: linkToken, newPassword })
  .meta({ id: 'ResetPasswordRequest' })

export const beginSecondFactorRequest = z
  .strictObject({ currentPassword: givenPassword })
  .meta({ id: 'BeginSecondFactorRequest' })
/** What an app needs to make codes; not in force until one of them is shown. */
export const newSecondFactor = z
  .object({
    secret: z.string().describe('Base32, to be typed where no picture can be read'),
    uri: z.string().describe('otpauth:// address with secret, account and issuer'),
    qrSvg: z.string().describe('The same as a picture'),
  })
  .meta({ id: 'NewSecondFactor' })
export type NewSecondFactor = z.output<typeof newSecondFactor>
export const confirmSecondFactorRequest = z
  .strictObject({ code: code.describe('That the app shows now') })
  .meta({ id: 'ConfirmSecondFactorRequest' })
export const secondFactorRequest = z
  .strictObject({ currentPassword: givenPassword, code })
  .meta({ id: 'SecondFactorRequest' })
export const recoveryCodeList = z
  .object({ recoveryCodes: z.array(z.string()).describe('Shown this once; each works once') })
  .meta({ id: 'RecoveryCodeList' })
export type RecoveryCodeList = z.output<typeof recoveryCodeList>

/** A browser signed in. */
export const ownSession = z
  .object({
    id,
    current: z.boolean().describe('Whether it is the one asking'),
    group: z.string(),
    userAgent: z.string().describe('What the browser said of itself'),
    address: z.string().describe('Where it signed in from'),
    createdAt: moment,
    lastUsedAt: moment.describe('To the minute'),
    expiresAt: moment,
  })
  .meta({ id: 'OwnSession' })
export type OwnSession = z.output<typeof ownSession>
export const ownSessions = z.object({ items: z.array(ownSession) }).meta({ id: 'OwnSessions' })

/** An invitation as its group sees it. */
export const invitation = z
  .object({
    id,
    email: z.string(),
    role,
    invitedBy: z.object({ id, name: z.string() }),
    createdAt: moment,
    expiresAt: moment,
    state: z.enum(['open', 'accepted', 'withdrawn', 'expired']),
  })
  .meta({ id: 'Invitation' })
export type Invitation = z.output<typeof invitation>
export const inviteRequest = z.strictObject({ email, role }).meta({ id: 'InviteRequest' })

/** An invitation as the invited see it. */
export const receivedInvitation = z
  .object({
    email: z.string(),
    role,
    groupName: z.string(),
    inviterName: z.string(),
    hasAccount: z.boolean().describe('Whether the address has an account: its password is then asked for'),
  })
  .meta({ id: 'ReceivedInvitation' })
export type ReceivedInvitation = z.output<typeof receivedInvitation>
export const readInvitationRequest = z
  .strictObject({ token: linkToken })
  .meta({ id: 'ReadInvitationRequest' })
export const acceptInvitationRequest = z
  .strictObject({
    token: linkToken,
    name: oneLine.optional().describe('Of a new account'),
    password: newPassword.describe('Chosen for a new account, or that of the account there is'),
    code: code.optional(),
  })
  .meta({ id: 'AcceptInvitationRequest' })

export const foundGroupRequest = z
  .strictObject({
    token: linkToken.describe('Printed by the server at its first start'),
    groupName: oneLine,
    name: oneLine,
    email,
    password: newPassword,
  })
  .meta({ id: 'FoundGroupRequest' })
