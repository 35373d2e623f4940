import { listAuditEndpoint } from './audit.ts'
import {
  beginSecondFactorEndpoint,
  confirmSecondFactorEndpoint,
  giveUpSecondFactorEndpoint,
  renewRecoveryCodesEndpoint,
  changeEmailEndpoint,
  changePasswordEndpoint,
  confirmEmailEndpoint,
  forgottenPasswordEndpoint,
  listSessionsEndpoint,
  readAccountEndpoint,
  renameAccountEndpoint,
  resetPasswordEndpoint,
  revokeOtherSessionsEndpoint,
  revokeSessionEndpoint,
  sendVerificationEndpoint,
} from './account.ts'
import { computeAbundanceEndpoint, computeHistoryEndpoint } from './compute.ts'
import type { Endpoint } from './endpoint.ts'
import {
  createEvaluationEndpoint,
  listEvaluationsEndpoint,
  readEvaluationEndpoint,
  readEvidenceEndpoint,
} from './evaluations.ts'
import {
  createGuestLinkEndpoint,
  listGuestLinksEndpoint,
  openGuestLinkEndpoint,
  revokeGuestLinkEndpoint,
} from './guestLinks.ts'
import { healthEndpoint, infoEndpoint } from './info.ts'
import { createKeyEndpoint, listKeysEndpoint, revokeKeyEndpoint } from './keys.ts'
import {
  acceptInvitationEndpoint,
  foundFirstGroupEndpoint,
  inviteEndpoint,
  listInvitationsEndpoint,
  readInvitationEndpoint,
  withdrawInvitationEndpoint,
} from './invitations.ts'
import { candidateEndpoints, historyEndpoints } from './records.ts'
import {
  chooseGroupEndpoint,
  listOwnGroupsEndpoint,
  signInEndpoint,
  signOutEndpoint,
  whoAmIEndpoint,
} from './session.ts'

/** Every endpoint, in the order of the API document. */
export const CATALOGUE: readonly Endpoint[] = [
  healthEndpoint,
  infoEndpoint,
  signInEndpoint,
  whoAmIEndpoint,
  listOwnGroupsEndpoint,
  chooseGroupEndpoint,
  signOutEndpoint,
  readAccountEndpoint,
  renameAccountEndpoint,
  changePasswordEndpoint,
  changeEmailEndpoint,
  sendVerificationEndpoint,
  confirmEmailEndpoint,
  forgottenPasswordEndpoint,
  resetPasswordEndpoint,
  listSessionsEndpoint,
  revokeSessionEndpoint,
  revokeOtherSessionsEndpoint,
  beginSecondFactorEndpoint,
  confirmSecondFactorEndpoint,
  giveUpSecondFactorEndpoint,
  renewRecoveryCodesEndpoint,
  listInvitationsEndpoint,
  inviteEndpoint,
  withdrawInvitationEndpoint,
  readInvitationEndpoint,
  acceptInvitationEndpoint,
  foundFirstGroupEndpoint,
  ...Object.values(historyEndpoints),
  ...Object.values(candidateEndpoints),
  listEvaluationsEndpoint,
  readEvaluationEndpoint,
  readEvidenceEndpoint,
  createEvaluationEndpoint,
  computeHistoryEndpoint,
  computeAbundanceEndpoint,
  listKeysEndpoint,
  createKeyEndpoint,
  revokeKeyEndpoint,
  listAuditEndpoint,
  listGuestLinksEndpoint,
  createGuestLinkEndpoint,
  revokeGuestLinkEndpoint,
  openGuestLinkEndpoint,
]
