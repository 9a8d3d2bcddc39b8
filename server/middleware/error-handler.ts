import type { ErrorRequestHandler, RequestHandler, Response } from 'express'
import type { Logger } from 'pino'
import { QueryFailedError } from 'typeorm'
import type { ErrorBody } from '#shared/contract/common'
import { ENDPOINTS } from '#shared/contract/index'
import { MechanicsError } from '#shared/mechanics/errors'
import { AppError } from '../errors'

const PARSER_ERRORS: Record<string, () => AppError> = {
  'entity.parse.failed': () => new AppError('malformed_json', 'The body is not valid JSON.'),
  'entity.too.large': () => new AppError('body_too_large', 'That is too much at once.'),
  'charset.unsupported': () => new AppError('unsupported_media_type', 'Send JSON in UTF-8.'),
  'encoding.unsupported': () => new AppError('unsupported_media_type', 'That content encoding is not read here.'),
}

const UNIQUE_VIOLATION = '23505'
/** Serialisation failure and deadlock: the same request may well succeed when repeated. */
const RETRYABLE = new Set(['40001', '40P01'])
/** The server is shutting down, starting up, or out of connections. */
const UNAVAILABLE = new Set([
  '57P01',
  '57P02',
  '57P03',
  '53300',
  '08006',
  '08003',
  '08001',
  'ECONNREFUSED',
  'ECONNRESET',
])

/** The answer for anything that was thrown, or null for what nobody expected. */
export function toAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error
  if (error instanceof MechanicsError) {
    return new AppError('mechanics_invalid', error.message, [{ path: error.field, message: error.message }])
  }
  if (error instanceof QueryFailedError) {
    const code = (error.driverError as { code?: string }).code ?? ''
    if (code === UNIQUE_VIOLATION || RETRYABLE.has(code)) {
      return new AppError('conflict', 'Somebody changed this at the same time. Try again.')
    }
  }
  const { type, status, code } = error as { type?: string; status?: number; code?: string }
  if (code !== undefined && UNAVAILABLE.has(code))
    return new AppError('unavailable', 'Not reachable just now. Try again soon.')
  const parserError = type === undefined ? undefined : PARSER_ERRORS[type]
  if (parserError !== undefined) return parserError()
  if (status === 415) return new AppError('unsupported_media_type', 'Send JSON.')
  if (status === 413) return new AppError('body_too_large', 'That is too much at once.')
  if (status !== undefined && status >= 400 && status < 500) {
    return new AppError('invalid_request', 'The request could not be read.')
  }
  return null
}

export function sendError(response: Response, error: AppError): void {
  const body: ErrorBody = {
    error: {
      code: error.code,
      message: error.message,
      fields: [...error.fields],
      requestId: String(response.getHeader('x-request-id') ?? ''),
    },
  }
  response.status(error.status).json(body)
}

/** The last stop of every failed request. */
export function errorHandler(logger: Logger): ErrorRequestHandler {
  return (error: unknown, _request, response, next) => {
    const known = toAppError(error)
    if (known === null || known.status >= 500) {
      logger.error({ err: error, requestId: response.getHeader('x-request-id') }, 'request failed')
    }
    // Once the head is out the only honest thing left is to cut the connection, which Express does.
    if (response.headersSent) return next(error)
    sendError(response, known ?? new AppError('internal', 'Something went wrong here. Try again.'))
  }
}

/** For paths of the contract that were called with a method they do not have. */
export function methodNotAllowed(): Array<{ path: string; handler: RequestHandler }> {
  const byPath = new Map<string, Set<string>>()
  for (const { endpoint } of ENDPOINTS) {
    byPath.set(endpoint.path, (byPath.get(endpoint.path) ?? new Set<string>()).add(endpoint.method))
  }
  // A path without parameters also matches its neighbour with one, so it must come first.
  const inOrder = [...byPath].toSorted(([a], [b]) => a.split(':').length - b.split(':').length)
  return inOrder.map(([path, methods]) => ({
    path,
    handler: (_request, response) => {
      response.setHeader('Allow', [...methods].join(', '))
      throw new AppError('method_not_allowed', `This can be called with ${[...methods].join(', ')} only.`)
    },
  }))
}
