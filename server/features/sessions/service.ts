import type { Today } from '#shared/contract/session'
import type { Dependencies } from '../../dependencies'
import { notFound } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { recordAudit } from '../audit/record'
import { requireAthlete } from '../people/access'
import { canSwap } from '../swaps/policy'
import { affectedSlots } from './affected'
import { presentSession } from './present'
import { findDays } from './repository'

export async function getDay(
  { dataSource, catalogue, clock }: Dependencies,
  actor: Actor,
  athleteId: string,
  day: string,
): Promise<Today> {
  const { manager } = dataSource
  const access = await requireAthlete(manager, actor, athleteId)
  const [row] = await findDays(manager, [athleteId], day)
  if (row === undefined) throw notFound('That athlete')
  if (!access.self) await recordAudit(manager, { actor, action: 'read.today', subject: athleteId, details: { day } })
  const edition = await catalogue.edition(row, [row.profile?.sex ?? 'unspecified'])
  const affected = affectedSlots(row, edition, clock.now())
  return {
    athlete: { id: athleteId, name: access.name },
    day,
    session: row.session === null ? null : presentSession(row.session, { athleteId, day }, affected, canSwap(access)),
    nextDay: row.nextDay,
  }
}
