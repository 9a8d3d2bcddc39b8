import { randomUUID } from 'node:crypto'
import { z } from 'zod'
import { id, instant } from '#shared/contract/common'
import type { Received, ResponseOf } from '#shared/contract/endpoint'
import {
  RED_FLAGS,
  type SoreJoint,
  type SoreJointReport,
  type clearRedFlag,
  type listSoreJoints,
} from '#shared/contract/sore-joint'
import { decodeCursor, toPage } from '../../database/cursor'
import type { Dependencies } from '../../dependencies'
import { AppError, notFound } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { recordAudit } from '../audit/record'
import { requireAthlete } from '../people/access'
import { lockAthlete } from '../people/lock'
import { tellCareTeam } from './notice'
import { canReport, mayClear } from './policy'
import { presentSoreJoint } from './present'
import { findSoreJoint, findSoreJoints, findStanding } from './repository'

/** From a rating of 8 on, pain is a red flag whatever the other answers were. */
const SEVERE_RATING = 8
const DAY = 24 * 60 * 60 * 1000
const cursorKey = z.tuple([instant, id])

function raisedFlags(report: SoreJointReport) {
  return RED_FLAGS.filter((flag) => report.redFlags[flag] || (flag === 'severePain' && report.rating >= SEVERE_RATING))
}

/** The furthest time zone is a day ahead; anything later is a slip of the finger. */
function refuseFuture(day: string, now: Date): void {
  if (day <= new Date(now.getTime() + DAY).toISOString().slice(0, 10)) return
  throw new AppError('invalid_request', 'Some of what was sent cannot be used.', [
    { path: 'day', message: 'This day is still to come.' },
  ])
}

export async function report(
  dependencies: Dependencies,
  actor: Actor,
  athleteId: string,
  sent: SoreJointReport,
): Promise<SoreJoint> {
  const { dataSource, clock, background } = dependencies
  const raised = raisedFlags(sent)
  const made = await dataSource.transaction(async (manager) => {
    const access = await requireAthlete(manager, actor, athleteId)
    if (!canReport(access)) throw new AppError('forbidden', 'Only the athlete can report a sore joint.')
    const now = clock.now()
    refuseFuture(sent.day, now)
    await lockAthlete(manager, athleteId)
    const standing = await findStanding(manager, athleteId, sent.joint, sent.side)
    // A red flag outlives the report that raised it: only a physio ends it.
    const carried = standing?.state === 'redFlag' ? standing.redFlags : []
    const flags = RED_FLAGS.filter((flag) => raised.includes(flag) || carried.includes(flag))
    if (standing !== null) {
      await manager.query(`update sore_joints set state = 'closed', closed_at = $2 where id = $1`, [standing.id, now])
    }
    const id = randomUUID()
    await manager.query(
      `insert into sore_joints (id, athlete_id, joint, side, rating, provocations, red_flags, note, day, state, reported_at)
       values ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11)`,
      [
        id,
        athleteId,
        sent.joint,
        sent.side,
        sent.rating,
        [...new Set(sent.provocations)],
        flags,
        sent.note ?? '',
        sent.day,
        flags.length > 0 ? 'redFlag' : 'open',
        now,
      ],
    )
    await recordAudit(manager, { actor, action: 'report.soreJoint', subject: athleteId, details: { soreJointId: id } })
    const row = await findSoreJoint(manager, athleteId, id)
    if (row === null) throw notFound('That report')
    return presentSoreJoint(row, access)
  })
  if (raised.length > 0) background.run('tell the care team', () => tellCareTeam(dependencies, athleteId))
  return made
}

export async function list(
  { dataSource }: Dependencies,
  actor: Actor,
  { params, query }: Pick<Received<typeof listSoreJoints>, 'params' | 'query'>,
): Promise<ResponseOf<typeof listSoreJoints>> {
  const after = decodeCursor(query.cursor, cursorKey)
  const access = await requireAthlete(dataSource.manager, actor, params.athleteId)
  const found = await findSoreJoints(dataSource.manager, params.athleteId, { ...query, after })
  const { rows, nextCursor } = toPage(found, query.limit, (row) => [row.reportedAt.toISOString(), row.id])
  if (!access.self) {
    await recordAudit(dataSource.manager, { actor, action: 'read.soreJoints', subject: params.athleteId })
  }
  return { items: rows.map((row) => presentSoreJoint(row, access)), nextCursor }
}

export async function close(
  { dataSource, clock }: Dependencies,
  actor: Actor,
  athleteId: string,
  id: string,
): Promise<SoreJoint> {
  return dataSource.transaction(async (manager) => {
    const access = await requireAthlete(manager, actor, athleteId)
    await lockAthlete(manager, athleteId)
    const row = await findSoreJoint(manager, athleteId, id)
    if (row === null) throw notFound('That report')
    if (!access.self) throw new AppError('forbidden', 'Only the athlete can say that a joint no longer troubles.')
    if (row.state === 'closed') throw new AppError('already_closed', 'This report was closed before.')
    if (row.state === 'redFlag') {
      throw new AppError(
        'red_flag',
        'This needs a clinician first. A physio you let in can clear it after looking at it.',
      )
    }
    const now = clock.now()
    await manager.query(`update sore_joints set state = 'closed', closed_at = $2 where id = $1`, [id, now])
    await recordAudit(manager, { actor, action: 'close.soreJoint', subject: athleteId, details: { soreJointId: id } })
    return presentSoreJoint({ ...row, state: 'closed', closedAt: now }, access)
  })
}

export async function clear(
  { dataSource, clock }: Dependencies,
  actor: Actor,
  { params, body }: Pick<Received<typeof clearRedFlag>, 'params' | 'body'>,
): Promise<SoreJoint> {
  const { athleteId, soreJointId } = params
  return dataSource.transaction(async (manager) => {
    const access = await requireAthlete(manager, actor, athleteId)
    await lockAthlete(manager, athleteId)
    const row = await findSoreJoint(manager, athleteId, soreJointId)
    if (row === null) throw notFound('That report')
    if (!mayClear(access)) throw new AppError('forbidden', 'Only a physio the athlete let in can clear this.')
    if (row.state !== 'redFlag') throw new AppError('conflict', 'No red flag stands here any more.')
    const now = clock.now()
    await manager.query(
      `update sore_joints set state = 'open', cleared_by = $2, cleared_at = $3, clearance_note = $4 where id = $1`,
      [soreJointId, actor.userId, now, body.note],
    )
    await recordAudit(manager, { actor, action: 'clear.redFlag', subject: athleteId, details: { soreJointId } })
    return presentSoreJoint({ ...row, state: 'open', clearedByName: actor.name, clearedAt: now }, access)
  })
}
