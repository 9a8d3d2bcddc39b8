import type { EntityManager } from 'typeorm'

export interface AthleteListRow {
  id: string
  name: string
  clubName: string
  birthDate: string | null
  consentSince: Date
  /** The actor is their physio (too), and so may clear red flags. */
  physio: boolean
  /** 0 while a red flag stands, else 1. */
  order: number
  /** 10 minus the worst standing rating; 11 when nothing is sore. */
  ease: number
}

export type AthleteListKey = [order: number, ease: number, name: string, id: string]

/** One page, and one row more, of the athletes who let this carer in: red flags first, then the sorest joint. */
export const findAthletes = (
  manager: EntityManager,
  carerId: string,
  { after, limit }: { after: AthleteListKey | null; limit: number },
): Promise<AthleteListRow[]> =>
  manager.query(
    `select * from (
       select u.id, u.name, string_agg(distinct cl.name, ', ' order by cl.name) as "clubName",
              bool_or(carer.role = 'physio') as physio, c.granted_at as "consentSince",
              (select ap.birth_date::text from athlete_profiles ap where ap.user_id = u.id) as "birthDate",
              case when s.flagged then 0 else 1 end as "order", 10 - coalesce(s.worst, -1) as ease
         from consents c
         join users u on u.id = c.athlete_id
         join memberships carer on carer.user_id = c.carer_id and carer.role in ('coach', 'physio')
         join memberships trained
           on trained.user_id = c.athlete_id and trained.club_id = carer.club_id and trained.role = 'athlete'
         join clubs cl on cl.id = carer.club_id
         left join lateral (
           select bool_or(sj.state = 'redFlag') as flagged, max(sj.rating) as worst
             from sore_joints sj where sj.athlete_id = u.id and sj.state <> 'closed'
         ) s on true
        where c.carer_id = $1 and c.revoked_at is null
        group by u.id, u.name, c.granted_at, s.flagged, s.worst
     ) let_in
     where $2::integer is null or ("order", ease, name, id) > ($2::integer, $3::integer, $4::text, $5::uuid)
     order by "order", ease, name, id
     limit $6`,
    [carerId, after?.[0] ?? null, after?.[1] ?? null, after?.[2] ?? null, after?.[3] ?? null, limit + 1],
  )
