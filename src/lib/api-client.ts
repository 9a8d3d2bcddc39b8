import type { Endpoint, ResponseOf, Sending } from '#shared/contract/endpoint'
import { ApiError, isApiError } from './api-error'

type Required<T> = { [K in keyof T as T[K] extends undefined ? never : K]: T[K] }
type WithoutUndefined<T> = T extends unknown ? Required<T> : never
/** What `call` needs for an endpoint: `params`, `query` and `body`, each only where the endpoint has one. */
export type Input<E> = WithoutUndefined<Sending<E>>
type InputArgument<E> = keyof Input<E> extends never ? [input?: undefined] : [input: Input<E>]

interface Parts {
  params?: Record<string, unknown>
  query?: Record<string, unknown>
  body?: unknown
}

/** Path with its `:names` filled in and the query behind it; query values that are undefined are left out. */
export function buildUrl(path: string, { params = {}, query = {} }: Parts): string {
  const filled = path.replace(/:([A-Za-z]+)/g, (_, name: string) => {
    const value = params[name]
    if (value === undefined || value === null) throw new TypeError(`The path ${path} needs ${name}.`)
    return encodeURIComponent(String(value))
  })
  const search = new URLSearchParams()
  for (const [name, value] of Object.entries(query))
    if (value !== undefined && value !== null) search.set(name, String(value))
  const text = search.toString()
  return text === '' ? filled : `${filled}?${text}`
}

async function failure(response: Response): Promise<ApiError> {
  try {
    const { error } = (await response.json()) as {
      error: { code: ApiError['code']; message: string; fields: ApiError['fields']; requestId: string }
    }
    return new ApiError(error.code, error.message, error.fields, error.requestId)
  } catch {
    return new ApiError('unreadable', 'The answer could not be read. Try again in a moment.')
  }
}

async function send(method: string, url: string, body: unknown, signal?: AbortSignal): Promise<unknown> {
  let response: Response
  try {
    response = await fetch(url, {
      method,
      credentials: 'same-origin',
      headers:
        body === undefined
          ? { accept: 'application/json' }
          : { accept: 'application/json', 'content-type': 'application/json' },
      body: body === undefined ? undefined : JSON.stringify(body),
      signal,
    })
  } catch (error) {
    if (signal?.aborted) throw error
    throw new ApiError('unreachable', 'Pintle cannot be reached. Check your connection; nothing you typed is lost.')
  }
  if (!response.ok) throw await failure(response)
  if (response.status === 204 || response.headers.get('content-length') === '0') return undefined
  const text = await response.text()
  if (text === '') return undefined
  try {
    return JSON.parse(text)
  } catch {
    throw new ApiError('unreadable', 'The answer could not be read. Try again in a moment.')
  }
}

let refreshing: Promise<void> | null = null

/**
 * Renews the access cookie once for all requests that wait for it. The lock keeps two tabs from spending the same
 * refresh token, which the server would take for theft.
 */
function renew(): Promise<void> {
  const request = () => send('POST', '/api/auth/refresh', undefined).then(() => undefined)
  refreshing ??= (navigator.locks ? navigator.locks.request('pintle.refresh', request) : request()).finally(() => {
    refreshing = null
  })
  return refreshing
}

/**
 * Calls an endpoint of the contract. A lapsed session is renewed silently and the call repeated once.
 * @throws {ApiError} for every answer but success, and when no answer comes.
 */
export async function call<E extends Endpoint>(
  endpoint: E,
  ...args: [...InputArgument<E>, signal?: AbortSignal]
): Promise<ResponseOf<E>> {
  const [parts = {}, signal] = args as unknown as [Parts?, AbortSignal?]
  const url = buildUrl(endpoint.path, parts)
  const attempt = () => send(endpoint.method, url, parts.body, signal) as Promise<ResponseOf<E>>
  try {
    return await attempt()
  } catch (error) {
    if (endpoint.access === 'public' || !isApiError(error, 'session_expired', 'not_signed_in')) throw error
    await renew().catch((cause: unknown) => {
      throw isApiError(cause, 'unreachable', 'unreadable') ? cause : error
    })
    return attempt()
  }
}
