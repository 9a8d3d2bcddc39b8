import type { EntityManager } from 'typeorm'

export interface AuditLine {
  /** Null when nobody was signed in, for example at a refused sign-in. */
  actor: { userId: string } | null
  /** verb.object, for example `read.soreJoints`. */
  action: `${string}.${string}`
  /** Id of the person it is about, or null. */
  subject: string | null
  /** Names and ids only, never a rating, a note or another health value. */
  details?: Record<string, string>
}

/** Adds a line to the trail; call it with the manager of the transaction that makes the change. One query. */
export async function recordAudit(manager: EntityManager, line: AuditLine): Promise<void> {
  const actorId = line.actor?.userId ?? null
  await manager.query(
    `insert into audit_entries (actor_id, action, subject_id, club_ids, details)
     values ($1, $2, $3, array(select distinct club_id from memberships where user_id = coalesce($3::uuid, $1::uuid)), $4)`,
    [actorId, line.action, line.subject, JSON.stringify(line.details ?? {})],
  )
}
