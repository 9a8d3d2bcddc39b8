import type { RequestHandler } from 'express'
import type { Logger } from 'pino'
import { pinoHttp } from 'pino-http'

/**
 * One line per request: method, the route's pattern, status, time. No body, query, header, cookie or address; not even
 * the path as called, since it names people by their ids.
 */
export function logRequests(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: (_request, response) => String(response.getHeader('X-Request-Id')),
    quietReqLogger: true,
    customAttributeKeys: { reqId: 'requestId' },
    serializers: {
      req: (request: { method: string }) => ({ method: request.method }),
      res: (response: { statusCode: number | null }) => ({ status: response.statusCode }),
    },
    customProps: (request) => ({ route: (request as { route?: { path?: unknown } }).route?.path ?? 'unmatched' }),
    customLogLevel: (_request, response, error) => {
      if (error !== undefined || response.statusCode >= 500) return 'error'
      return response.statusCode >= 400 ? 'info' : 'debug'
    },
    customErrorMessage: () => 'request failed',
    customSuccessMessage: () => 'request',
  })
}
