import type { CookieOptions, Request, Response } from 'express'
import { publicUrl, type Env } from '../../env'
import { ACCESS_TOKEN_SECONDS } from './access-token'

const ACCESS = 'pintle_access'
const REFRESH = 'pintle_refresh'
/** The refresh token is sent to the few endpoints that need it and to no other. */
const REFRESH_PATH = '/api/auth'

const options = (env: Env, path: string): CookieOptions => ({
  httpOnly: true,
  sameSite: 'strict',
  secure: publicUrl(env).startsWith('https:'),
  path,
})

const read = (request: Request, name: string): string | null => {
  const value: unknown = (request.cookies as Record<string, unknown>)[name]
  return typeof value === 'string' && value !== '' ? value : null
}

export const readAccessCookie = (request: Request) => read(request, ACCESS)
export const readRefreshCookie = (request: Request) => read(request, REFRESH)

export function setSessionCookies(
  response: Response,
  env: Env,
  tokens: { access: string; refresh: string; refreshSeconds: number },
): void {
  response.cookie(ACCESS, tokens.access, { ...options(env, '/api'), maxAge: ACCESS_TOKEN_SECONDS * 1000 })
  response.cookie(REFRESH, tokens.refresh, { ...options(env, REFRESH_PATH), maxAge: tokens.refreshSeconds * 1000 })
}

export function clearSessionCookies(response: Response, env: Env): void {
  response.clearCookie(ACCESS, options(env, '/api'))
  response.clearCookie(REFRESH, options(env, REFRESH_PATH))
}
