/**
 * Prints the statements that would bring DATABASE_URL to what the entities say: the raw material of a migration.
 * Read every line before it becomes one.
 */
import { createDataSource } from '../database/data-source'

const url = process.env.DATABASE_URL
if (url === undefined) throw new Error('Set DATABASE_URL to a migrated database.')
const dataSource = await createDataSource({ url }).initialize()
const { upQueries, downQueries } = await dataSource.driver.createSchemaBuilder().log()
for (const { query } of upQueries) console.log(`    await runner.query(\`${query}\`)`)
console.log('// down')
for (const { query } of downQueries.toReversed()) console.log(`    await runner.query(\`${query}\`)`)
await dataSource.destroy()
