import type { EntityManager } from 'typeorm'
import type { Place } from '#shared/contract/place'
import type { Dose, Intent } from '#shared/contract/session'
import type { TargetGroup } from '#shared/rules/muscle-names'
import type { SoreJointInput } from '#shared/rules/index'
import { queryPrepared } from '../../database/prepared'
import { AppError, notFound } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { profileJson, type ProfileJson } from '../athletes/engine-athlete'
import { EDITION_SQL, type Edition } from '../exercises/catalogue'
import { carerRoles } from '../people/access'
import { EQUIPMENT_JSON } from '../places/repository'
import { standingSoreJson } from '../sore-joints/repository'

/** What is to be replaced, and how it was meant. */
export interface Wanted {
  exerciseId: string
  planned: Dose
  intent: Intent
  target: TargetGroup
}

/** Everything a ranking is made from, and in which capacity the actor may see it. */
export interface RankingInputs extends Edition {
  athlete: { id: string; name: string }
  access: { self: boolean; coach: boolean; physio: boolean }
  profile: ProfileJson
  sore: SoreJointInput[]
  place: { id: string; equipment: Place['equipment'] } | null
  wanted: Wanted
}

interface Row extends Edition {
  athleteId: string
  name: string
  roles: string[]
  profile: ProfileJson | null
  sore: SoreJointInput[]
  place: RankingInputs['place']
}

interface SlotRow extends Row, Dose {
  exerciseId: string
  intent: Intent
  target: TargetGroup
}

/**
 * The part that both queries share, for athlete `u` and the actor in $2. `place` must belong to a club of the athlete:
 * somebody else's place is as good as none.
 */
const commonColumns = (place: string) => `
  u.id as "athleteId", u.name, ${carerRoles('u.id', '$2')} as roles, ${profileJson('u.id')} as profile,
  ${standingSoreJson('u.id')} as sore, ${EDITION_SQL},
  (select jsonb_build_object('id', pl.id, 'equipment', ${EQUIPMENT_JSON})
     from places pl
    where pl.id = ${place}
      and exists (select 1 from memberships pm where pm.club_id = pl.club_id and pm.user_id = u.id)) as place`

const FOR_SLOT = `
  select ${commonColumns('coalesce($3::uuid, se.place_id)')},
         sl.exercise_id as "exerciseId", sl.sets, sl.repetitions, sl.unit, sl.rir, sl.load, sl.pieces, sl.intent, sl.target
    from slots sl
    join sessions se on se.id = sl.session_id
    join users u on u.id = se.athlete_id
   where sl.id = $1`

const FOR_ATHLETE = `
  select ${commonColumns('coalesce($3::uuid, u.default_place_id)')}
    from users u
   where u.id = $1
     and exists (select 1 from memberships m where m.user_id = u.id and m.role = 'athlete')`

function toInputs(row: Row, actor: Actor, placeId: string | undefined, wanted: Wanted, what: string): RankingInputs {
  const self = row.athleteId === actor.userId
  if (!self && row.roles.length === 0) throw notFound(what)
  if (placeId !== undefined && row.place === null) {
    throw new AppError('invalid_request', 'Some of what was sent cannot be used.', [
      { path: 'placeId', message: 'Choose a place of one of the athlete’s clubs.' },
    ])
  }
  if (row.profile === null) {
    throw new AppError('profile_incomplete', 'Body mass, stature, sex and date of birth are needed first.')
  }
  return {
    revision: row.revision,
    ruleSetVersion: row.ruleSetVersion,
    athlete: { id: row.athleteId, name: row.name },
    access: { self, coach: row.roles.includes('coach'), physio: row.roles.includes('physio') },
    profile: row.profile,
    sore: row.sore,
    place: row.place,
    wanted,
  }
}

/** One query. Not found for whoever may not see the athlete. */
export async function findInputsForSlot(
  manager: EntityManager,
  actor: Actor,
  slotId: string,
  placeId: string | undefined,
): Promise<RankingInputs> {
  const values = [slotId, actor.userId, placeId ?? null]
  const rows = await queryPrepared<SlotRow>(manager, 'ranking inputs for a slot', FOR_SLOT, values)
  const row = rows[0]
  if (row === undefined) throw notFound('That slot')
  const { exerciseId, sets, repetitions, unit, rir, load, pieces, intent, target } = row
  const planned = { sets, repetitions, unit, rir, load, pieces }
  return toInputs(row, actor, placeId, { exerciseId, planned, intent, target }, 'That slot')
}

/** One query. Not found for whoever may not see the athlete. */
export async function findInputsForAthlete(
  manager: EntityManager,
  actor: Actor,
  athleteId: string,
  placeId: string | undefined,
  wanted: Wanted,
): Promise<RankingInputs> {
  const rows: Row[] = await manager.query(FOR_ATHLETE, [athleteId, actor.userId, placeId ?? null])
  const row = rows[0]
  if (row === undefined) throw notFound('That athlete')
  return toInputs(row, actor, placeId, wanted, 'That athlete')
}
