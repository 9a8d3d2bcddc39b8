import type { SoreJoint } from '#shared/contract/sore-joint'
import type { AthleteAccess } from '../people/access'
import { canClear, canClose } from './policy'
import type { SoreJointRow } from './repository'

export const presentSoreJoint = (row: SoreJointRow, access: Pick<AthleteAccess, 'self' | 'physio'>): SoreJoint => ({
  id: row.id,
  athleteId: row.athleteId,
  joint: row.joint,
  side: row.side,
  rating: row.rating,
  provocations: row.provocations,
  redFlags: row.redFlags,
  note: row.note,
  day: row.day,
  state: row.state,
  reportedAt: row.reportedAt.toISOString(),
  closedAt: row.closedAt?.toISOString() ?? null,
  clearedBy: row.clearedByName,
  clearedAt: row.clearedAt?.toISOString() ?? null,
  can: { close: canClose(access, row.state), clear: canClear(access, row.state) },
})
