import type { EntityManager } from 'typeorm'
import type { Flag } from '#shared/contract/flag'

interface NamedExercise {
  id: string
  slug: string
  name: string
}

export interface FlagRow {
  id: string
  raisedById: string
  raisedByName: string
  original: NamedExercise
  exercise: NamedExercise
  reason: Flag['reason']
  note: string
  ruleSetVersion: number
  raisedAt: Date
  state: Flag['state']
}

const exerciseJson = (id: string) => `
  (select jsonb_build_object('id', e.id, 'slug', e.slug, 'name', v.name)
     from exercises e join exercise_versions v on v.exercise_id = e.id and v.is_current where e.id = ${id})`

const SELECT = `
  select f.id, f.raised_by as "raisedById", u.name as "raisedByName", ${exerciseJson('f.original_id')} as original,
         ${exerciseJson('f.exercise_id')} as exercise, f.reason, f.note, f.rule_set_version as "ruleSetVersion",
         f.raised_at as "raisedAt", f.state
    from flags f
    join users u on u.id = f.raised_by`

/** One page and one row more, newest first: those raised in the given clubs, and the person's own. */
export const findFlags = (
  manager: EntityManager,
  {
    clubIds,
    userId,
    state,
    after,
    limit,
  }: { clubIds: string[]; userId: string; state: Flag['state'] | 'all'; after: [string, string] | null; limit: number },
): Promise<FlagRow[]> =>
  manager.query(
    `${SELECT}
      where (f.club_id = any($1::uuid[]) or f.raised_by = $2)
        and ($3 = 'all' or f.state = $3)
        and ($4::timestamptz is null or (f.raised_at, f.id) < ($4::timestamptz, $5::uuid))
      order by f.raised_at desc, f.id desc
      limit $6`,
    [clubIds, userId, state, after?.[0] ?? null, after?.[1] ?? null, limit + 1],
  )

export async function findFlag(manager: EntityManager, id: string): Promise<FlagRow | null> {
  const rows: FlagRow[] = await manager.query(`${SELECT} where f.id = $1`, [id])
  return rows[0] ?? null
}

/** What a flag refers to: the slot's club and planned exercise, and the rules behind what is objected to. */
export interface FlagSubject {
  clubId: string
  originalId: string
  /** The exercise is published. */
  published: boolean
  /** Rules of the latest swap to this exercise in the slot, else the active ones. */
  ruleSetVersion: number | null
}

export async function findFlagSubject(
  manager: EntityManager,
  slotId: string,
  exerciseId: string,
): Promise<FlagSubject | null> {
  const rows: FlagSubject[] = await manager.query(
    `select se.club_id as "clubId", sl.exercise_id as "originalId",
            exists (select 1 from exercise_versions v where v.exercise_id = $2 and v.is_current) as published,
            coalesce(
              (select sw.rule_set_version from swaps sw join exercise_versions v on v.id = sw.exercise_version_id
                where sw.slot_id = sl.id and v.exercise_id = $2 order by sw.taken_at desc limit 1),
              (select rs.version from rule_sets rs where rs.is_active)
            ) as "ruleSetVersion"
       from slots sl join sessions se on se.id = sl.session_id
      where sl.id = $1`,
    [slotId, exerciseId],
  )
  return rows[0] ?? null
}
