import jwt from 'jsonwebtoken'
import type { Clock } from '../../dependencies'
import type { Env } from '../../env'

/** An access token lives this long, in seconds; the refresh token fetches the next one. */
export const ACCESS_TOKEN_SECONDS = 15 * 60

const NAMES = { issuer: 'pintle', audience: 'pintle-api' }

export interface AccessClaims {
  userId: string
  /** The sign-in it belongs to: revoking that ends the token before its time. */
  signInId: string
}

const seconds = (clock: Clock) => Math.floor(clock.now().getTime() / 1000)

export function signAccessToken(env: Pick<Env, 'ACCESS_TOKEN_SECRET'>, clock: Clock, claims: AccessClaims): string {
  const iat = seconds(clock)
  return jwt.sign({ iat, exp: iat + ACCESS_TOKEN_SECONDS, sid: claims.signInId }, env.ACCESS_TOKEN_SECRET, {
    ...NAMES,
    algorithm: 'HS256',
    subject: claims.userId,
  })
}

/** The claims, or null when the token is forged, expired or not ours. */
export function verifyAccessToken(
  env: Pick<Env, 'ACCESS_TOKEN_SECRET'>,
  clock: Clock,
  token: string,
): AccessClaims | null {
  try {
    const payload = jwt.verify(token, env.ACCESS_TOKEN_SECRET, {
      ...NAMES,
      algorithms: ['HS256'],
      clockTimestamp: seconds(clock),
    })
    if (typeof payload === 'string' || typeof payload.sub !== 'string' || typeof payload.sid !== 'string') return null
    return { userId: payload.sub, signInId: payload.sid }
  } catch {
    return null
  }
}
