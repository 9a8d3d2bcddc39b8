import { mkdtempSync, mkdirSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import request from 'supertest'
import { describe, expect, it, vi } from 'vitest'
import { LIMITS } from '#shared/contract/limits'
import { ENDPOINTS } from '#shared/contract/index'
import { expectError } from '#tests/support/expect-error'
import { testApp } from '#tests/support/test-app'

const clientDir = mkdtempSync(join(tmpdir(), 'pintle-client-'))
mkdirSync(join(clientDir, 'assets'))
writeFileSync(join(clientDir, 'index.html'), '<!doctype html><title>Pintle</title>')
writeFileSync(join(clientDir, 'favicon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>')
writeFileSync(join(clientDir, 'assets', 'main-abc123.js'), 'export {}')
writeFileSync(join(clientDir, 'assets', 'large-abc123.js'), 'export {}\n'.repeat(1000))

const app = testApp({ CLIENT_DIR: clientDir })
const json = (path: string, text: string) =>
  app().anonymous().post(path).set('Content-Type', 'application/json').send(text)

/** A path of the contract with something valid in each parameter's place. */
const filled = (path: string) => path.replace(/:[a-zA-Z]+/g, '0b5c1f2e-7a51-4f0e-9d9c-8f1d6f0a1b2c')

describe('every endpoint of the contract', () => {
  it.each(
    ENDPOINTS.filter(({ endpoint }) => endpoint.access === 'signedIn').map(
      ({ endpoint }) => [endpoint.method, endpoint.path] as const,
    ),
  )('%s %s asks for a sign-in first', async (method, path) => {
    const response = await app().anonymous()[method.toLowerCase() as 'get'](filled(path))
    expectError(response, 'not_signed_in')
  })

  it.each([...new Set(ENDPOINTS.map(({ endpoint }) => endpoint.path))])('%s names the methods it has', async (path) => {
    const methods = ENDPOINTS.filter(({ endpoint }) => endpoint.path === path).map(({ endpoint }) => endpoint.method)
    const response = await app().anonymous().trace(filled(path))
    expectError(response, 'method_not_allowed')
    expect(response.headers.allow).toBe(methods.join(', '))
  })
})

describe('a request that cannot be read', () => {
  const path = '/api/auth/sign-in'

  it.each(['{', '{"email":}', "{'email': 1}", '\u0000', '{"a":1}}', '[1,', '{"a":"\\x"}'])(
    'is malformed_json: %j',
    async (text) => {
      expectError(await json(path, text), 'malformed_json')
    },
  )

  it.each(['[]', '1', 'null', '"text"', 'true'])('is invalid when the body is %s', async (text) => {
    expectError(await json(path, text), 'invalid_request', [''])
  })

  it('is invalid without a body', async () => {
    expectError(await app().anonymous().post(path), 'invalid_request', [''])
  })

  it('is body_too_large beyond the limit, also when it is compressed or chunked', async () => {
    const large = JSON.stringify({ email: 'x'.repeat(LIMITS.requestBody) })
    expectError(await json(path, large), 'body_too_large')
    const { gzipSync } = await import('node:zlib')
    const zipped = await app()
      .anonymous()
      .post(path)
      .set({ 'Content-Type': 'application/json', 'Content-Encoding': 'gzip' })
      .serialize((body: unknown) => body as string)
      .send(gzipSync(large))
    expectError(zipped, 'body_too_large')
  })

  it.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x', 'application/jsonp'])(
    'is unsupported as %s',
    async (type) => {
      expectError(
        await app().anonymous().post(path).set('Content-Type', type).send('email=a'),
        'unsupported_media_type',
      )
    },
  )

  it('is unsupported in a character set or encoding that nobody reads', async () => {
    const post = () => app().anonymous().post(path)
    expectError(
      await post().set('Content-Type', 'application/json; charset=klingon').send('{}'),
      'unsupported_media_type',
    )
    const encoded = post().set({ 'Content-Type': 'application/json', 'Content-Encoding': 'x-odd' })
    expectError(await encoded.send('{}'), 'unsupported_media_type')
  })

  it('is invalid when nested absurdly deep', async () => {
    const deep = `{"email":${'['.repeat(100_000)}${']'.repeat(100_000)}}`
    const response = await json(path, deep)
    expect(response.status).toBe(400)
    expect(response.body.error.code).toBe('invalid_request')
  })

  it('is invalid with a broken percent code in its path', async () => {
    expectError(await app().anonymous().get('/api/exercises/%E0%A4%A'), 'invalid_request')
  })

  it('does not take __proto__ for a field', async () => {
    expectError(await json(path, '{"__proto__":{"email":"a@example.test","password":"x"}}'), 'invalid_request', [
      'email',
      'password',
    ])
  })
})

describe('text that the database cannot store', () => {
  it.each(['%00', 'a%00b'])('is refused in a path: %s', async (value) => {
    const agent = await app().as(await app().make.athlete())
    expectError(await agent.get(`/api/exercises/${value}`), 'invalid_request', ['slug'])
  })

  it('is refused in a query and in a body, at any depth and in names', async () => {
    const agent = await app().as(await app().make.admin())
    expectError(await agent.get('/api/audit?cursor=%00'), 'invalid_request', ['cursor'])
    expectError(await agent.get('/api/audit?other=%00'), 'invalid_request', ['other'])
    const post = (text: string) => agent.patch('/api/me').set('Content-Type', 'application/json').send(text)
    expectError(await post('{"name":"\\u0000"}'), 'invalid_request', ['name'])
    expectError(await post('{"body":{"deep":[{"x":"\\udfff"}]}}'), 'invalid_request', ['body.deep.0.x'])
    expectError(await post('{"na\\u0000me":"x"}'), 'invalid_request', [''])
    await post('{"name":"a pair \\ud83c\\udfcb is fine"}').expect(200)
  })
})

describe('an address that is not there', () => {
  it('is not_found under /api, for every method, signed in or not', async () => {
    expectError(await app().anonymous().get('/api/no-such-thing'), 'not_found')
    expectError(await app().anonymous().post('/api'), 'not_found')
    expectError(await (await app().as(await app().make.coach())).delete('/api/me/x/y'), 'not_found')
  })
})

describe('the origin of a write', () => {
  const write = (headers: Record<string, string>) =>
    app()
      .anonymous()
      .post('/api/auth/sign-out')
      .set({ Host: 'pintle.example.test', ...headers })

  it.each<Record<string, string>>([
    { Origin: 'https://elsewhere.example.test' },
    { Origin: 'http://pintle.example.test:8080' },
    { Origin: 'http://pintle.example.test.elsewhere.test' },
    { Origin: 'null' },
    { Origin: 'garbage' },
    { 'Sec-Fetch-Site': 'cross-site' },
    { 'Sec-Fetch-Site': 'same-site' },
    { Origin: 'http://pintle.example.test', 'Sec-Fetch-Site': 'cross-site' },
  ])('is wrong with %j', async (headers) => {
    expectError(await write(headers), 'wrong_origin')
  })

  it.each<Record<string, string>>([
    {},
    { Origin: 'http://pintle.example.test' },
    { Origin: 'http://pintle.example.test', 'Sec-Fetch-Site': 'same-origin' },
    { 'Sec-Fetch-Site': 'none' },
  ])('is right with %j', async (headers) => {
    expect((await write(headers)).status).toBe(204)
  })

  it('does not matter for reading', async () => {
    await app().anonymous().get('/api/health').set('Origin', 'https://elsewhere.example.test').expect(200)
  })

  it('is checked before anything is written', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    expectError(
      await agent.patch('/api/me').set('Origin', 'https://elsewhere.example.test').send({ name: 'X' }),
      'wrong_origin',
    )
    expect((await agent.get('/api/me')).body.name).toBe(athlete.name)
  })
})

