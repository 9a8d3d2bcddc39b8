import type { z } from 'zod'
import { AppError } from '../errors'
import { findUnstorable } from '../middleware/validate'

/** The sort values of the cursor, or null without one. Throws `invalid_request` for one that this list did not hand out. */
export function decodeCursor<Key extends Array<string | number>>(
  cursor: string | undefined,
  key: z.ZodType<Key>,
): Key | null {
  if (cursor === undefined) return null
  try {
    const parsed = key.safeParse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')))
    // Text in a cursor reaches a query like any other text that was sent.
    if (parsed.success && findUnstorable(parsed.data) === null) return parsed.data
  } catch {
    // Falls through to the one answer for every broken cursor.
  }
  throw new AppError('invalid_request', 'This place in the list is not known.', [
    { path: 'cursor', message: 'Start from the first page again.' },
  ])
}

/**
 * Cuts what was found to a page. Ask the database for `limit + 1` rows: the one too many tells that there is a next page.
 * `key` gives the sort values of a row, which the cursor carries opaquely.
 */
export function toPage<Row>(
  found: readonly Row[],
  limit: number,
  key: (row: Row) => Array<string | number>,
): { rows: Row[]; nextCursor: string | null } {
  const rows = found.slice(0, limit)
  const last = rows.at(-1)
  const more = found.length > limit && last !== undefined
  return { rows, nextCursor: more ? Buffer.from(JSON.stringify(key(last))).toString('base64url') : null }
}
