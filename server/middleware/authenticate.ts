import type { Request } from 'express'
import type { Dependencies } from '../dependencies'
import { AppError } from '../errors'
import { verifyAccessToken } from '../features/auth/access-token'
import { readAccessCookie } from '../features/auth/cookies'
import type { Actor } from './scope'

/** The actor of a sign-in that still stands, with name and memberships, in one indexed select. */
const ACTOR = `
  select u.name,
         coalesce(
           (select json_agg(json_build_object('clubId', m.club_id, 'role', m.role) order by m.club_id, m.role)
              from memberships m where m.user_id = u.id),
           '[]'::json
         ) as memberships
    from sign_ins s
    join users u on u.id = s.user_id
   where s.id = $1 and s.user_id = $2 and s.revoked_at is null`

/** Who is asking, by the access cookie. Throws `not_signed_in` or `session_expired`. */
export async function authenticate({ env, clock, dataSource }: Dependencies, request: Request): Promise<Actor> {
  const token = readAccessCookie(request)
  if (token === null) throw new AppError('not_signed_in', 'Sign in first.')
  const expired = () => new AppError('session_expired', 'Your session has ended. Sign in again.')
  const claims = verifyAccessToken(env, clock, token)
  if (claims === null) throw expired()
  const rows: Array<Omit<Actor, 'userId'>> = await dataSource.query(ACTOR, [claims.signInId, claims.userId])
  const row = rows[0]
  if (row === undefined) throw expired()
  return { userId: claims.userId, name: row.name, memberships: row.memberships }
}