describe('every answer', () => {
  it('carries the security headers and no script may be inline', async () => {
    for (const path of ['/', '/api/health', '/api/no-such-thing', '/assets/none.js']) {
      const { headers } = await request(app().app).get(path)
      const policy = headers['content-security-policy'] ?? ''
      expect(policy).toContain("default-src 'none'")
      expect(policy).toMatch(/script-src 'self'(;|$)/)
      expect(policy).toContain("frame-ancestors 'none'")
      expect(headers).toMatchObject({ 'x-content-type-options': 'nosniff', 'referrer-policy': 'no-referrer' })
      expect(headers['x-powered-by']).toBeUndefined()
      expect(headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/)
    }
  })

  it('takes no request id from outside', async () => {
    const { headers } = await app().anonymous().get('/api/health').set('X-Request-Id', 'forged')
    expect(headers['x-request-id']).not.toBe('forged')
  })
})

describe('the built client', () => {
  it('is index.html for every page, never cached', async () => {
    for (const path of ['/', '/swaps/1', '/reset-password', '/index.html']) {
      const response = await request(app().app).get(path).expect(200)
      expect(response.text).toContain('<title>Pintle</title>')
    }
    expect((await request(app().app).get('/today')).headers['cache-control']).toBe('no-cache')
  })

  it('has assets that are cached for ever, and missing ones are not a page', async () => {
    const asset = await request(app().app).get('/assets/main-abc123.js').expect(200)
    expect(asset.headers['cache-control']).toBe('public, max-age=31536000, immutable')
    expectError(await request(app().app).get('/assets/old-file.js'), 'not_found')
  })

  it('and the API are sent compressed to whoever can read that', async () => {
    for (const path of ['/assets/large-abc123.js', '/api/openapi.json']) {
      const plain = await request(app().app).get(path).set('Accept-Encoding', 'identity').expect(200)
      const packed = await request(app().app).get(path).set('Accept-Encoding', 'gzip').expect(200)
      expect(plain.headers['content-encoding']).toBeUndefined()
      expect(packed.headers).toMatchObject({ 'content-encoding': 'gzip', vary: 'Accept-Encoding' })
      expect(packed.text).toBe(plain.text)
    }
  })

  it('does not serve files from outside its folder', async () => {
    for (const path of ['/../package.json', '/%2e%2e/package.json', '/assets/..%2f..%2f..%2fetc%2fpasswd']) {
      const response = await request(app().app).get(path)
      expect(response.text).not.toContain('"dependencies"')
      expect(response.text).not.toContain('root:')
    }
  })

  it('is only read', async () => {
    expectError(await request(app().app).post('/today'), 'method_not_allowed')
  })
})

