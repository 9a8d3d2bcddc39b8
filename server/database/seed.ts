/** Entry of the start command: brings the database to the newest schema and fills it. Safe to run again. */
import { createDataSource } from './data-source'

async function main(): Promise<void> {
  const url = process.env.DATABASE_URL
  if (url === undefined || url === '') throw new Error('Set DATABASE_URL.')
  const dataSource = await createDataSource({ url, pool: 2 }).initialize()
  try {
    await dataSource.runMigrations({ transaction: 'each' })
  } finally {
    await dataSource.destroy()
  }
}

main().catch((error: unknown) => {
  process.stderr.write(`The database could not be prepared: ${error instanceof Error ? error.message : String(error)}\n`)
  process.exit(1)
})
