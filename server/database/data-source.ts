import 'reflect-metadata'
import { DataSource } from 'typeorm'
import { entities } from './entities'
import { migrations } from './migrations/index'

/** A data source that is not connected yet: call `initialize()`, and `destroy()` at the end. */
export function createDataSource({ url, pool = 10 }: { url: string; pool?: number }): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    entities,
    migrations,
    migrationsTableName: 'migrations',
    synchronize: false,
    logging: false,
    // gen_random_uuid() is built into PostgreSQL since 13, so no extension is installed.
    uuidExtension: 'pgcrypto',
    installExtensions: false,
    poolSize: pool,
    applicationName: 'pintle',
    extra: { statement_timeout: 15_000, connectionTimeoutMillis: 10_000 },
  })
}
