import pg from 'pg'

type Query = (...args: unknown[]) => unknown

/** How many statements this process sends to the database while `work` runs, on whatever connection. */
export async function countQueries(work: () => PromiseLike<unknown>): Promise<number> {
  const prototype = pg.Client.prototype as unknown as { query: Query }
  const original = prototype.query
  let count = 0
  prototype.query = function counted(this: pg.Client, ...args: unknown[]) {
    count += 1
    return original.apply(this, args)
  }
  try {
    await work()
  } finally {
    prototype.query = original
  }
  return count
}
