import { fork, type ChildProcess } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import { fileURLToPath } from 'node:url'
import { seedCatalogue } from '#server/database/seed-catalogue'
import { seedDemo } from '#server/database/seed-demo'
import { createDataSource } from '#server/database/data-source'
import { Catalogue } from '#server/features/exercises/catalogue'
import { administer, databaseUrl } from '#tests/support/database'

/** A database with the catalogue and the demo, made for one bench and dropped after it. */
export async function withSeededDatabase<T>(adminUrl: string, work: (url: string) => Promise<T>): Promise<T> {
  const name = `pintle_bench_${randomBytes(4).toString('hex')}`
  await administer(adminUrl, `create database "${name}"`)
  const url = databaseUrl(adminUrl, name)
  try {
    const dataSource = await createDataSource({ url, pool: 2 }).initialize()
    const now = new Date()
    await dataSource.runMigrations({ transaction: 'each' })
    await seedCatalogue(dataSource, now)
    await seedDemo({ dataSource, catalogue: new Catalogue(dataSource) }, now)
    await dataSource.query('analyze')
    await dataSource.destroy()
    return await work(url)
  } finally {
    await administer(adminUrl, `drop database if exists "${name}" with (force)`)
  }
}

const answer = <T>(child: ChildProcess): Promise<T> =>
  new Promise((resolve, reject) => {
    child.once('message', (message) => resolve(message as T))
    child.once('exit', (code) => reject(new Error(`The bench server stopped with ${code}.`)))
  })

/** Runs the production app, with the bare endpoint beside it, on a database and hands over its address. */
export async function withServer<T>(databaseUrl: string, work: (url: string) => Promise<T>): Promise<T> {
  const child = fork(fileURLToPath(new URL('./server.ts', import.meta.url)), {
    execArgv: ['--import', 'tsx'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      DATABASE_URL: databaseUrl,
      ACCESS_TOKEN_SECRET: randomBytes(48).toString('base64url'),
      SMTP_URL: 'smtp://127.0.0.1:1',
      PINTLE_DEMO: 'true',
      LOG_LEVEL: 'error',
      RATE_LIMIT_SCALE: '1000',
    },
  })
  try {
    const { port } = await answer<{ port: number }>(child)
    return await work(`http://127.0.0.1:${port}`)
  } finally {
    child.removeAllListeners('exit')
    child.kill()
  }
}

/** Signs in over the API and gives the Cookie header to send. */
export async function signInTo(url: string, account: { email: string; password: string }): Promise<string> {
  const response = await fetch(`${url}/api/auth/sign-in`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', Origin: url },
    body: JSON.stringify(account),
  })
  if (!response.ok) throw new Error(`Sign-in answered ${response.status}: ${await response.text()}`)
  return response.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ')
}

/** A GET (or POST with a body) that must succeed. */
export async function call<T>(url: string, cookie: string, path: string, body?: unknown): Promise<T> {
  const response = await fetch(url + path, {
    method: body === undefined ? 'GET' : 'POST',
    headers: { Cookie: cookie, Origin: url, ...(body === undefined ? {} : { 'Content-Type': 'application/json' }) },
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
  })
  if (!response.ok) throw new Error(`${path} answered ${response.status}: ${await response.text()}`)
  return (await response.json()) as T
}
