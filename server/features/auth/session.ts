import type { EntityManager } from 'typeorm'
import type { Dependencies } from '../../dependencies'
import { AppError } from '../../errors'
import { recordAudit } from '../audit/record'
import { signAccessToken, verifyAccessToken } from './access-token'
import { isDemoAddress } from './demo-accounts'
import { verifyPassword } from './password-hash'
import * as repository from './repository'
import { hashToken, newToken } from './token'

const DAY = 24 * 60 * 60 * 1000
/** A device that is not used this long has to sign in again. */
export const REFRESH_TOKEN_DAYS = 30
/** Even a device that is used daily has to sign in again after this. */
export const SIGN_IN_DAYS = 90
/**
 * Two tabs, or a phone whose answer got lost, may send the same refresh token twice within this many seconds. Later it
 * counts as stolen.
 */
export const REUSE_GRACE_SECONDS = 30

export interface SessionTokens {
  access: string
  refresh: string
  refreshSeconds: number
}

async function issueTokens(
  { env, clock }: Dependencies,
  manager: EntityManager,
  signIn: { id: string; userId: string; endsAt: Date },
): Promise<SessionTokens> {
  const issuedAt = clock.now()
  const expiresAt = new Date(Math.min(issuedAt.getTime() + REFRESH_TOKEN_DAYS * DAY, signIn.endsAt.getTime()))
  const refresh = newToken()
  await repository.insertRefreshToken(manager, {
    signInId: signIn.id,
    tokenHash: hashToken(refresh),
    issuedAt,
    expiresAt,
  })
  return {
    access: signAccessToken(env, clock, { userId: signIn.userId, signInId: signIn.id }),
    refresh,
    refreshSeconds: Math.floor((expiresAt.getTime() - issuedAt.getTime()) / 1000),
  }
}

/** Opens a session. A wrong address and a wrong password answer alike, in about the same time. */
export async function signIn(
  dependencies: Dependencies,
  { email, password }: { email: string; password: string },
): Promise<SessionTokens & { userId: string }> {
  const { clock, dataSource, env } = dependencies
  const refused = () => new AppError('wrong_credentials', 'Address and password do not match.')
  const found = await repository.findUserByEmail(dataSource.manager, email)
  // Whoever was seeded by a demo before has a password that anybody can read.
  const user = env.PINTLE_DEMO || !isDemoAddress(email) ? found : null
  const matches = await verifyPassword(user?.passwordHash ?? null, password)
  if (user === null || !matches) throw refused()
  return dataSource.transaction(async (manager) => {
    // A reset that came in between has ended every session; this one must not outlive it.
    if (!(await repository.holdPassword(manager, user.id, user.passwordHash))) throw refused()
    const now = clock.now()
    await repository.deleteEndedSignIns(manager, user.id, now)
    const endsAt = new Date(now.getTime() + SIGN_IN_DAYS * DAY)
    const opened = await repository.insertSignIn(manager, { userId: user.id, createdAt: now, endsAt })
    await recordAudit(manager, { actor: { userId: user.id }, action: 'open.session', subject: user.id })
    return { ...(await issueTokens(dependencies, manager, opened)), userId: user.id }
  })
}

/** Trades a refresh token for new tokens. A token traded before ends its whole sign-in. */
export async function refreshSession(dependencies: Dependencies, token: string): Promise<SessionTokens> {
  const { clock, dataSource } = dependencies
  // The revocation must be committed, so the refusal is thrown only after the transaction.
  const tokens = await dataSource.transaction(async (manager) => {
    const now = clock.now()
    const row = await repository.lockRefreshToken(manager, hashToken(token))
    if (row === null || row.signIn.revokedAt !== null || row.expiresAt <= now) return null
    if (row.usedAt === null) {
      await repository.markUsed(manager, row.id, now)
    } else if (now.getTime() - row.usedAt.getTime() > REUSE_GRACE_SECONDS * 1000) {
      await repository.revokeSignIn(manager, row.signInId, now, 'tokenReused')
      await recordAudit(manager, { actor: null, action: 'revoke.session', subject: row.signIn.userId })
      return null
    }
    return issueTokens(dependencies, manager, row.signIn)
  })
  if (tokens === null) throw new AppError('session_expired', 'Your session has ended. Sign in again.')
  return tokens
}

/** Ends the sign-in that either token belongs to; unknown tokens end nothing. */
export async function signOut(
  { env, clock, dataSource }: Dependencies,
  { access, refresh }: { access: string | null; refresh: string | null },
): Promise<void> {
  await dataSource.transaction(async (manager) => {
    const claims = access === null ? null : verifyAccessToken(env, clock, access)
    const row = refresh === null ? null : await repository.lockRefreshToken(manager, hashToken(refresh))
    for (const id of new Set([claims?.signInId, row?.signInId])) {
      const userId = id === undefined ? null : await repository.revokeSignIn(manager, id, clock.now(), 'signedOut')
      if (userId !== null) await recordAudit(manager, { actor: { userId }, action: 'close.session', subject: userId })
    }
  })
}
