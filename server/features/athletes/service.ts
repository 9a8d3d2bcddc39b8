import { z } from 'zod'
import type { listAthletes } from '#shared/contract/athlete'
import type { Received, ResponseOf } from '#shared/contract/endpoint'
import { decodeCursor, toPage } from '../../database/cursor'
import type { Dependencies } from '../../dependencies'
import { AppError } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { recordAudit } from '../audit/record'
import { hasRole } from '../people/policy'
import { affectedSlots } from '../sessions/affected'
import { findDays } from '../sessions/repository'
import { findStandingOf } from '../sore-joints/repository'
import { presentAthleteRow } from './present'
import { findAthletes } from './repository'

const cursorKey = z.tuple([z.int().min(0).max(1), z.int().min(0).max(11), z.string(), z.uuid()])

/** The whole page in a fixed number of queries, however many athletes are on it. */
export async function list(
  { dataSource, catalogue, clock }: Dependencies,
  actor: Actor,
  query: Received<typeof listAthletes>['query'],
): Promise<ResponseOf<typeof listAthletes>> {
  if (!hasRole(actor, 'coach') && !hasRole(actor, 'physio')) {
    throw new AppError('forbidden', 'Only coaches and physios have athletes.')
  }
  const { manager } = dataSource
  const after = decodeCursor(query.cursor, cursorKey)
  const found = await findAthletes(manager, actor.userId, { after, limit: query.limit })
  const { rows, nextCursor } = toPage(found, query.limit, (row) => [row.order, row.ease, row.name, row.id])
  if (rows.length === 0) return { items: [], nextCursor }
  const ids = rows.map(({ id }) => id)
  const sore = await findStandingOf(manager, ids)
  const days = new Map((await findDays(manager, ids, query.day)).map((day) => [day.athleteId, day]))
  await recordAudit(manager, { actor, action: 'read.athletes', subject: null, details: { athleteIds: ids.join(' ') } })
  const sexes = [...days.values()].map(({ profile }) => profile?.sex ?? 'unspecified')
  const edition = await catalogue.latest([...new Set(sexes)])
  const now = clock.now()
  const items = rows.map((row) => {
    const day = days.get(row.id)
    const affected = day === undefined ? [] : [...affectedSlots(day, edition, now).values()]
    return presentAthleteRow(row, {
      sore: sore.filter(({ athleteId }) => athleteId === row.id),
      todayTitle: day?.session?.title ?? null,
      affectedSlots: affected.filter((joints) => joints.length > 0).length,
      now,
    })
  })
  return { items, nextCursor }
}
