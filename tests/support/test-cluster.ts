import { execFileSync } from 'node:child_process'

/** The PostgreSQL the tests run on: TEST_DATABASE_URL when set, else a private cluster that is started on first use. */
export function testClusterUrl(): string {
  const given = process.env.TEST_DATABASE_URL
  if (given !== undefined && given !== '') return given
  return execFileSync('sh', ['server/scripts/postgres.sh', 'test', String(process.pid)], {
    encoding: 'utf8',
    stdio: ['ignore', 'pipe', 'inherit'],
  }).trim()
}
