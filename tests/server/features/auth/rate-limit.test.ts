import { beforeAll, describe, expect, it } from 'vitest'
import { expectError } from '#tests/support/expect-error'
import { TEST_PASSWORD } from '#tests/support/factories'
import { testApp } from '#tests/support/test-app'

const post = (app: ReturnType<ReturnType<typeof testApp>>, path: string, body: object, from: string) =>
  app.anonymous().post(`/api/auth/${path}`).set('X-Forwarded-For', from).send(body)

describe('rate limits at their real size', () => {
  const app = testApp({ RATE_LIMIT_SCALE: 1, TRUST_PROXY: 1 })
  let email = ''
  beforeAll(async () => {
    email = (await app().make.athlete()).email
  })

  it('stop the eleventh wrong password for one address from one caller, and no other', async () => {
    const tried = (address: string, password: string, from = '192.0.2.1') =>
      post(app(), 'sign-in', { email: address, password }, from)
    for (let count = 0; count < 10; count += 1) expectError(await tried(email, 'wrong'), 'wrong_credentials')
    const refused = await tried(` ${email.toUpperCase()}`.trim(), TEST_PASSWORD)
    expectError(refused, 'too_many_requests')
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0)
    expectError(await tried('someone.else@example.test', 'wrong'), 'wrong_credentials')
    expect((await tried(email, TEST_PASSWORD, '192.0.2.2')).status).toBe(200)
  })

  it('do not count sign-ins that succeed', async () => {
    for (let count = 0; count < 12; count += 1) {
      expect((await post(app(), 'sign-in', { email, password: TEST_PASSWORD }, '192.0.2.3')).status).toBe(200)
    }
  })

  it('stop a caller who tries many addresses', async () => {
    const guess = (count: number) =>
      post(app(), 'sign-in', { email: `guess.${count}@example.test`, password: 'x' }, '192.0.2.4')
    for (let count = 0; count < 100; count += 1) expectError(await guess(count), 'wrong_credentials')
    expectError(await guess(100), 'too_many_requests')
  })

  it('count all addresses of one IPv6 network as one caller', async () => {
    const tried = (host: number) =>
      post(app(), 'sign-in', { email: 'v6@example.test', password: 'x' }, `2001:db8::${host}`)
    for (let host = 1; host <= 10; host += 1) expectError(await tried(host), 'wrong_credentials')
    expectError(await tried(11), 'too_many_requests')
  })

  it('stop the sixth reset request for one address, answering alike whether it exists', async () => {
    for (const address of [email, 'nobody.at.all@example.test']) {
      for (let count = 0; count < 5; count += 1) {
        expect((await post(app(), 'password-reset-requests', { email: address }, '192.0.2.5')).status).toBe(202)
      }
      expectError(await post(app(), 'password-reset-requests', { email: address }, '192.0.2.5'), 'too_many_requests')
    }
  })

  it('stop guessing reset tokens', async () => {
    const guess = () => post(app(), 'password-resets', { token: 'x'.repeat(43), password: TEST_PASSWORD }, '192.0.2.6')
    for (let count = 0; count < 20; count += 1) expectError(await guess(), 'reset_link_invalid')
    expectError(await guess(), 'too_many_requests')
  })

  it('stop guessing refresh tokens', async () => {
    const guess = () =>
      app().anonymous().post('/api/auth/refresh').set('X-Forwarded-For', '192.0.2.7').set('Cookie', 'pintle_refresh=x')
    for (let count = 0; count < 300; count += 1) expect((await guess()).status).toBe(401)
    expectError(await guess(), 'too_many_requests')
  })
})

describe('rate limits without a proxy', () => {
  const app = testApp({ RATE_LIMIT_SCALE: 0.1 })

  it('do not believe a caller who names another address', async () => {
    const tried = (from: string) => post(app(), 'sign-in', { email: 'a@example.test', password: 'x' }, from)
    expectError(await tried('192.0.2.1'), 'wrong_credentials')
    expectError(await tried('192.0.2.2'), 'too_many_requests')
  })
})
