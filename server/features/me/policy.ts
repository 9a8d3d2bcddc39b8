import { AppError } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { hasRole } from '../people/policy'

/** Only athletes have a body profile and a care team. */
export function requireAthleteRole(actor: Actor): void {
  if (!hasRole(actor, 'athlete')) throw new AppError('forbidden', 'Only athletes have this.')
}
