import type { z } from 'zod'
import { AppError } from '../errors'

/** An opaque place in a list: the sort key of the last row that was sent. */
export const encodeCursor = (key: readonly unknown[]): string => Buffer.from(JSON.stringify(key)).toString('base64url')

/** Reads a cursor back. Throws `invalid_request` for anything this server did not make for this list. */
export function decodeCursor<T extends z.ZodType>(cursor: string | undefined, schema: T): z.output<T> | null {
  if (cursor === undefined) return null
  const parsed = schema.safeParse(parseJson(Buffer.from(cursor, 'base64url').toString('utf8')))
  if (parsed.success) return parsed.data
  throw new AppError('invalid_request', 'Some of what was sent cannot be used.', [
    { path: 'cursor', message: 'This cursor does not belong to this list. Start again without it.' },
  ])
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}

/** Cuts the one row too many that a page query asks for, and says where the next page starts. */
export function toPage<Row>(
  rows: readonly Row[],
  limit: number,
  key: (row: Row) => readonly unknown[],
): { rows: Row[]; nextCursor: string | null } {
  const kept = rows.slice(0, limit)
  const last = kept.at(-1)
  return { rows: kept, nextCursor: rows.length > limit && last !== undefined ? encodeCursor(key(last)) : null }
}
