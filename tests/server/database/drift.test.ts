import { describe, expect, it } from 'vitest'
import { testApp } from '#tests/support/test-app'

describe('migrations and entities', () => {
  const app = testApp()

  it('describe the same schema', async () => {
    const { upQueries } = await app().dataSource.driver.createSchemaBuilder().log()
    expect(upQueries.map(({ query }) => query)).toEqual([])
  })

  it('can be undone to the last table and done again', async () => {
    const { dataSource } = app()
    for (const _ of dataSource.migrations) await dataSource.undoLastMigration()
    const left: Array<{ tablename: string }> = await dataSource.query(
      `select tablename from pg_tables where schemaname = 'public' and tablename <> 'migrations'`,
    )
    expect(left).toEqual([])
    await dataSource.runMigrations()
    const { upQueries } = await dataSource.driver.createSchemaBuilder().log()
    expect(upQueries).toEqual([])
  })
})
