import type { Express } from 'express'
import { pino } from 'pino'
import supertest from 'supertest'
import { afterAll, beforeAll, inject } from 'vitest'
import { createApp } from '#server/app'
import { createDependencies, type Dependencies } from '#server/dependencies'
import { parseEnv, type Env } from '#server/env'
import { SignIn } from '#server/features/auth/entity'
import { signAccessToken } from '#server/features/auth/access-token'
import { serializeError } from '#server/logger'
import { TestClock } from './clock'
import { cloneDatabase, type TestDatabase } from './database'
import { Factories } from './factories'
import { MailBox } from './mail-box'

export interface TestApp {
  app: Express
  dependencies: Dependencies
  dataSource: Dependencies['dataSource']
  clock: TestClock
  mailBox: MailBox
  /** Every line the server logged, parsed. */
  logs: Array<Record<string, unknown>>
  make: Factories
  /** A client that keeps cookies and is signed in as nobody. */
  anonymous(): ReturnType<typeof supertest.agent>
  /** A client signed in as this person. */
  as(person: { id: string }): Promise<ReturnType<typeof supertest.agent>>
}

async function start(database: TestDatabase, overrides: Partial<Env>): Promise<TestApp> {
  const env = {
    ...parseEnv({
      NODE_ENV: 'test',
      DATABASE_URL: database.url,
      ACCESS_TOKEN_SECRET: 'only-for-tests-only-for-tests-only',
      SMTP_URL: 'smtp://127.0.0.1:1',
      RATE_LIMIT_SCALE: '1000',
      LOG_LEVEL: 'debug',
    }),
    ...overrides,
  }
  const logs: TestApp['logs'] = []
  const clock = new TestClock()
  const mailBox = new MailBox()
  const logger = pino(
    { level: env.LOG_LEVEL, base: null, serializers: { err: serializeError } },
    { write: (line: string) => logs.push(JSON.parse(line) as Record<string, unknown>) },
  )
  const dependencies = await createDependencies(env, {
    dataSource: database.dataSource,
    clock,
    mailer: mailBox,
    logger,
  })
  const app = createApp(dependencies)
  const anonymous = () => supertest.agent(app)
  return {
    app,
    dependencies,
    dataSource: dependencies.dataSource,
    clock,
    mailBox,
    logs,
    make: new Factories(dependencies.dataSource.manager, clock),
    anonymous,
    async as(person) {
      const now = clock.now()
      const endsAt = new Date(now.getTime() + 90 * 24 * 3600 * 1000)
      const signIn = await dependencies.dataSource.manager.save(SignIn, { userId: person.id, createdAt: now, endsAt })
      const token = signAccessToken(env, clock, { userId: person.id, signInId: signIn.id })
      return supertest.agent(app).set('Cookie', `pintle_access=${token}`)
    },
  }
}

/**
 * The app on its own database, for one test file: call it at the top of a file or a describe and use the getter
 * inside tests.
 */
export function testApp(overrides: Partial<Env> = {}): () => TestApp {
  let database: TestDatabase | undefined
  let started: TestApp | undefined
  beforeAll(async () => {
    database = await cloneDatabase(inject('adminUrl'), inject('templateDatabase'))
    started = await start(database, overrides)
  })
  afterAll(async () => {
    await started?.dependencies.background.settled()
    await database?.drop()
  })
  return () => {
    if (started === undefined) throw new Error('testApp() is ready inside tests and hooks only.')
    return started
  }
}
