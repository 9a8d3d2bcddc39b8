import { afterEach, describe, expect, it, vi } from 'vitest'
import { getMe, updateMe } from '#shared/contract/me'
import { getToday } from '#shared/contract/session'
import { signIn } from '#shared/contract/auth'
import { buildUrl, call } from '@/lib/api-client'
import { fakeApi, Refusal } from '#tests/src/support/api'
import { aPerson, aToday } from '#tests/src/support/samples'

afterEach(() => vi.unstubAllGlobals())

const expired = new Refusal(401, 'session_expired')

describe('URLs', () => {
  it('fill in their names and leave out what is not given', () => {
    expect(
      buildUrl('/api/athletes/:athleteId/today', {
        params: { athleteId: 'a/b' },
        query: { day: '2026-12-01', x: undefined },
      }),
    ).toBe('/api/athletes/a%2Fb/today?day=2026-12-01')
  })

  it('refuse to be built without a name they need', () => {
    expect(() => buildUrl('/api/swaps/:swapId/undo', {})).toThrow(TypeError)
  })
})

describe('a lapsed session', () => {
  it('is renewed once for all requests that wait for it, and each is repeated', async () => {
    let renewed = false
    const person = aPerson()
    const api = fakeApi({
      'GET /api/me': () => (renewed ? person : expired),
      'GET /api/athletes/7/today': () => (renewed ? aToday(null) : new Refusal(401, 'not_signed_in')),
      'POST /api/auth/refresh': async () => {
        await new Promise((resolve) => setTimeout(resolve, 5))
        renewed = true
      },
    })
    const [me] = await Promise.all([
      call(getMe),
      call(getToday, { params: { athleteId: '7' }, query: { day: '2026-12-01' } }),
    ])
    expect(me).toEqual(person)
    expect(api.to('POST /api/auth/refresh')).toHaveLength(1)
    expect(api.to('GET /api/me')).toHaveLength(2)
  })

  it('that cannot be renewed is told as it was, without a loop', async () => {
    const api = fakeApi({ 'GET /api/me': expired, 'POST /api/auth/refresh': new Refusal(401, 'not_signed_in') })
    await expect(call(getMe)).rejects.toMatchObject({ code: 'session_expired' })
    expect(api.sent).toHaveLength(2)
  })

  it('is not blamed when the network fails while renewing', async () => {
    fakeApi({ 'GET /api/me': expired })
    await expect(call(getMe)).rejects.toMatchObject({ code: 'unreachable' })
  })

  it('has nothing to do with wrong credentials', async () => {
    const api = fakeApi({ 'POST /api/auth/sign-in': new Refusal(401, 'wrong_credentials') })
    await expect(call(signIn, { body: { email: 'a@b.example', password: 'x' } })).rejects.toMatchObject({
      code: 'wrong_credentials',
    })
    expect(api.sent).toHaveLength(1)
  })
})

describe('failures', () => {
  it('carry code, sentence, fields and request id', async () => {
    fakeApi({
      'PATCH /api/me': new Refusal(400, 'invalid_request', 'Look again.', [{ path: 'name', message: 'Too long.' }]),
    })
    await expect(call(updateMe, { body: { name: 'x' } })).rejects.toMatchObject({
      code: 'invalid_request',
      message: 'Look again.',
      fields: [{ path: 'name', message: 'Too long.' }],
      requestId: 'request-1',
    })
  })

  it('to reach the server have a code of their own', async () => {
    fakeApi({})
    await expect(call(getMe)).rejects.toMatchObject({ code: 'unreachable' })
  })

  it('to understand the answer have one too', async () => {
    vi.stubGlobal('fetch', () => Promise.resolve(new Response('<h1>Bad gateway</h1>', { status: 502 })))
    await expect(call(getMe)).rejects.toMatchObject({ code: 'unreadable' })
  })
})
