import type { ErrorBody } from '#shared/contract/common'
import type { ErrorCode } from '#shared/contract/error-codes'

/** `unreachable`: no answer came at all. `unreadable`: what came is not the API’s. Both happen on this side of the wire. */
export type ClientErrorCode = ErrorCode | 'unreachable' | 'unreadable'

/** The one error the API client throws. Branch on `code`; `message` is for people. */
export class ApiError extends Error {
  override readonly name = 'ApiError'
  constructor(
    readonly code: ClientErrorCode,
    message: string,
    readonly fields: ErrorBody['error']['fields'] = [],
    /** Names the request in the server’s log, for whoever helps. */
    readonly requestId: string | null = null,
  ) {
    super(message)
  }
}

export const isApiError = (error: unknown, ...codes: ClientErrorCode[]): error is ApiError =>
  error instanceof ApiError && (codes.length === 0 || codes.includes(error.code))

/** The API’s own sentence where there is one. */
export const messageOf = (error: unknown, otherwise: string): string =>
  error instanceof ApiError ? error.message : otherwise
