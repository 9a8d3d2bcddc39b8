import { describe, expect, it } from 'vitest'
import { ROLES } from '#shared/contract/me'
import { isDemoAddress } from '#server/features/auth/demo-accounts'
import { TEST_PASSWORD } from '#tests/support/factories'
import { expectError } from '#tests/support/expect-error'
import { testApp } from '#tests/support/test-app'
import { ADMIN, ATHLETES, STAFF } from '../../../../seeds/demo/people'

describe('GET /api/auth/demo-accounts', () => {
  const demo = testApp({ PINTLE_DEMO: true })
  const real = testApp()

  it('names accounts of every role in each club of a demo', async () => {
    const { body } = await demo().anonymous().get('/api/auth/demo-accounts').expect(200)
    const items = body.items as Array<{ role: string; clubName: string }>
    const clubs = new Set(items.map(({ clubName }) => clubName))
    expect(clubs.size).toBe(2)
    for (const club of clubs) {
      const roles = items.filter(({ clubName }) => clubName === club).map(({ role }) => role)
      expect(new Set(roles)).toEqual(new Set(ROLES))
    }
  })

  it('names none where there is no demo', async () => {
    expect((await real().anonymous().get('/api/auth/demo-accounts').expect(200)).body).toEqual({
      items: [],
      nextCursor: null,
    })
  })
})

describe('a demo person who is still in the database', () => {
  const demo = testApp({ PINTLE_DEMO: true })
  const real = testApp()
  const email = ADMIN.email
  const sent = { email: email.toUpperCase(), password: TEST_PASSWORD }

  it('signs in while there is a demo', async () => {
    await demo().make.admin(undefined, { email })
    await demo().anonymous().post('/api/auth/sign-in').send(sent).expect(200)
  })

  it('cannot sign in once there is none, since everybody knows the password', async () => {
    await real().make.admin(undefined, { email })
    expectError(await real().anonymous().post('/api/auth/sign-in').send(sent), 'wrong_credentials')
  })

  it('is known by the address, whoever it is', () => {
    for (const person of [...ATHLETES, ...STAFF]) expect(isDemoAddress(person.email.toUpperCase())).toBe(true)
    expect(isDemoAddress('ilse.tamm@club.example')).toBe(false)
  })
})
