import type { EntityManager } from 'typeorm'
import type { Dose } from '#shared/contract/session'
import type { Actor } from '../../middleware/scope'
import { carerRoles } from '../people/access'

export interface SwapRow extends Dose {
  id: string
  slotId: string
  athleteId: string
  exerciseId: string
  slug: string
  name: string
  rank: number
  ruleSetVersion: number
  takenAt: Date
  undoneAt: Date | null
}

const SELECT = `
  select sw.id, sw.slot_id as "slotId", se.athlete_id as "athleteId", v.exercise_id as "exerciseId", e.slug, v.name,
         sw.sets, sw.repetitions, sw.unit, sw.rir, sw.load, sw.pieces, sw.rank,
         sw.rule_set_version as "ruleSetVersion", sw.taken_at as "takenAt", sw.undone_at as "undoneAt"
    from swaps sw
    join exercise_versions v on v.id = sw.exercise_version_id
    join exercises e on e.id = v.exercise_id
    join slots sl on sl.id = sw.slot_id
    join sessions se on se.id = sl.session_id`

export async function findSwap(manager: EntityManager, swapId: string): Promise<SwapRow | null> {
  const rows: SwapRow[] = await manager.query(`${SELECT} where sw.id = $1`, [swapId])
  return rows[0] ?? null
}

export const hasStandingSwap = async (manager: EntityManager, slotId: string): Promise<boolean> => {
  const rows: unknown[] = await manager.query('select 1 from swaps where slot_id = $1 and undone_at is null', [slotId])
  return rows.length > 0
}

/** Whose slot it is, and in which capacity the actor may see it; null when they may not. */
export async function findSlotOwner(
  manager: EntityManager,
  actor: Actor,
  slotId: string,
): Promise<{ athleteId: string; self: boolean; coach: boolean } | null> {
  const rows: Array<{ athleteId: string; roles: string[] }> = await manager.query(
    `select se.athlete_id as "athleteId", ${carerRoles('se.athlete_id', '$2')} as roles
       from slots sl join sessions se on se.id = sl.session_id
      where sl.id = $1`,
    [slotId, actor.userId],
  )
  const row = rows[0]
  if (row === undefined) return null
  const self = row.athleteId === actor.userId
  if (!self && row.roles.length === 0) return null
  return { athleteId: row.athleteId, self, coach: row.roles.includes('coach') }
}
