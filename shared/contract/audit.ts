import { z } from 'zod'
import { id, instant, list, pageQuery } from './common'
import { endpoint } from './endpoint'

export const auditEntry = z.object({
  id,
  at: instant,
  actor: z.object({ id, name: z.string() }).nullable(),
  /** verb.object, for example `read.soreJoints`, `take.swap`. */
  action: z.string(),
  subject: z.object({ id, name: z.string() }).nullable(),
  /** Names and ids only, never a rating, a note or another health value. */
  details: z.record(z.string(), z.string()),
})
export type AuditEntry = z.infer<typeof auditEntry>

export const listAudit = endpoint({
  method: 'GET',
  path: '/api/audit',
  summary: 'The audit trail of the clubs the signed-in admin runs, newest first.',
  access: 'signedIn',
  query: pageQuery,
  response: list(auditEntry),
})
