import type { Router } from 'express'
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
} from '../endpoints/account.ts'
import { requireCaller } from '../middleware/caller.ts'
import type { Visitors } from '../middleware/visitor.ts'
import type { AccountService } from '../services/accounts.ts'
import type { SecondFactorService } from '../services/secondFactor.ts'
import type { SessionService } from '../services/sessions.ts'
import { mount } from './mount.ts'

export function accountRoutes(
  router: Router,
  accounts: AccountService,
  factors: SecondFactorService,
  sessions: SessionService,
  visitors: Visitors,
): void {
  mount(router, beginSecondFactorEndpoint, async ({ body, res }) => {
    await accounts.requirePassword(requireCaller(res), body.currentPassword)
    return factors.begin(requireCaller(res))
  })
  mount(router, confirmSecondFactorEndpoint, ({ body, res }) =>
    factors.confirm(requireCaller(res), body.code),
  )
  mount(router, giveUpSecondFactorEndpoint, async ({ body, res }) => {
    await accounts.requirePassword(requireCaller(res), body.currentPassword)
    await factors.giveUp(requireCaller(res), body.code)
  })
  mount(router, renewRecoveryCodesEndpoint, async ({ body, res }) => {
    await accounts.requirePassword(requireCaller(res), body.currentPassword)
    return factors.renewRecoveryCodes(requireCaller(res), body.code)
  })
  mount(router, readAccountEndpoint, ({ res }) => accounts.read(requireCaller(res)))
  mount(router, renameAccountEndpoint, ({ body, res }) => accounts.rename(requireCaller(res), body.name))
  mount(router, changePasswordEndpoint, ({ body, res }) => accounts.changePassword(requireCaller(res), body))
  mount(router, changeEmailEndpoint, ({ body, res }) => accounts.changeEmail(requireCaller(res), body))
  mount(router, sendVerificationEndpoint, ({ res }) => accounts.sendVerification(requireCaller(res)))
  mount(router, listSessionsEndpoint, async ({ res }) => ({
    items: await sessions.list(requireCaller(res)),
  }))
  mount(router, revokeSessionEndpoint, ({ params, res }) => sessions.revoke(requireCaller(res), params.id))
  mount(router, revokeOtherSessionsEndpoint, ({ res }) => sessions.revokeOthers(requireCaller(res)))
  mount(router, confirmEmailEndpoint, ({ body, req, res }) =>
    accounts.confirmEmail(body.token, visitors.of(req, res)),
  )
  mount(router, forgottenPasswordEndpoint, ({ body, req, res }) =>
    accounts.forgotPassword(body.email, visitors.of(req, res)),
  )
  mount(router, resetPasswordEndpoint, ({ body, req, res }) =>
    accounts.resetPassword(body, visitors.of(req, res)),
  )
}
