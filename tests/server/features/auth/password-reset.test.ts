import type { Response } from 'supertest'
import { IsNull } from 'typeorm'
import { describe, expect, it, vi } from 'vitest'
import { AuditEntry } from '#server/features/audit/entity'
import { PasswordReset, SignIn } from '#server/features/auth/entity'
import { hashPassword } from '#server/features/auth/password-hash'
import { revokeAllSignIns, setPasswordHash } from '#server/features/auth/repository'
import { hashToken } from '#server/features/auth/token'
import { User } from '#server/features/people/entity'
import { expectError } from '#tests/support/expect-error'
import { TEST_PASSWORD } from '#tests/support/factories'
import { testApp } from '#tests/support/test-app'

const app = testApp({ PUBLIC_URL: 'https://pintle.example.test' })
const NEW_PASSWORD = 'quite another password'

const ask = (email: string) => app().anonymous().post('/api/auth/password-reset-requests').send({ email })
const reset = (token: string, password = NEW_PASSWORD) =>
  app().anonymous().post('/api/auth/password-resets').send({ token, password })
const signIn = (email: string, password: string) =>
  app().anonymous().post('/api/auth/sign-in').send({ email, password })

/** The token in the mail that this address got. */
async function tokenFor(email: string): Promise<string> {
  await ask(email).expect(202)
  await app().dependencies.background.settled()
  const letter = app().mailBox.letters.findLast(({ to }) => to === email)
  return /reset-password#token=([\w-]+)/.exec(letter?.text ?? '')?.[1] ?? ''
}

describe('asking for a reset link', () => {
  it('answers the same whether the address exists or not, and mails only to one that does', async () => {
    const person = await app().make.athlete()
    const known = await ask(person.email)
    const unknown = await ask('nobody.at.all@example.test')
    await app().dependencies.background.settled()
    const shape = ({ status, text, headers }: typeof known) => ({
      status,
      text,
      names: Object.keys(headers).toSorted(),
    })
    expect(known.status).toBe(202)
    expect(shape(unknown)).toEqual(shape(known))
    expect(app().mailBox.letters.map(({ to }) => to)).toEqual([person.email])
  })

  it('sends a link whose token never reaches a server log, in both forms of the mail', async () => {
    const person = await app().make.athlete({ name: 'Ann <b>' })
    const token = await tokenFor(person.email)
    const url = `https://pintle.example.test/reset-password#token=${token}`
    const letter = app().mailBox.letters.findLast(({ to }) => to === person.email)
    expect(letter?.text).toContain(url)
    expect(letter?.html).toContain(`href="${url}"`)
    expect(letter?.html).toContain('Ann &lt;b&gt;')
    expect(JSON.stringify(app().logs)).not.toContain(token)
  })

  it('keeps the token hashed and makes an older link useless', async () => {
    const person = await app().make.athlete()
    const first = await tokenFor(person.email)
    const second = await tokenFor(person.email)
    const rows = await app().dataSource.manager.findBy(PasswordReset, { userId: person.id })
    expect(rows.map(({ tokenHash }) => tokenHash)).toEqual([hashToken(second)])
    expectError(await reset(first), 'reset_link_invalid')
  })

  it('refuses what is no address', async () => {
    expectError(await ask('no address'), 'invalid_request', ['email'])
  })
})

describe('setting a new password', () => {
  it('lets the new password in, shuts the old one out and ends every session', async () => {
    const person = await app().make.athlete()
    const agent = await app().as(person)
    await agent.get('/api/me').expect(200)
    await reset(await tokenFor(person.email)).expect(204)
    expectError(await agent.get('/api/me'), 'session_expired')
    expectError(await signIn(person.email, TEST_PASSWORD), 'wrong_credentials')
    await signIn(person.email, NEW_PASSWORD).expect(200)
    const { passwordHash } = await app().dataSource.manager.findOneByOrFail(User, { id: person.id })
    expect(passwordHash).toMatch(/^\$argon2id\$/)
    expect(await app().dataSource.manager.countBy(AuditEntry, { subjectId: person.id, action: 'reset.password' })).toBe(
      1,
    )
  })

  it('works once, also when tried twice at the same moment', async () => {
    const person = await app().make.athlete()
    const token = await tokenFor(person.email)
    const answers = await Promise.all([reset(token), reset(token)])
    expect(answers.map(({ status }) => status).toSorted()).toEqual([204, 410])
    expectError(await reset(token), 'reset_link_invalid')
  })

  it('ends every other link, also one that was asked for at the same moment', async () => {
    const person = await app().make.athlete()
    const token = await tokenFor(person.email)
    const twin = 'twin'.repeat(10)
    const createdAt = app().clock.now()
    const expiresAt = new Date(createdAt.getTime() + 60_000)
    const { manager } = app().dataSource
    await manager.insert(PasswordReset, { userId: person.id, tokenHash: hashToken(twin), createdAt, expiresAt })
    await reset(token).expect(204)
    expectError(await reset(twin, 'somebody else’s password'), 'reset_link_invalid')
    await signIn(person.email, NEW_PASSWORD).expect(200)
  })

  it('works for thirty minutes', async () => {
    const person = await app().make.athlete()
    const token = await tokenFor(person.email)
    app().clock.advance({ minutes: 30, seconds: 1 })
    expectError(await reset(token), 'reset_link_invalid')
    await signIn(person.email, TEST_PASSWORD).expect(200)
  })

  it('keeps the link when the new password is too short', async () => {
    const person = await app().make.athlete()
    const token = await tokenFor(person.email)
    expectError(await reset(token, 'short'), 'invalid_request', ['password'])
    await reset(token).expect(204)
  })

  it('refuses a made-up token', async () => {
    expectError(await reset('x'.repeat(43)), 'reset_link_invalid')
  })
})

describe('a sign-in with the old password at the very moment of a reset', () => {
  it('opens no session that outlives the reset', async () => {
    const { dataSource, clock, make } = app()
    const person = await make.athlete()
    const newHash = await hashPassword(NEW_PASSWORD)
    let crossing: Promise<Response> | undefined
    await dataSource.transaction(async (manager) => {
      // Holds the sign-in where it has compared the password and not yet written anything.
      await manager.query('select 1 from users where id = $1 for update', [person.id])
      crossing = signIn(person.email, TEST_PASSWORD).then((answer) => answer)
      await vi.waitFor(
        async () => {
          const waiting: unknown[] = await dataSource.query(
            `select 1 from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'`,
          )
          expect(waiting).toHaveLength(1)
        },
        { timeout: 5000, interval: 20 },
      )
      await setPasswordHash(manager, person.id, newHash)
      await revokeAllSignIns(manager, person.id, clock.now(), 'passwordReset')
    })
    expectError(await crossing!, 'wrong_credentials')
    expect(await dataSource.manager.countBy(SignIn, { userId: person.id, revokedAt: IsNull() })).toBe(0)
    await signIn(person.email, NEW_PASSWORD).expect(200)
  })
})
