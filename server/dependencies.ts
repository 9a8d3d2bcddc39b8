import type { Logger } from 'pino'
import type { DataSource } from 'typeorm'
import { Background } from './background'
import { createDataSource } from './database/data-source'
import type { Env } from './env'
import { Catalogue } from './features/exercises/catalogue'
import { createLogger } from './logger'
import { createMailer, type Mailer } from './mail/mailer'

/** The server's only clock; tests pass their own. */
export interface Clock {
  now(): Date
}

/** Everything the app needs from outside, passed down and never imported. */
export interface Dependencies {
  env: Env
  dataSource: DataSource
  mailer: Mailer
  clock: Clock
  logger: Logger
  /** Work that goes on after the answer was sent; awaited at shutdown. */
  background: Background
  /** The published exercises and the active rules. */
  catalogue: Catalogue
}

export const systemClock: Clock = { now: () => new Date() }

/** Connects to the outside world as the environment says. The caller destroys `dataSource`. */
export async function createDependencies(env: Env, given: Partial<Dependencies> = {}): Promise<Dependencies> {
  const logger = given.logger ?? createLogger(env)
  const dataSource = given.dataSource ?? createDataSource({ url: env.DATABASE_URL, pool: env.DATABASE_POOL })
  if (!dataSource.isInitialized) await dataSource.initialize()
  return {
    env,
    dataSource,
    logger,
    mailer: given.mailer ?? createMailer(env),
    clock: given.clock ?? systemClock,
    background: given.background ?? new Background(logger),
    catalogue: given.catalogue ?? new Catalogue(dataSource),
  }
}
