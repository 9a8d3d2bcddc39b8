import { inject } from 'vitest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { testBrowser } from '#tests/support/browser'
import { startBuiltServer, type BuiltServer } from '#tests/support/built-server'
import { administer, databaseUrl } from '#tests/support/database'

describe('the built server', () => {
  const browser = testBrowser()

  it('shows the sign-in page under its own content security policy', async () => {
    // Not being signed in yet is an answer of the API that browsers write into the console.
    const page = await browser.open('/sign-in', { mayComplain: /status of 401/ })
    await page.getByRole('button', { name: 'Sign in' }).waitFor()
    expect(await page.title()).toContain('Pintle')
  })

  it('answers unknown API addresses in the one error shape', async () => {
    const response = await fetch(new URL('/api/no-such-thing', inject('baseUrl')))
    expect({ status: response.status, body: await response.json() }).toMatchObject({
      status: 404,
      body: { error: { code: 'not_found', fields: [] } },
    })
  })
})

describe('starting and stopping', () => {
  const name = `pintle_stop_${process.pid}_${Date.now().toString(36)}`
  let server: BuiltServer | undefined
  const adminUrl = inject('adminUrl')
  beforeAll(async () => {
    await administer(adminUrl, `create database "${name}"`)
    server = await startBuiltServer(databaseUrl(adminUrl, name))
  })
  afterAll(async () => {
    server?.process.kill('SIGKILL')
    await administer(adminUrl, `drop database if exists "${name}" with (force)`)
  })

  it('prints its address, the demo accounts and where mails are read, and stops cleanly on SIGTERM', async () => {
    expect(server?.output()).toContain(`Pintle is ready at ${server?.url}`)
    expect(server?.output()).toMatch(/coach +\S+@\S+/)
    expect(server?.output()).toContain(server?.mailPageUrl)
    // A connection that is kept open must not keep the server from stopping.
    await fetch(`${server?.url}/api/health`)
    expect(await server?.stop()).toBe(0)
  })
})
