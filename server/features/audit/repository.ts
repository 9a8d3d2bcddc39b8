import type { EntityManager } from 'typeorm'

export interface AuditRow {
  id: string
  at: Date
  action: string
  details: Record<string, string>
  actorId: string | null
  actorName: string | null
  subjectId: string | null
  subjectName: string | null
}

/** Lines about these clubs, newest first, after the given place in the list. */
export const findAuditRows = (
  manager: EntityManager,
  clubIds: string[],
  { after, limit }: { after: [at: string, id: string] | null; limit: number },
): Promise<AuditRow[]> =>
  manager.query(
    `select e.id, e.at, e.action, e.details,
            actor.id as "actorId", actor.name as "actorName", subject.id as "subjectId", subject.name as "subjectName"
       from audit_entries e
       left join users actor on actor.id = e.actor_id
       left join users subject on subject.id = e.subject_id
      where e.club_ids && $1::uuid[] and ($2::timestamptz is null or (e.at, e.id) < ($2::timestamptz, $3::uuid))
      order by e.at desc, e.id desc
      limit $4`,
    [clubIds, after?.[0] ?? null, after?.[1] ?? null, limit],
  )
