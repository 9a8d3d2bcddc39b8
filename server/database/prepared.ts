import type { Pool, PoolClient } from 'pg'
import { QueryFailedError, type EntityManager } from 'typeorm'
import type { PostgresDriver } from 'typeorm/driver/postgres/PostgresDriver.js'

/**
 * Runs a statement that PostgreSQL parses and plans once per connection instead of at every call; worth it for a large
 * one that many requests run. `name` stands for the text: give every text its own. Within a transaction it runs in that.
 * A connection pooler in front of the database must know prepared statements (pgbouncer does since 1.21).
 */
export async function queryPrepared<Row>(
  manager: EntityManager,
  name: string,
  text: string,
  values: unknown[],
): Promise<Row[]> {
  try {
    const client = (await manager.queryRunner?.connect()) as PoolClient | undefined
    const { master } = manager.dataSource.driver as PostgresDriver
    const { rows } = await (client ?? (master as Pool)).query({ name, text, values })
    return rows as Row[]
  } catch (error) {
    // Wrapped as TypeORM does it, so that logs keep the code and drop the values.
    throw error instanceof Error ? new QueryFailedError(text, values, error) : error
  }
}
