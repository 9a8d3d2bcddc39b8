/** Entry of the start command: brings the database to the newest schema and fills it. Safe to run again. */
import { explain } from '../errors'
import { Catalogue } from '../features/exercises/catalogue'
import { createDataSource } from './data-source'
import { seedCatalogue } from './seed-catalogue'
import { seedDemo } from './seed-demo'

const tell = (line: string) => process.stdout.write(`${line}\n`)

async function main(): Promise<void> {
  const url = process.env.DATABASE_URL
  if (url === undefined || url === '') throw new Error('Set DATABASE_URL.')
  const dataSource = await createDataSource({ url, pool: 2 }).initialize()
  try {
    await dataSource.runMigrations({ transaction: 'each' })
    const now = new Date()
    const published = await seedCatalogue(dataSource, now)
    if (published > 0) tell(`Published ${published} exercises.`)
    if (process.env.PINTLE_DEMO !== 'true') return
    const demo = await seedDemo({ dataSource, catalogue: new Catalogue(dataSource) }, now)
    if (demo.fresh) tell(`Made the demo: ${demo.sessions} sessions, ${demo.swaps} swaps.`)
  } finally {
    await dataSource.destroy()
  }
}

main().catch((error: unknown) => {
  process.stderr.write(`The database could not be prepared: ${explain(error)}\n`)
  process.exit(1)
})
