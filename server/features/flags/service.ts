import { randomUUID } from 'node:crypto'
import { z } from 'zod'
import { id, instant } from '#shared/contract/common'
import type { Received, ResponseOf } from '#shared/contract/endpoint'
import type { Flag, listFlags, raiseFlag } from '#shared/contract/flag'
import { decodeCursor, toPage } from '../../database/cursor'
import type { Dependencies } from '../../dependencies'
import { AppError, notFound } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { recordAudit } from '../audit/record'
import { clubsAs } from '../people/policy'
import { findSlotOwner } from '../swaps/repository'
import { presentFlag } from './present'
import { findFlag, findFlags, findFlagSubject } from './repository'

const cursorKey = z.tuple([instant, id])

/** Whoever may see the slot may object: the athlete, and their coach and physio. */
export async function raise(
  { dataSource, clock }: Dependencies,
  actor: Actor,
  body: Received<typeof raiseFlag>['body'],
): Promise<Flag> {
  return dataSource.transaction(async (manager) => {
    const owner = await findSlotOwner(manager, actor, body.slotId)
    const subject = await findFlagSubject(manager, body.slotId, body.exerciseId)
    if (owner === null || subject === null) throw notFound('That slot')
    if (!subject.published) throw notFound('That exercise')
    if (subject.ruleSetVersion === null) throw new AppError('unavailable', 'No rule set is active yet. Try again soon.')
    const id = randomUUID()
    await manager.query(
      `insert into flags (id, club_id, raised_by, slot_id, original_id, exercise_id, reason, note, rule_set_version,
                          raised_at, state)
       values ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, 'open')`,
      [
        id,
        subject.clubId,
        actor.userId,
        body.slotId,
        subject.originalId,
        body.exerciseId,
        body.reason,
        body.note,
        subject.ruleSetVersion,
        clock.now(),
      ],
    )
    await recordAudit(manager, { actor, action: 'raise.flag', subject: owner.athleteId, details: { flagId: id } })
    const row = await findFlag(manager, id)
    if (row === null) throw notFound('That flag')
    return presentFlag(row)
  })
}

/** An admin reads the flags of their clubs, everybody their own. */
export async function list(
  { dataSource }: Dependencies,
  actor: Actor,
  query: Received<typeof listFlags>['query'],
): Promise<ResponseOf<typeof listFlags>> {
  const { manager } = dataSource
  const after = decodeCursor(query.cursor, cursorKey)
  const found = await findFlags(manager, {
    clubIds: clubsAs(actor, 'admin'),
    userId: actor.userId,
    state: query.state,
    after,
    limit: query.limit,
  })
  const { rows, nextCursor } = toPage(found, query.limit, (row) => [row.raisedAt.toISOString(), row.id])
  const others = rows.filter(({ raisedById }) => raisedById !== actor.userId)
  if (others.length > 0) {
    // What people wrote may speak of their health.
    await recordAudit(manager, {
      actor,
      action: 'read.flags',
      subject: null,
      details: { flagIds: others.map(({ id }) => id).join(' ') },
    })
  }
  return { items: rows.map(presentFlag), nextCursor }
}
