import type { RequestHandler } from 'express'
import type { Env } from '../env'
import { AppError } from '../errors'

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses writes that a page of another origin sent. With PUBLIC_URL set only that origin is ours; without it the
 * origin must be the host that was called. A call with neither header does not come from a browser.
 */
export function checkOrigin(env: Env): RequestHandler {
  const ours = env.PUBLIC_URL === undefined ? null : new URL(env.PUBLIC_URL).origin
  return (request, _response, next) => {
    if (SAFE_METHODS.has(request.method)) return next()
    const { origin, host } = request.headers
    const site = request.headers['sec-fetch-site']
    const foreignSite = site !== undefined && site !== 'same-origin' && site !== 'none'
    const foreignOrigin = origin !== undefined && (ours === null ? hostOf(origin) !== host : origin !== ours)
    if (foreignSite || foreignOrigin) throw new AppError('wrong_origin', 'This was sent from another site.')
    next()
  }
}

function hostOf(origin: string): string | null {
  try {
    return new URL(origin).host
  } catch {
    return null
  }
}
