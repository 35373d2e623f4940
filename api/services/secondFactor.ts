import { toString as qrCode } from 'qrcode'
import { withMember, withPerson } from '#db/database'
import type { Database, GroupTransaction } from '#db/database'
import {
  beginFactor,
  countRecoveryCodes,
  findFactor,
  replaceRecoveryCodes,
  setFactorInForce,
  takeRecoveryCode,
  takeStep,
} from '#db/queries/secondFactors'
import { ProblemError } from '../errors/problemError.ts'
import type { QueueMail } from '../mail/mailQueue.ts'
import { secondFactorMail } from '../mail/messages.ts'
import type { Caller } from '../middleware/caller.ts'
import { newSecret, secretUri, stepOfCode } from '../secrets/oneTimeCode.ts'
import {
  RECOVERY_CODES,
  hashOfRecoveryCode,
  isRecoveryCode,
  newRecoveryCode,
} from '../secrets/recoveryCode.ts'
import type { Sealer } from '../secrets/sealer.ts'
import { budget } from './attempts.ts'
import type { Attempts } from './attempts.ts'
import { audit } from './audit.ts'

const CODE_CHECKS = 10

const wrongCode = (): ProblemError =>
  new ProblemError(
    'wrong-code',
    'Each code works once, for half a minute or so. Wait for the next one, or take a recovery code.',
  )

export interface SecondFactorParts {
  db: Database
  sealer: Sealer
  mail: QueueMail
  attempts: Attempts
}

/** One-time codes from an app beside the password, with recovery codes for when the device is lost. */
export function secondFactorService({ db, sealer, mail, attempts }: SecondFactorParts) {
  const isAppCode = async (tx: GroupTransaction, userId: string, code: string): Promise<boolean> => {
    const factor = await findFactor(tx, userId)
    if (factor === null) return false
    const step = stepOfCode(await sealer.open(factor.sealedSecret), code.replaceAll(/\s/g, ''), Date.now())
    return step !== null && takeStep(tx, userId, step)
  }

  const takeCode = async (tx: GroupTransaction, userId: string, code: string): Promise<void> => {
    const good = isRecoveryCode(code)
      ? await takeRecoveryCode(tx, userId, hashOfRecoveryCode(code))
      : await isAppCode(tx, userId, code)
    if (!good) throw wrongCode()
  }

  const freshRecoveryCodes = async (tx: GroupTransaction, userId: string): Promise<string[]> => {
    const codes = Array.from({ length: RECOVERY_CODES }, newRecoveryCode)
    await replaceRecoveryCodes(tx, userId, codes.map(hashOfRecoveryCode))
    return codes
  }

  const isInForce = async (tx: GroupTransaction, userId: string): Promise<boolean> =>
    (await findFactor(tx, userId))?.isConfirmed === true

  /** Runs `work` where guessing codes is counted; what it throws leaves the attempt counted. */
  const counted = async <T>({ user }: Caller, work: () => Promise<T>): Promise<T> => {
    const forgive = await attempts.take([budget('code check', user.id, CODE_CHECKS)])
    const done = await work()
    await forgive()
    return done
  }

  return {
    async state({ user }: Caller) {
      return withPerson(db, user.id, async (tx) => {
        const inForce = await isInForce(tx, user.id)
        return { inForce, recoveryCodesLeft: inForce ? await countRecoveryCodes(tx, user.id) : 0 }
      })
    },

    /** Lets somebody with the right password through, with the code if the account has a factor. */
    async check(userId: string, code: string | undefined): Promise<void> {
      await withPerson(db, userId, async (tx) => {
        if (!(await isInForce(tx, userId))) return
        if (code === undefined)
          throw new ProblemError(
            'second-factor-needed',
            'The password is right. Give the code your app shows, or a recovery code.',
          )
        await takeCode(tx, userId, code)
      })
    },

    /** A new secret to be read by an app; not asked for at sign-in until `confirm`. */
    async begin({ user }: Caller): Promise<{ secret: string; uri: string; qrSvg: string }> {
      const secret = newSecret()
      const sealed = await sealer.seal(secret)
      await withPerson(db, user.id, async (tx) => {
        if (await isInForce(tx, user.id))
          throw new ProblemError(
            'second-factor-set',
            'You have one already. Give it up first, then set up another.',
          )
        await beginFactor(tx, user.id, sealed)
      })
      const uri = secretUri(secret, user.email)
      return { secret, uri, qrSvg: await qrCode(uri, { type: 'svg', margin: 2 }) }
    },

    /** Puts the factor in force by a code of it, and hands out the recovery codes, this once. */
    confirm: (caller: Caller, code: string): Promise<{ recoveryCodes: string[] }> =>
      counted(caller, () =>
        withMember(db, caller, async (tx) => {
          const { id, email } = caller.user
          if ((await isInForce(tx, id)) || !(await isAppCode(tx, id, code))) throw wrongCode()
          await setFactorInForce(tx, id, true)
          await audit(tx, caller, 'account.second-factor', id, { inForce: true })
          await mail(tx, secondFactorMail({ to: email, inForce: true }))
          return { recoveryCodes: await freshRecoveryCodes(tx, id) }
        }),
      ),

    /** Hands out new recovery codes; those of before are void. */
    renewRecoveryCodes: (caller: Caller, code: string): Promise<{ recoveryCodes: string[] }> =>
      counted(caller, () =>
        withMember(db, caller, async (tx) => {
          if (!(await isInForce(tx, caller.user.id))) throw wrongCode()
          await takeCode(tx, caller.user.id, code)
          await audit(tx, caller, 'account.second-factor', caller.user.id, { recoveryCodes: 'renewed' })
          return { recoveryCodes: await freshRecoveryCodes(tx, caller.user.id) }
        }),
      ),

    giveUp: (caller: Caller, code: string): Promise<void> =>
      counted(caller, () =>
        withMember(db, caller, async (tx) => {
          const { id, email } = caller.user
          if (!(await isInForce(tx, id))) throw wrongCode()
          await takeCode(tx, id, code)
          await setFactorInForce(tx, id, false)
          await replaceRecoveryCodes(tx, id, [])
          await audit(tx, caller, 'account.second-factor', id, { inForce: false })
          await mail(tx, secondFactorMail({ to: email, inForce: false }))
        }),
      ),
  }
}

export type SecondFactorService = ReturnType<typeof secondFactorService>
