import type { EntityManager } from 'typeorm'
import { notFound } from '../../errors'
import type { Actor } from '../../middleware/scope'

/** An athlete whom the actor may see, and in which capacity. */
export interface AthleteAccess {
  athleteId: string
  name: string
  /** It is the actor. */
  self: boolean
  /** The actor coaches them, or is their physio, in a club both belong to, and their consent stands. */
  coach: boolean
  physio: boolean
}

/** SQL for the capacities in which `actor` looks after `athlete` (both SQL expressions) while consent stands. */
export const carerRoles = (athlete: string, actor: string): string => `
            array(
              select distinct carer.role
                from consents c
                join memberships carer on carer.user_id = c.carer_id and carer.role in ('coach', 'physio')
                join memberships trained
                  on trained.user_id = c.athlete_id and trained.club_id = carer.club_id and trained.role = 'athlete'
               where c.athlete_id = ${athlete} and c.carer_id = ${actor} and c.revoked_at is null
            )`

/**
 * The one gate to another person's data: the athlete themselves, or a coach or physio of one of their clubs while
 * consent stands. For everyone else the athlete is simply not found. One query.
 */
export async function requireAthlete(manager: EntityManager, actor: Actor, athleteId: string): Promise<AthleteAccess> {
  const rows: Array<{ name: string; roles: string[] }> = await manager.query(
    `select u.name, ${carerRoles('u.id', '$2')} as roles
       from users u
      where u.id = $1
        and exists (select 1 from memberships m where m.user_id = u.id and m.role = 'athlete')`,
    [athleteId, actor.userId],
  )
  const row = rows[0]
  const self = actor.userId === athleteId
  if (row === undefined || (!self && row.roles.length === 0)) throw notFound('That athlete')
  return { athleteId, name: row.name, self, coach: row.roles.includes('coach'), physio: row.roles.includes('physio') }
}
