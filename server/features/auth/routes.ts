import { Router } from 'express'
import * as contract from '#shared/contract/auth'
import type { Dependencies } from '../../dependencies'
import { AppError } from '../../errors'
import { mountPublic } from '../../middleware/mount'
import { limitRate } from '../../middleware/rate-limit'
import { readMe } from '../me/service'
import { clearSessionCookies, readAccessCookie, readRefreshCookie, setSessionCookies } from './cookies'
import { demoAccounts } from './demo-accounts'
import { requestPasswordReset, resetPassword } from './password-reset'
import { refreshSession, signIn, signOut } from './session'

export function authRoutes(dependencies: Dependencies): Router {
  const { env } = dependencies
  const router = Router()

  const signInLimits = [
    limitRate(env, { limit: 100, minutes: 15, failuresOnly: true }),
    limitRate(env, { limit: 10, minutes: 15, failuresOnly: true, perAddress: true }),
  ]
  mountPublic(router, contract.signIn, signInLimits, async ({ body, context }) => {
    const session = await signIn(dependencies, body)
    setSessionCookies(context.response, env, session)
    return readMe(dependencies, session.userId)
  })

  mountPublic(router, contract.signOut, [], async ({ context: { request, response } }) => {
    await signOut(dependencies, { access: readAccessCookie(request), refresh: readRefreshCookie(request) })
    clearSessionCookies(response, env)
  })

  const refreshLimits = [limitRate(env, { limit: 300, minutes: 15 })]
  mountPublic(router, contract.refresh, refreshLimits, async ({ context: { request, response } }) => {
    const token = readRefreshCookie(request)
    if (token === null) throw new AppError('not_signed_in', 'Sign in first.')
    try {
      setSessionCookies(response, env, await refreshSession(dependencies, token))
    } catch (error) {
      if (error instanceof AppError && error.code === 'session_expired') clearSessionCookies(response, env)
      throw error
    }
  })

  const requestLimits = [
    limitRate(env, { limit: 30, minutes: 60 }),
    limitRate(env, { limit: 5, minutes: 60, perAddress: true }),
  ]
  mountPublic(router, contract.requestPasswordReset, requestLimits, ({ body }) => {
    requestPasswordReset(dependencies, body.email)
  })

  mountPublic(
    router,
    contract.resetPassword,
    [limitRate(env, { limit: 20, minutes: 60 })],
    async ({ body, context }) => {
      await resetPassword(dependencies, body)
      clearSessionCookies(context.response, env)
    },
  )

  mountPublic(router, contract.listDemoAccounts, [], () => ({ items: demoAccounts(env), nextCursor: null }))

  return router
}
