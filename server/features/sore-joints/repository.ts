import type { EntityManager } from 'typeorm'
import type { Provocation, RedFlag, SoreJoint as Contract } from '#shared/contract/sore-joint'
import type { Joint, Side } from '#shared/mechanics/vocabulary'
import type { SoreJointState } from './entity'

export interface SoreJointRow {
  id: string
  athleteId: string
  joint: Joint
  side: Side | null
  rating: number
  provocations: Provocation[]
  redFlags: RedFlag[]
  note: string
  day: string
  state: SoreJointState
  reportedAt: Date
  closedAt: Date | null
  clearedByName: string | null
  clearedAt: Date | null
}

const SELECT = `
  select s.id, s.athlete_id as "athleteId", s.joint, s.side, s.rating, s.provocations, s.red_flags as "redFlags",
         s.note, s.day::text as day, s.state, s.reported_at as "reportedAt", s.closed_at as "closedAt",
         cleared.name as "clearedByName", s.cleared_at as "clearedAt"
    from sore_joints s
    left join users cleared on cleared.id = s.cleared_by`

/** Standing reports as the rules read them, for the athlete whose id is the SQL expression `athlete`. */
export const standingSoreJson = (athlete: string): string => `
  coalesce((
    select jsonb_agg(jsonb_build_object(
             'soreJointId', sj.id, 'joint', sj.joint, 'side', sj.side, 'rating', sj.rating,
             'provocations', sj.provocations,
             'redFlags', case when sj.state = 'redFlag' then sj.red_flags else '{}' end
           ) order by sj.joint, sj.side, sj.id)
      from sore_joints sj where sj.athlete_id = ${athlete} and sj.state <> 'closed'
  ), '[]'::jsonb)`

export type StateFilter = Contract['state'] | 'standing' | 'all'

const STATES: Record<StateFilter, SoreJointState[]> = {
  open: ['open'],
  redFlag: ['redFlag'],
  closed: ['closed'],
  standing: ['open', 'redFlag'],
  all: ['open', 'redFlag', 'closed'],
}

/** One page and one row more, newest first. */
export const findSoreJoints = (
  manager: EntityManager,
  athleteId: string,
  { state, after, limit }: { state: StateFilter; after: [string, string] | null; limit: number },
): Promise<SoreJointRow[]> =>
  manager.query(
    `${SELECT}
      where s.athlete_id = $1 and s.state = any($2)
        and ($3::timestamptz is null or (s.reported_at, s.id) < ($3::timestamptz, $4::uuid))
      order by s.reported_at desc, s.id desc
      limit $5`,
    [athleteId, STATES[state], after?.[0] ?? null, after?.[1] ?? null, limit + 1],
  )

export async function findSoreJoint(
  manager: EntityManager,
  athleteId: string,
  id: string,
): Promise<SoreJointRow | null> {
  const rows: SoreJointRow[] = await manager.query(`${SELECT} where s.athlete_id = $1 and s.id = $2`, [athleteId, id])
  return rows[0] ?? null
}

export async function findStanding(
  manager: EntityManager,
  athleteId: string,
  joint: Joint,
  side: Side | null,
): Promise<SoreJointRow | null> {
  const rows: SoreJointRow[] = await manager.query(
    `${SELECT} where s.athlete_id = $1 and s.joint = $2 and s.side is not distinct from $3 and s.state <> 'closed'`,
    [athleteId, joint, side],
  )
  return rows[0] ?? null
}

/** Standing reports of several athletes, red flags first, then the sorest. */
export const findStandingOf = (manager: EntityManager, athleteIds: readonly string[]): Promise<SoreJointRow[]> =>
  manager.query(
    `${SELECT}
      where s.athlete_id = any($1::uuid[]) and s.state <> 'closed'
      order by s.state = 'redFlag' desc, s.rating desc, s.joint, s.side, s.id`,
    [athleteIds],
  )

/** The coaches and physios an athlete lets in, for a notice; never for display. */
export const findCareTeamAddresses = (manager: EntityManager, athleteId: string): Promise<Array<{ email: string }>> =>
  manager.query(
    `select distinct carer.email
       from consents c
       join users carer on carer.id = c.carer_id
       join memberships cm on cm.user_id = c.carer_id and cm.role in ('coach', 'physio')
       join memberships am on am.user_id = c.athlete_id and am.club_id = cm.club_id and am.role = 'athlete'
      where c.athlete_id = $1 and c.revoked_at is null
      order by carer.email`,
    [athleteId],
  )
