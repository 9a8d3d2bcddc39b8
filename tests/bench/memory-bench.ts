import { readFileSync } from 'node:fs'
import { createDataSource } from '#server/database/data-source'
import type { Me } from '#shared/contract/me'
import type { Today } from '#shared/contract/session'
import { startBuiltServer } from '#tests/support/built-server'
import { call, signInTo } from './bench-server'
import type { BenchResult } from './result'

const EXERCISES = 20_000

/** Fills the catalogue to 20 000 by publishing every exercise again under other names. */
export async function growCatalogue(url: string): Promise<void> {
  const dataSource = await createDataSource({ url, pool: 1 }).initialize()
  try {
    await dataSource.transaction(async (manager) => {
      const rows: Array<{ table_name: string; column_name: string }> = await manager.query(
        `select table_name, column_name from information_schema.columns
          where table_schema = 'public' and table_name in ('exercises', 'exercise_versions') order by ordinal_position`,
      )
      const columns = (table: string, except: string[]) =>
        rows
          .filter((row) => row.table_name === table && !except.includes(row.column_name))
          .map((row) => row.column_name)
      const exercise = columns('exercises', ['id', 'slug'])
      const version = columns('exercise_versions', ['id', 'exercise_id', 'document'])
      const [counted]: Array<{ count: number }> = await manager.query('select count(*)::int as count from exercises')
      const copies = Math.ceil(EXERCISES / (counted?.count ?? 1)) - 1
      await manager.query(`create temporary table copies on commit drop as
        select e.id as old_id, gen_random_uuid() as new_id, e.slug || '-copy-' || n as slug
          from exercises e cross join generate_series(1, ${copies}) n`)
      await manager.query(`insert into exercises (id, slug${exercise.map((name) => `, ${name}`).join('')})
        select c.new_id, c.slug${exercise.map((name) => `, e.${name}`).join('')}
          from copies c join exercises e on e.id = c.old_id`)
      await manager.query(`insert into exercise_versions (id, exercise_id, document${version.map((name) => `, ${name}`).join('')})
        select gen_random_uuid(), c.new_id, v.document || jsonb_build_object('slug', c.slug)${version.map((name) => `, v.${name}`).join('')}
          from copies c join exercise_versions v on v.exercise_id = c.old_id`)
    })
  } finally {
    await dataSource.destroy()
  }
}

/** Resident memory of the built server, as the system counts it, once it has ranked from the grown catalogue a few times. */
export async function benchMemory(
  databaseUrl: string,
  account: { email: string; password: string },
  day: string,
): Promise<BenchResult> {
  const server = await startBuiltServer(databaseUrl)
  try {
    const cookie = await signInTo(server.url, account)
    const me = await call<Me>(server.url, cookie, '/api/me')
    const today = await call<Today>(server.url, cookie, `/api/athletes/${me.id}/today?day=${day}`)
    for (const slot of today.session?.slots ?? []) {
      for (const maxCoordination of [100, 80, 60, 40]) {
        await call(server.url, cookie, `/api/slots/${slot.id}/swaps?maxCoordination=${maxCoordination}`)
      }
    }
    return {
      name: `server memory with ${EXERCISES} exercises, MB`,
      ratio: residentBytes(server.process.pid) / 1e6,
      atMost: 300,
    }
  } finally {
    await server.stop()
  }
}

function residentBytes(pid: number | undefined): number {
  const status = readFileSync(`/proc/${pid}/status`, 'utf8')
  const kibibytes = Number(/^VmRSS:\s+(\d+) kB$/m.exec(status)?.[1])
  return kibibytes * 1024
}
