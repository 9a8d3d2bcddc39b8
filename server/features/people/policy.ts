import type { Role } from '#shared/contract/me'
import type { Actor } from '../../middleware/scope'

export const hasRole = (actor: Actor, role: Role): boolean =>
  actor.memberships.some((membership) => membership.role === role)

/** Clubs in which the actor holds a role. */
export const clubsAs = (actor: Actor, role: Role): string[] =>
  actor.memberships.filter((membership) => membership.role === role).map((membership) => membership.clubId)

/** Every club the actor belongs to, once. */
export const clubsOf = (actor: Actor): string[] => [
  ...new Set(actor.memberships.map((membership) => membership.clubId)),
]
