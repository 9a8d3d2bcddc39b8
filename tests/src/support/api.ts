import { vi } from 'vitest'
import type { ErrorCode } from '#shared/contract/error-codes'

export interface Sent {
  method: string
  path: string
  query: Record<string, string>
  body: unknown
}
type Answer = unknown
type Handler = (sent: Sent) => Answer | Promise<Answer>

const json = (status: number, body: unknown) =>
  new Response(body === undefined ? null : JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/json' },
  })

/** What a handler returns to refuse a request in the API’s one error shape. */
export class Refusal {
  constructor(
    readonly status: number,
    readonly code: ErrorCode,
    readonly message = 'Refused.',
    readonly fields: Array<{ path: string; message: string }> = [],
  ) {}
}

/**
 * Stands in for the network: answers by “METHOD /path” and keeps what was sent. A request that no test expected fails
 * as the network would, so that it cannot pass unseen.
 */
export function fakeApi(handlers: Record<string, Handler | Answer>) {
  const sent: Sent[] = []
  const fetch = vi.fn(async (input: string, init: RequestInit = {}) => {
    const url = new URL(input, 'http://pintle.test')
    const request: Sent = {
      method: init.method ?? 'GET',
      path: url.pathname,
      query: Object.fromEntries(url.searchParams),
      body: typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : undefined,
    }
    sent.push(request)
    const key = `${request.method} ${request.path}`
    if (!(key in handlers)) throw new TypeError(`Nothing answers ${key}`)
    const handler = handlers[key]
    const answer: Answer = typeof handler === 'function' ? await (handler as Handler)(request) : handler
    if (answer instanceof Refusal) {
      const { code, message, fields } = answer
      return json(answer.status, { error: { code, message, fields, requestId: 'request-1' } })
    }
    return answer === undefined ? json(204, undefined) : json(200, answer)
  })
  vi.stubGlobal('fetch', fetch)
  return { sent, to: (key: string) => sent.filter(({ method, path }) => `${method} ${path}` === key) }
}
