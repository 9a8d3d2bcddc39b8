import type { z } from 'zod'
import { AppError, type FieldError } from '../errors'

const MAX_DEPTH = 32
/** With the u flag a surrogate only matches when it stands alone. */

const UNSTORABLE = /[\u0000\ud800-\udfff]/u

/**
 * Finds the first text that PostgreSQL cannot store (NUL, half a surrogate pair) or that is nested absurdly deep.
 * Walks without recursion, since a small body can be nested deep enough to overflow the stack.
 */
export function findUnstorable(value: unknown): FieldError | null {
  const waiting: Array<{ value: unknown; path: string; depth: number }> = [{ value, path: '', depth: 0 }]
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    const { value: current, path, depth } = next
    if (typeof current === 'string' && UNSTORABLE.test(current)) {
      return { path, message: 'Contains characters that cannot be stored.' }
    }
    if (typeof current !== 'object' || current === null) continue
    if (depth >= MAX_DEPTH) return { path: path.slice(0, 200), message: 'Nested too deep.' }
    for (const [key, inner] of Object.entries(current)) {
      if (UNSTORABLE.test(key)) return { path, message: 'Has a field name that cannot be stored.' }
      waiting.push({ value: inner, path: path === '' ? key : `${path}.${key}`, depth: depth + 1 })
    }
  }
  return null
}

/** A field error per offending input. Unknown keys are named one by one, so that the caller finds the typing error. */
function fieldErrors(error: z.ZodError): FieldError[] {
  return error.issues.flatMap((issue) => {
    const path = issue.path.map(String)
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({ path: [...path, key].join('.'), message: 'This field is not known.' }))
    }
    return [{ path: path.join('.'), message: issue.message }]
  })
}

/** Parses one part of a request, or throws `invalid_request` with the offending fields. */
export function parsePart(schema: z.ZodType | undefined, value: unknown): unknown {
  const unstorable = findUnstorable(value)
  if (unstorable !== null) throw new AppError('invalid_request', 'Some of what was sent cannot be used.', [unstorable])
  if (schema === undefined) return undefined
  const parsed = schema.safeParse(value)
  if (parsed.success) return parsed.data
  throw new AppError('invalid_request', 'Some of what was sent cannot be used.', fieldErrors(parsed.error))
}
