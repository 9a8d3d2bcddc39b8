import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { parseEnv, publicUrl } from '#server/env'

const STRONG = 'q7Zt0bX4mWc9Lr2KfV6sNy1PdHj8GaEu'
const given = (change: Record<string, string | undefined> = {}) => ({
  DATABASE_URL: 'postgres://pintle@127.0.0.1/pintle',
  ACCESS_TOKEN_SECRET: STRONG,
  SMTP_URL: 'local',
  ...change,
})

describe('the environment', () => {
  it('needs a database, a secret and a way to send mail, and has defaults for the rest', () => {
    expect(parseEnv(given())).toMatchObject({
      NODE_ENV: 'development',
      HOST: '127.0.0.1',
      PORT: 4380,
      PINTLE_DEMO: false,
    })
    expect(() => parseEnv({})).toThrow(/DATABASE_URL[\s\S]*ACCESS_TOKEN_SECRET[\s\S]*SMTP_URL/)
  })

  it.each([
    { PORT: 'http' },
    { PORT: '0' },
    { PUBLIC_URL: 'pintle.example.org' },
    { PUBLIC_URL: 'ftp://pintle.example.org' },
    { DATABASE_URL: 'mysql://x/y' },
    { SMTP_URL: 'http://mail.example.org' },
    { PINTLE_DEMO: 'yes' },
    { RATE_LIMIT_SCALE: '0' },
    { LOG_LEVEL: 'loud' },
  ])('is refused with %j', (change) => {
    expect(() => parseEnv(given(change))).toThrow(Object.keys(change)[0])
  })

  it.each([
    'too-short-for-production',
    'a'.repeat(64),
    'abababababababababababababababababababab',
    'change-me-change-me-change-me-0123456789',
    'an-example-that-somebody-copied-0123456789',
  ])('refuses the weak secret %s in production, and never repeats it', (secret) => {
    const parse = () => parseEnv(given({ NODE_ENV: 'production', ACCESS_TOKEN_SECRET: secret }))
    expect(parse).toThrow(/ACCESS_TOKEN_SECRET: too weak/)
    expect(parse).not.toThrow(secret)
    expect(parseEnv(given({ ACCESS_TOKEN_SECRET: secret })).ACCESS_TOKEN_SECRET).toBe(secret)
  })

  it('accepts a random secret in production', () => {
    expect(parseEnv(given({ NODE_ENV: 'production' })).ACCESS_TOKEN_SECRET).toBe(STRONG)
  })

  it('wants https in production, except on loopback', () => {
    const production = (url: string) => parseEnv(given({ NODE_ENV: 'production', PUBLIC_URL: url }))
    expect(() => production('http://pintle.example.org')).toThrow(/PUBLIC_URL/)
    expect(publicUrl(production('https://pintle.example.org/'))).toBe('https://pintle.example.org')
    expect(publicUrl(production('http://127.0.0.1:4380'))).toBe('http://127.0.0.1:4380')
  })

  it('takes an empty PUBLIC_URL for none', () => {
    expect(publicUrl(parseEnv(given({ PUBLIC_URL: '', PORT: '4999' })))).toBe('http://127.0.0.1:4999')
  })

  it('is described whole in .env.example, and nothing there is unknown', () => {
    const described = [...readFileSync('.env.example', 'utf8').matchAll(/^#?([A-Z_]+)=/gm)].map(([, name]) => name)
    const known = Object.keys(parseEnv(given({ PUBLIC_URL: 'http://127.0.0.1' })))
    expect([...new Set(described)].toSorted()).toEqual([...known, 'TEST_DATABASE_URL'].toSorted())
  })
})
