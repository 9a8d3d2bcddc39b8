/**
 * `npm run bench`: measures speed as ratios within one run, on this machine, and ends with a table.
 * Exits non-zero when a figure is over its limit. Names on the command line run only those benches.
 */
import { DEMO_ACCOUNTS } from '../../seeds/demo/people'
import { growCatalogue, benchMemory } from './memory-bench'
import { benchEndpoint } from './endpoint-bench'
import { benchRanking } from './rank-bench'
import { withSeededDatabase, withServer } from './bench-server'
import { printTable, type BenchResult } from './result'

const adminUrl = process.env.TEST_DATABASE_URL
if (adminUrl === undefined) throw new Error('Set TEST_DATABASE_URL, or run npm run bench.')
const account = DEMO_ACCOUNTS.find(({ role }) => role === 'athlete')
if (account === undefined) throw new Error('The demo has no athlete.')
const day = new Date().toISOString().slice(0, 10)

const BENCHES: Record<string, () => Promise<BenchResult[]>> = {
  ranking: async () => benchRanking(),
  endpoint: () =>
    withSeededDatabase(adminUrl, (url) => withServer(url, (address) => benchEndpoint(address, account, day))),
  memory: () =>
    withSeededDatabase(adminUrl, async (url) => {
      await growCatalogue(url)
      return [await benchMemory(url, account, day)]
    }),
}

const wanted = process.argv.slice(2)
const results: BenchResult[] = []
for (const [name, bench] of Object.entries(BENCHES)) {
  if (wanted.length > 0 && !wanted.includes(name)) continue
  process.stdout.write(`${name} …\n`)
  results.push(...(await bench()))
}
process.exit(printTable(results) ? 0 : 1)
