import jwt from 'jsonwebtoken'
import type { Response } from 'supertest'
import { describe, expect, it } from 'vitest'
import { AuditEntry } from '#server/features/audit/entity'
import { RefreshToken, SignIn } from '#server/features/auth/entity'
import { hashToken } from '#server/features/auth/token'
import { expectError } from '#tests/support/expect-error'
import { TEST_PASSWORD } from '#tests/support/factories'
import { testApp } from '#tests/support/test-app'

const app = testApp()

/** Name → raw Set-Cookie line of an answer. */
function cookies(response: Response): Record<string, string> {
  const lines = (response.headers['set-cookie'] ?? []) as unknown as string[]
  return Object.fromEntries(lines.map((line) => [line.split('=')[0] ?? '', line]))
}
const valueOf = (line: string | undefined) => /^[^=]+=([^;]*)/.exec(line ?? '')?.[1] ?? ''

const signIn = (email: string, password = TEST_PASSWORD) =>
  app().anonymous().post('/api/auth/sign-in').send({ email, password })

async function signedIn() {
  const { make } = app()
  const person = await make.athlete()
  const response = await signIn(person.email).expect(200)
  const { pintle_access: access, pintle_refresh: refresh } = cookies(response)
  return { person, access: valueOf(access), refresh: valueOf(refresh) }
}

const refreshWith = (token: string) =>
  app().anonymous().post('/api/auth/refresh').set('Cookie', `pintle_refresh=${token}`)
const meWith = (token: string) => app().anonymous().get('/api/me').set('Cookie', `pintle_access=${token}`)

describe('signing in', () => {
  it('answers who it is and sets two cookies that scripts and other sites cannot use', async () => {
    const { make, dataSource } = app()
    const person = await make.athlete({ name: 'Iris' })
    const response = await signIn(person.email).expect(200)
    expect(response.body).toMatchObject({ id: person.id, name: 'Iris', email: person.email })
    const { pintle_access: access, pintle_refresh: refresh } = cookies(response)
    expect(access).toMatch(/; Path=\/api; .*HttpOnly; SameSite=Strict/)
    expect(refresh).toMatch(/; Path=\/api\/auth; .*HttpOnly; SameSite=Strict/)
    expect(access).toContain('Max-Age=900;')
    expect(await dataSource.manager.countBy(SignIn, { userId: person.id })).toBe(1)
    expect(await dataSource.manager.countBy(AuditEntry, { actorId: person.id, action: 'open.session' })).toBe(1)
  })

  it('stores the refresh token hashed only', async () => {
    const { refresh } = await signedIn()
    const { manager } = app().dataSource
    expect(await manager.countBy(RefreshToken, { tokenHash: refresh })).toBe(0)
    expect(await manager.countBy(RefreshToken, { tokenHash: hashToken(refresh) })).toBe(1)
  })

  it('does not mind capitals in the address', async () => {
    const person = await app().make.coach()
    await signIn(person.email.toUpperCase()).expect(200)
  })

  it('answers alike for a wrong password and for an unknown address', async () => {
    const person = await app().make.coach()
    const wrong = await signIn(person.email, 'not the password')
    const unknown = await signIn('nobody.at.all@example.test', 'not the password')
    expectError(wrong, 'wrong_credentials')
    expectError(unknown, 'wrong_credentials')
    expect({ ...unknown.body.error, requestId: '' }).toEqual({ ...wrong.body.error, requestId: '' })
    expect(cookies(wrong)).toEqual({})
  })

  it('takes about as long for an unknown address as for a wrong password', { retry: 2 }, async () => {
    const person = await app().make.coach()
    const median = async (email: string) => {
      const times: number[] = []
      for (let round = 0; round < 7; round += 1) {
        const start = performance.now()
        await signIn(email, 'not the password')
        times.push(performance.now() - start)
      }
      return times.toSorted((a, b) => a - b)[3] ?? NaN
    }
    await median(person.email)
    const known = await median(person.email)
    const unknown = await median('nobody.at.all@example.test')
    // A missing hash comparison would make the unknown address about ten times faster.
    expect(unknown / known).toBeGreaterThan(0.4)
    expect(unknown / known).toBeLessThan(2.5)
  })

  it.each([
    [{ email: 'no address', password: 'x' }, ['email']],
    [{ email: 'a@example.test' }, ['password']],
    [{ email: 'a@example.test', password: '' }, ['password']],
    [{ email: ['a@example.test'], password: { $ne: '' } }, ['email', 'password']],
    [{ email: 'a@example.test', password: 'x'.repeat(201) }, ['password']],
  ])('refuses %j as invalid', async (body, fields) => {
    expectError(await app().anonymous().post('/api/auth/sign-in').send(body), 'invalid_request', fields)
  })
})

