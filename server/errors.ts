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
