import { ERROR_STATUS, type ErrorCode } from '#shared/contract/error-codes'

/** One offending input: its dotted path from the request's params, query or body, and what to do about it. */
export interface FieldError {
  path: string
  message: string
}

/** An answer the caller is meant to see. Everything else that is thrown becomes `internal` and is only logged. */
export class AppError extends Error {
  override readonly name = 'AppError'
  readonly status: number

  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly fields: readonly FieldError[] = [],
  ) {
    super(message)
    this.status = ERROR_STATUS[code]
  }
}

/** The answer for a row that is not there, or that the actor may not know of: both look alike. */
export const notFound = (what = 'That') => new AppError('not_found', `${what} was not found.`)

/** An error in words for a terminal. Node reports a refused connection as several errors under an empty message. */
export function explain(error: unknown): string {
  if (error instanceof AggregateError && error.errors.length > 0)
    return [...new Set(error.errors.map(explain))].join('; ')
  return error instanceof Error && error.message !== '' ? error.message : String(error)
}