describe('an access token', () => {
  it('opens the API until it is fifteen minutes old', async () => {
    const { access } = await signedIn()
    app().clock.advance({ minutes: 14 })
    await meWith(access).expect(200)
    app().clock.advance({ minutes: 1, seconds: 1 })
    expectError(await meWith(access), 'session_expired')
  })

  it('is refused when another key, another algorithm or no algorithm signed it', async () => {
    const { access } = await signedIn()
    const claims = jwt.decode(access) as jwt.JwtPayload
    const { ACCESS_TOKEN_SECRET: secret } = app().dependencies.env
    expectError(await meWith(jwt.sign(claims, `${secret}x`)), 'session_expired')
    expectError(await meWith(jwt.sign(claims, secret, { algorithm: 'HS512' })), 'session_expired')
    expectError(await meWith(jwt.sign(claims, '', { algorithm: 'none' })), 'session_expired')
    expectError(await meWith('garbage'), 'session_expired')
  })

  it('does not open another person’s account when its subject is changed', async () => {
    const { access } = await signedIn()
    const other = await app().make.coach()
    const { ACCESS_TOKEN_SECRET: secret } = app().dependencies.env
    const claims = { ...(jwt.decode(access) as jwt.JwtPayload), sub: other.id }
    expectError(await meWith(jwt.sign(claims, secret)), 'session_expired')
  })
})

describe('refreshing', () => {
  it('trades the token for a new pair and carries on when the access token is over', async () => {
    const { refresh } = await signedIn()
    app().clock.advance({ days: 5 })
    const response = await refreshWith(refresh).expect(204)
    const { pintle_access: access, pintle_refresh: next } = cookies(response)
    expect(valueOf(next)).not.toBe(refresh)
    await meWith(valueOf(access)).expect(200)
  })

  it('says not_signed_in without a token and session_expired with an unknown one', async () => {
    expectError(await app().anonymous().post('/api/auth/refresh'), 'not_signed_in')
    const unknown = await refreshWith('no-such-token')
    expectError(unknown, 'session_expired')
    expect(cookies(unknown).pintle_refresh).toContain('Expires=Thu, 01 Jan 1970')
  })

  it('lets two tabs spend the same token at the same time', async () => {
    const { refresh } = await signedIn()
    const answers = await Promise.all([refreshWith(refresh), refreshWith(refresh)])
    expect(answers.map(({ status }) => status)).toEqual([204, 204])
    for (const answer of answers) await meWith(valueOf(cookies(answer).pintle_access)).expect(200)
  })

  it('takes a token that was spent a while ago for stolen and ends the whole sign-in', async () => {
    const { person, refresh } = await signedIn()
    const next = cookies(await refreshWith(refresh).expect(204))
    app().clock.advance({ seconds: 31 })
    expectError(await refreshWith(refresh), 'session_expired')
    expectError(await refreshWith(valueOf(next.pintle_refresh)), 'session_expired')
    expectError(await meWith(valueOf(next.pintle_access)), 'session_expired')
    const signIns = await app().dataSource.manager.findBy(SignIn, { userId: person.id })
    expect(signIns.map(({ revokedWhy }) => revokedWhy)).toEqual(['tokenReused'])
    expect(await app().dataSource.manager.countBy(AuditEntry, { subjectId: person.id, action: 'revoke.session' })).toBe(
      1,
    )
  })

  it('leaves the person’s other sign-ins alone when one is stolen', async () => {
    const { person, refresh } = await signedIn()
    const other = cookies(await signIn(person.email).expect(200))
    await refreshWith(refresh).expect(204)
    app().clock.advance({ seconds: 31 })
    expectError(await refreshWith(refresh), 'session_expired')
    await meWith(valueOf(other.pintle_access)).expect(200)
  })

  it('ends after 30 days without use, and after 90 days in any case', async () => {
    const idle = await signedIn()
    app().clock.advance({ days: 30, seconds: 1 })
    expectError(await refreshWith(idle.refresh), 'session_expired')

    let { refresh } = await signedIn()
    for (let day = 20; day <= 80; day += 20) {
      app().clock.advance({ days: 20 })
      refresh = valueOf(cookies(await refreshWith(refresh).expect(204)).pintle_refresh)
    }
    app().clock.advance({ days: 10, seconds: 1 })
    expectError(await refreshWith(refresh), 'session_expired')
  })
})

describe('signing out', () => {
  it('ends the sign-in at once, whichever token comes along, and clears the cookies', async () => {
    const { access, refresh } = await signedIn()
    const response = await app()
      .anonymous()
      .post('/api/auth/sign-out')
      .set('Cookie', `pintle_refresh=${refresh}`)
      .expect(204)
    expect(Object.keys(cookies(response)).toSorted()).toEqual(['pintle_access', 'pintle_refresh'])
    expectError(await meWith(access), 'session_expired')
    expectError(await refreshWith(refresh), 'session_expired')

    const second = await signedIn()
    await app().anonymous().post('/api/auth/sign-out').set('Cookie', `pintle_access=${second.access}`).expect(204)
    expectError(await refreshWith(second.refresh), 'session_expired')
  })

  it('leaves one line in the trail, however often it is asked for', async () => {
    const { person, access, refresh } = await signedIn()
    for (const cookie of [`pintle_access=${access}; pintle_refresh=${refresh}`, `pintle_refresh=${refresh}`]) {
      await app().anonymous().post('/api/auth/sign-out').set('Cookie', cookie).expect(204)
    }
    const trail = await app().dataSource.manager.findBy(AuditEntry, { subjectId: person.id, action: 'close.session' })
    expect(trail.map(({ actorId, details }) => ({ actorId, details }))).toEqual([{ actorId: person.id, details: {} }])
  })

  it('succeeds when nobody is signed in', async () => {
    await app().anonymous().post('/api/auth/sign-out').expect(204)
  })
})
