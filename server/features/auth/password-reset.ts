import type { Dependencies } from '../../dependencies'
import { AppError } from '../../errors'
import { recordAudit } from '../audit/record'
import { hashPassword } from './password-hash'
import { passwordResetLetter } from './password-reset-letter'
import * as repository from './repository'
import { hashToken, newToken } from './token'

/** A reset link works this long. */
export const RESET_MINUTES = 30

/**
 * Sends a reset link if somebody has this address. Returns before looking, so that neither the answer nor its time
 * tells whether somebody does.
 */
export function requestPasswordReset(dependencies: Dependencies, email: string): void {
  const { background, clock, dataSource, env, mailer } = dependencies
  background.run('password reset mail', async () => {
    const user = await repository.findUserByEmail(dataSource.manager, email)
    if (user === null) return
    const token = newToken()
    const createdAt = clock.now()
    const expiresAt = new Date(createdAt.getTime() + RESET_MINUTES * 60_000)
    await dataSource.transaction(async (manager) => {
      await repository.replacePasswordReset(manager, {
        userId: user.id,
        tokenHash: hashToken(token),
        createdAt,
        expiresAt,
      })
      await recordAudit(manager, { actor: null, action: 'request.passwordReset', subject: user.id })
    })
    await mailer.send(passwordResetLetter(env, user, token))
  })
}

/** Sets the password that a reset link allows, once, and ends every session of that person. */
export async function resetPassword(
  { clock, dataSource }: Dependencies,
  { token, password }: { token: string; password: string },
): Promise<void> {
  await dataSource.transaction(async (manager) => {
    const now = clock.now()
    const userId = await repository.usePasswordReset(manager, hashToken(token), now)
    if (userId === null) {
      throw new AppError('reset_link_invalid', 'This link was used already or is too old. Ask for a new one.')
    }
    // Two requests at once leave two links; none may undo what is set now.
    await repository.deleteUnusedResets(manager, userId)
    await repository.setPasswordHash(manager, userId, await hashPassword(password))
    await repository.revokeAllSignIns(manager, userId, now, 'passwordReset')
    await recordAudit(manager, { actor: { userId }, action: 'reset.password', subject: userId })
  })
}
