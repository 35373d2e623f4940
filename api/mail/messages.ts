import type { Mail } from './mail.ts'

/** Every mail the product sends, in one place. */

const NOT_ASKED_FOR = 'If you did not ask for this, there is nothing to do: without the link nothing changes.'

interface Invitation {
  to: string
  groupName: string
  inviterName: string
  role: string
  url: string
  days: number
}

export const invitationMail = ({ to, groupName, inviterName, role, url, days }: Invitation): Mail => ({
  to,
  subject: `${inviterName} invites you to ${groupName} on Emberline`,
  parts: [
    {
      text: `${inviterName} invites you to the group “${groupName}” as ${role === 'author' ? 'an author' : `a ${role}`}. Emberline is where the group keeps the thermal histories and candidates its dark-matter abundances rest on.`,
    },
    { label: 'Accept the invitation', url },
    { text: `The link works once and for ${days} days.` },
  ],
})

export const verifyEmailMail = ({ to, url }: { to: string; url: string }): Mail => ({
  to,
  subject: 'Is this your address?',
  parts: [
    { text: 'An account on Emberline was made with this address. Open the link to say that it is yours.' },
    { label: 'Confirm the address', url },
    { text: `The link works once and for a day. ${NOT_ASKED_FOR}` },
  ],
})

export const changeEmailMail = ({ to, url }: { to: string; url: string }): Mail => ({
  to,
  subject: 'Confirm your new address',
  parts: [
    { text: 'Open the link, and from then on you sign in to Emberline with this address.' },
    { label: 'Use this address', url },
    { text: `The link works once and for a day. ${NOT_ASKED_FOR}` },
  ],
})

export const emailTakenMail = ({ to }: { to: string }): Mail => ({
  to,
  subject: 'You have an account already',
  parts: [
    {
      text: 'Somebody asked to use this address for their Emberline account, but it belongs to yours. Nothing was changed. If it was you, sign in with this address.',
    },
  ],
})

export const emailChangedMail = ({ to, newEmail }: { to: string; newEmail: string }): Mail => ({
  to,
  subject: 'Your address was changed',
  parts: [
    {
      text: `Your Emberline account now has the address ${newEmail}, and this one opens it no longer. If that was not you, tell a lead of your group at once.`,
    },
  ],
})

export const forgottenPasswordMail = ({ to, url }: { to: string; url: string }): Mail => ({
  to,
  subject: 'A new password',
  parts: [
    { text: 'Somebody, probably you, asked for a new password for your Emberline account.' },
    { label: 'Choose a new password', url },
    { text: `The link works once and for two hours. ${NOT_ASKED_FOR}` },
  ],
})

export const passwordChangedMail = ({ to }: { to: string }): Mail => ({
  to,
  subject: 'Your password was changed',
  parts: [
    {
      text: 'The password of your Emberline account was changed, and every other session was signed out. If that was not you, ask for a new password on the sign-in page and tell a lead of your group.',
    },
  ],
})

export const secondFactorMail = ({ to, inForce }: { to: string; inForce: boolean }): Mail => ({
  to,
  subject: inForce ? 'A second factor protects your account' : 'Your second factor was given up',
  parts: [
    {
      text: inForce
        ? 'From now on a code of your app, or a recovery code, is asked for beside the password of your Emberline account. If that was not you, tell a lead of your group at once.'
        : 'The password alone opens your Emberline account from now on. If that was not you, change it and tell a lead of your group at once.',
    },
  ],
})
