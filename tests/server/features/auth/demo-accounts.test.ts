import { describe, expect, it } from 'vitest'
import { ROLES } from '#shared/contract/me'
import { testApp } from '#tests/support/test-app'

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
