import { createHmac } from 'node:crypto'
import type { Request, RequestHandler } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import type { Env } from '../env'
import { AppError } from '../errors'

interface Limit {
  /** Calls per window, before RATE_LIMIT_SCALE. */
  limit: number
  minutes: number
  /** Count per caller and e-mail address in the body instead of per caller alone. */
  perAddress?: boolean
  /** Count refused calls only. */
  failuresOnly?: boolean
}

/** An address as a key: nobody who reads the memory of the limiter learns who tried to sign in. */
const addressKey = (env: Env, request: Request): string => {
  const { email } = (request.body ?? {}) as { email?: unknown }
  if (typeof email !== 'string') return ''
  return createHmac('sha256', env.ACCESS_TOKEN_SECRET).update(email.trim().toLowerCase()).digest('base64url')
}

/** Refuses with `too_many_requests` and a Retry-After header. Each call makes a limiter with a count of its own. */
export function limitRate(
  env: Env,
  { limit, minutes, perAddress = false, failuresOnly = false }: Limit,
): RequestHandler {
  return rateLimit({
    windowMs: minutes * 60_000,
    limit: Math.ceil(limit * env.RATE_LIMIT_SCALE),
    skipSuccessfulRequests: failuresOnly,
    standardHeaders: false,
    legacyHeaders: false,
    keyGenerator: (request) => {
      const caller = ipKeyGenerator(request.ip ?? '')
      return perAddress ? `${caller} ${addressKey(env, request)}` : caller
    },
    handler: (_request, response, next) => {
      if (response.getHeader('Retry-After') === undefined) response.setHeader('Retry-After', String(minutes * 60))
      next(new AppError('too_many_requests', 'That was tried too often. Wait a few minutes, then try again.'))
    },
  })
}
