import { z } from 'zod'
import { email, list, password } from './common'
import { endpoint } from './endpoint'
import { LIMITS } from './limits'
import { me, role } from './me'

export const signIn = endpoint({
  method: 'POST',
  path: '/api/auth/sign-in',
  summary: 'Sign in with e-mail and password; sets the access and refresh cookies.',
  access: 'public',
  body: z.object({ email, password: z.string().min(1, 'Enter your password.').max(LIMITS.password.max) }),
  response: me,
})

export const signOut = endpoint({
  method: 'POST',
  path: '/api/auth/sign-out',
  summary: 'Sign out: revokes this refresh token family and clears the cookies. Succeeds when already signed out.',
  access: 'public',
})

export const refresh = endpoint({
  method: 'POST',
  path: '/api/auth/refresh',
  summary: 'Rotate the refresh token and set a new access cookie. Reuse of an old token revokes the family.',
  access: 'public',
})

export const requestPasswordReset = endpoint({
  method: 'POST',
  path: '/api/auth/password-reset-requests',
  summary: 'Send a reset link if the address exists. The answer is the same either way.',
  access: 'public',
  body: z.object({ email }),
  status: 202,
})

export const resetPassword = endpoint({
  method: 'POST',
  path: '/api/auth/password-resets',
  summary: 'Set a new password with the token from the mail; ends every session of that user.',
  access: 'public',
  body: z.object({ token: z.string().min(20).max(200), password }),
})

export const demoAccount = z.object({ name: z.string(), email, password: z.string(), role, clubName: z.string() })
export type DemoAccount = z.infer<typeof demoAccount>

export const listDemoAccounts = endpoint({
  method: 'GET',
  path: '/api/auth/demo-accounts',
  summary: 'The invented accounts of a demo, for its sign-in page. Empty everywhere else.',
  access: 'public',
  response: list(demoAccount),
})
