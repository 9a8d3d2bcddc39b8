import type { DataSource, QueryRunner } from 'typeorm'

/** How many statements the database is sent while `work` runs. */
export async function countQueries(dataSource: DataSource, work: () => PromiseLike<unknown>): Promise<number> {
  let count = 0
  const original = dataSource.createQueryRunner.bind(dataSource)
  dataSource.createQueryRunner = (mode) => {
    const runner: QueryRunner = original(mode)
    const query = runner.query.bind(runner) as (...args: unknown[]) => Promise<unknown>
    runner.query = ((...args: unknown[]) => {
      count += 1
      return query(...args)
    }) as QueryRunner['query']
    return runner
  }
  try {
    await work()
  } finally {
    dataSource.createQueryRunner = original
  }
  return count
}
