import * as athletes from './athlete'
import * as audit from './audit'
import * as auth from './auth'
import type { Endpoint } from './endpoint'
import * as exercises from './exercise'
import * as flags from './flag'
import * as me from './me'
import * as places from './place'
import * as sessions from './session'
import * as soreJoints from './sore-joint'
import * as swaps from './swap'

const isEndpoint = (value: unknown): value is Endpoint =>
  typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'access' in value

/** Every endpoint of the API by feature and name; routes, OpenAPI and the endpoint tests walk over it. */
export const ENDPOINTS: ReadonlyArray<{ feature: string; name: string; endpoint: Endpoint }> = Object.entries({
  auth,
  me,
  athletes,
  places,
  exercises,
  sessions,
  soreJoints,
  swaps,
  flags,
  audit,
}).flatMap(([feature, module]) =>
  Object.entries(module as Record<string, unknown>)
    .filter((entry): entry is [string, Endpoint] => isEndpoint(entry[1]))
    .map(([name, endpoint]) => ({ feature, name, endpoint })),
)
