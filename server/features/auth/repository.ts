import { IsNull, type EntityManager } from 'typeorm'
import { User } from '../people/entity'
import { PasswordReset, RefreshToken, SignIn } from './entity'

export const findUserByEmail = (manager: EntityManager, email: string): Promise<User | null> =>
  manager.findOneBy(User, { email: email.toLowerCase() })

/**
 * Whether the password is still the one that was compared. Until the transaction ends it stays so: a reset that comes
 * later waits, and then finds what this transaction wrote.
 */
export async function holdPassword(manager: EntityManager, userId: string, passwordHash: string): Promise<boolean> {
  const rows: unknown[] = await manager.query('select 1 from users where id = $1 and password_hash = $2 for share', [
    userId,
    passwordHash,
  ])
  return rows.length > 0
}

export const insertSignIn = (
  manager: EntityManager,
  signIn: Pick<SignIn, 'userId' | 'createdAt' | 'endsAt'>,
): Promise<SignIn> => manager.save(SignIn, signIn)

export async function insertRefreshToken(
  manager: EntityManager,
  token: Pick<RefreshToken, 'signInId' | 'tokenHash' | 'issuedAt' | 'expiresAt'>,
): Promise<void> {
  await manager.insert(RefreshToken, token)
}

/** The token with its sign-in, locked so that two tabs cannot both trade it as unused. */
export async function lockRefreshToken(manager: EntityManager, tokenHash: string): Promise<RefreshToken | null> {
  return manager
    .createQueryBuilder(RefreshToken, 'token')
    .innerJoinAndSelect('token.signIn', 'signIn')
    .where('token.tokenHash = :tokenHash', { tokenHash })
    .setLock('pessimistic_write')
    .getOne()
}

export async function markUsed(manager: EntityManager, id: string, at: Date): Promise<void> {
  await manager.update(RefreshToken, { id }, { usedAt: at })
}

type RevokedWhy = 'signedOut' | 'tokenReused' | 'passwordReset'

/** Ends the sign-in unless it was ended before. Resolves to whose it was, or null when nothing changed. */
export async function revokeSignIn(
  manager: EntityManager,
  id: string,
  at: Date,
  why: RevokedWhy,
): Promise<string | null> {
  const result = await manager
    .createQueryBuilder()
    .update(SignIn)
    .set({ revokedAt: at, revokedWhy: why })
    .where('id = :id and revoked_at is null', { id })
    .returning('user_id')
    .execute()
  return (result.raw as Array<{ user_id: string }>)[0]?.user_id ?? null
}

export async function revokeAllSignIns(
  manager: EntityManager,
  userId: string,
  at: Date,
  why: RevokedWhy,
): Promise<void> {
  await manager.update(SignIn, { userId, revokedAt: IsNull() }, { revokedAt: at, revokedWhy: why })
}

/** Sign-ins that are over teach nothing more: their tokens could not be used anyway. */
export async function deleteEndedSignIns(manager: EntityManager, userId: string, now: Date): Promise<void> {
  await manager
    .createQueryBuilder()
    .delete()
    .from(SignIn)
    .where('user_id = :userId and ends_at < :now', { userId, now })
    .execute()
}

/** A new reset replaces the older ones, so that only the newest link works. */
export async function replacePasswordReset(
  manager: EntityManager,
  reset: Pick<PasswordReset, 'userId' | 'tokenHash' | 'createdAt' | 'expiresAt'>,
): Promise<void> {
  await deleteUnusedResets(manager, reset.userId)
  await manager.insert(PasswordReset, reset)
}

export async function deleteUnusedResets(manager: EntityManager, userId: string): Promise<void> {
  await manager.delete(PasswordReset, { userId, usedAt: IsNull() })
}

/** Uses the reset up and returns whose it is, or null when it is unknown, used or over. One statement, so it works once. */
export async function usePasswordReset(manager: EntityManager, tokenHash: string, now: Date): Promise<string | null> {
  const result = await manager
    .createQueryBuilder()
    .update(PasswordReset)
    .set({ usedAt: now })
    .where('token_hash = :tokenHash and used_at is null and expires_at > :now', { tokenHash, now })
    .returning('user_id')
    .execute()
  return (result.raw as Array<{ user_id: string }>)[0]?.user_id ?? null
}

export async function setPasswordHash(manager: EntityManager, userId: string, passwordHash: string): Promise<void> {
  await manager.update(User, { id: userId }, { passwordHash })
}
