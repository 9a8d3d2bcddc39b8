import type { AuditEntry } from '#shared/contract/audit'
import type { AuditRow } from './repository'

const person = (id: string | null, name: string | null) => (id === null || name === null ? null : { id, name })

export const presentAuditEntry = (row: AuditRow): AuditEntry => ({
  id: row.id,
  at: row.at.toISOString(),
  actor: person(row.actorId, row.actorName),
  action: row.action,
  subject: person(row.subjectId, row.subjectName),
  details: row.details,
})
