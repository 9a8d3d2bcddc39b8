import { IsNull, type EntityManager } from 'typeorm'
import type { BodyProfile } from '#shared/contract/me'
import { AthleteProfile, Consent, User } from '../people/entity'

export const findSelf = (manager: EntityManager, userId: string): Promise<User> =>
  manager.findOneOrFail(User, {
    where: { id: userId },
    relations: { memberships: { club: true }, athleteProfile: true },
  })

export async function updateSelf(
  manager: EntityManager,
  userId: string,
  change: Partial<Pick<User, 'name' | 'units' | 'defaultPlaceId'>>,
): Promise<void> {
  if (Object.keys(change).length > 0) await manager.update(User, { id: userId }, change)
}

/** Skill grade and fitted strength are not the athlete's to set, and stay. */
export async function saveBody(manager: EntityManager, userId: string, body: BodyProfile, now: Date): Promise<void> {
  await manager.upsert(AthleteProfile, { userId, ...body, updatedAt: now }, ['userId'])
}

export async function isPlaceOfClubs(manager: EntityManager, placeId: string, clubIds: string[]): Promise<boolean> {
  const rows: unknown[] = await manager.query('select 1 from places where id = $1 and club_id = any($2::uuid[])', [
    placeId,
    clubIds,
  ])
  return rows.length > 0
}

export interface CareTeamRow {
  userId: string
  name: string
  role: 'coach' | 'physio'
  clubName: string
  consentSince: Date | null
}

/** Coaches and physios of the athlete's clubs, each once (as physio when both), with the consent that stands. */
export const findCareTeam = (
  manager: EntityManager,
  athleteId: string,
  carerId: string | null = null,
): Promise<CareTeamRow[]> =>
  manager.query(
    `select * from (
       select distinct on (carer.user_id)
              carer.user_id as "userId", u.name, carer.role, club.name as "clubName", c.granted_at as "consentSince"
         from memberships athlete
         join memberships carer on carer.club_id = athlete.club_id and carer.role in ('coach', 'physio')
         join users u on u.id = carer.user_id
         join clubs club on club.id = carer.club_id
         left join consents c on c.athlete_id = athlete.user_id and c.carer_id = carer.user_id and c.revoked_at is null
        where athlete.user_id = $1 and athlete.role = 'athlete' and carer.user_id <> $1
          and ($2::uuid is null or carer.user_id = $2)
        order by carer.user_id, carer.role desc, club.name
     ) team
     order by name, "userId"`,
    [athleteId, carerId],
  )

/** Starts a consent unless one stands. Tells whether anything changed. */
export async function grantConsent(
  manager: EntityManager,
  athleteId: string,
  carerId: string,
  at: Date,
): Promise<boolean> {
  const rows: unknown[] = await manager.query(
    `insert into consents (athlete_id, carer_id, granted_at) values ($1, $2, $3)
     on conflict (athlete_id, carer_id) where revoked_at is null do nothing
     returning id`,
    [athleteId, carerId, at],
  )
  return rows.length > 0
}

/** Ends the consent that stands. Tells whether anything changed. */
export async function revokeConsent(
  manager: EntityManager,
  athleteId: string,
  carerId: string,
  at: Date,
): Promise<boolean> {
  const result = await manager.update(Consent, { athleteId, carerId, revokedAt: IsNull() }, { revokedAt: at })
  return (result.affected ?? 0) > 0
}
