import { isDeepStrictEqual } from 'node:util'
import type { Request, RequestHandler, Response, Router } from 'express'
import type { Endpoint, Received, ResponseOf } from '#shared/contract/endpoint'
import { getScope, type Actor } from './scope'
import { parsePart } from './validate'

/** Express' request and response, for the few handlers that read cookies or set headers. */
export interface HttpContext {
  request: Request
  response: Response
  requestId: string
}

/** An answer that was turned into JSON before, and is sent as those very bytes. */
export class Serialized {
  constructor(readonly json: Buffer) {}
}

type Answer<E> = ResponseOf<E> extends undefined ? void : ResponseOf<E> | Serialized
type Handler<E, Who> = (input: Received<E> & { actor: Who; context: HttpContext }) => Promise<Answer<E>> | Answer<E>

const route = (router: Router, endpoint: Endpoint, handlers: RequestHandler[]) => {
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete'
  router[method](endpoint.path, ...handlers)
}

/** What goes over the wire must be exactly what the contract says: nothing missing, nothing more. */
function checkAnswer(endpoint: Endpoint, answer: unknown): void {
  if (endpoint.response === undefined) {
    if (answer !== undefined)
      throw new Error(`${endpoint.method} ${endpoint.path} answers with a body, the contract with none`)
    return
  }
  const sent: unknown = JSON.parse(JSON.stringify(answer) ?? 'null')
  const parsed = endpoint.response.safeParse(sent)
  if (!parsed.success) {
    const fields = parsed.error.issues.map((issue) => `${issue.path.join('.')} (${issue.message})`)
    throw new Error(`${endpoint.method} ${endpoint.path} breaks its contract at ${fields.join(', ')}`)
  }
  if (!isDeepStrictEqual(JSON.parse(JSON.stringify(parsed.data)), sent)) {
    throw new Error(`${endpoint.method} ${endpoint.path} sends fields that its contract does not name`)
  }
}

async function run<E extends Endpoint, Who>(
  endpoint: E,
  handler: Handler<E, Who>,
  actor: Who,
  request: Request,
  response: Response,
): Promise<void> {
  const scope = getScope(response)
  const received = {
    params: parsePart(endpoint.params, request.params),
    query: parsePart(endpoint.query, request.query),
    body: parsePart(endpoint.body, request.body as unknown),
  } as Received<E>
  const context = { request, response, requestId: scope.requestId }
  const answer = await handler({ ...received, actor, context })
  if (scope.checkAnswers) {
    checkAnswer(endpoint, answer instanceof Serialized ? JSON.parse(answer.json.toString('utf8')) : answer)
  }
  response.status(endpoint.status ?? (endpoint.response === undefined ? 204 : 200))
  if (endpoint.response === undefined) response.end()
  else if (answer instanceof Serialized) response.type('json').send(answer.json)
  else response.json(answer)
}

/** Turns an endpoint for signed-in people into a route: who asks comes first, then what they sent, then the handler. */
export function mount<E extends Endpoint>(router: Router, endpoint: E, handler: Handler<E, Actor>): void {
  if (endpoint.access !== 'signedIn') throw new Error(`${endpoint.path} is public: use mountPublic`)
  route(router, endpoint, [
    async (request, response) => {
      await run(endpoint, handler, await getScope(response).loadActor(), request, response)
    },
  ])
}

/** Turns a public endpoint into a route; `before` holds its rate limits. */
export function mountPublic<E extends Endpoint>(
  router: Router,
  endpoint: E,
  before: RequestHandler[],
  handler: Handler<E, null>,
): void {
  if (endpoint.access !== 'public') throw new Error(`${endpoint.path} is for signed-in people: use mount`)
  route(router, endpoint, [...before, (request, response) => run(endpoint, handler, null, request, response)])
}
