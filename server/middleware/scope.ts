import type { Response } from 'express'
import type { Logger } from 'pino'
import type { Role } from '#shared/contract/me'

/** Who is asking. */
export interface Actor {
  userId: string
  name: string
  memberships: ReadonlyArray<{ clubId: string; role: Role }>
}

/** What the app gives every API request beside Express' own request and response. */
export interface RequestScope {
  requestId: string
  logger: Logger
  /** Resolves to the signed-in person or throws `not_signed_in` or `session_expired`. */
  loadActor(): Promise<Actor>
  /** Outside production every answer is compared with the contract. */
  checkAnswers: boolean
}

const KEY = 'pintleScope'

export const setScope = (response: Response, scope: RequestScope): void => {
  response.locals[KEY] = scope
}

export const getScope = (response: Response): RequestScope => {
  const scope = response.locals[KEY] as RequestScope | undefined
  if (scope === undefined) throw new Error('The request has no scope: mount API routers below the scope middleware.')
  return scope
}
