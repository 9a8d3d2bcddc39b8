import { z } from 'zod'
import type { AuditEntry } from '#shared/contract/audit'
import { id, instant } from '#shared/contract/common'
import { decodeCursor, toPage } from '../../database/cursor'
import type { Dependencies } from '../../dependencies'
import { AppError } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { clubsAs } from '../people/policy'
import { presentAuditEntry } from './present'
import { findAuditRows } from './repository'

const auditKey = z.tuple([instant, id])

/** The trail of the clubs that the actor runs, newest first. */
export async function listAudit(
  { dataSource }: Dependencies,
  actor: Actor,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<{ items: AuditEntry[]; nextCursor: string | null }> {
  const clubIds = clubsAs(actor, 'admin')
  if (clubIds.length === 0) throw new AppError('forbidden', 'Only admins read the trail.')
  const after = decodeCursor(cursor, auditKey)
  const found = await findAuditRows(dataSource.manager, clubIds, { after, limit: limit + 1 })
  const { rows, nextCursor } = toPage(found, limit, (row) => [row.at.toISOString(), row.id])
  return { items: rows.map(presentAuditEntry), nextCursor }
}