describe('health', () => {
  it('answers once the database does', async () => {
    expect((await app().anonymous().get('/api/health').expect(200)).body).toEqual({ status: 'ok' })
  })
})

describe('the log', () => {
  it('names the route and the status, and nothing of what was sent or who sent it', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    app().logs.length = 0
    await agent
      .patch('/api/me')
      .set('User-Agent', 'spy')
      .send({ name: 'Secret Name', body: { bodyMass: 9999 } })
    await app().anonymous().post('/api/auth/sign-in').send({ email: athlete.email, password: 'secret password' })
    await agent.get(`/api/athletes/${athlete.id}/today?day=2026-03-02`)
    await agent.get('/api/audit?cursor=secret-cursor')
    const text = JSON.stringify(app().logs)
    expect(app().logs.length).toBeGreaterThanOrEqual(4)
    expect(text).toContain('/api/me')
    expect(text).toContain('/api/athletes/:athleteId/today')
    for (const secret of [
      'Secret',
      'secret',
      '9999',
      athlete.email,
      athlete.id,
      'pintle_access',
      'spy',
      '2026-03-02T',
      '127.0.0.1',
      '::1',
    ]) {
      expect(text).not.toContain(secret)
    }
  })

  it('shows the code and place of a failed query, not its values', async () => {
    const { app: express, dependencies, logs } = app()
    logs.length = 0
    // The original is called through, with a query that PostgreSQL refuses.
    const query = dependencies.dataSource.query.bind(dependencies.dataSource)
    const broken = vi.spyOn(dependencies.dataSource, 'query')
    broken.mockImplementation(() => query('select $1::int', ['my secret value']))
    const response = await request(express).get('/api/health')
    broken.mockRestore()
    expectError(response, 'internal')
    expect(JSON.stringify(response.body)).not.toContain('22P02')
    const line = logs.find(({ err }) => err !== undefined)
    expect(line).toMatchObject({
      requestId: response.headers['x-request-id'],
      err: { type: 'QueryFailedError', code: '22P02' },
    })
    expect(JSON.stringify(logs)).not.toContain('secret')
  })
})
