import type { Flag } from '#shared/contract/flag'
import type { FlagRow } from './repository'

export const presentFlag = (row: FlagRow): Flag => ({
  id: row.id,
  raisedBy: { id: row.raisedById, name: row.raisedByName },
  original: row.original,
  exercise: row.exercise,
  reason: row.reason,
  note: row.note,
  ruleSetVersion: row.ruleSetVersion,
  raisedAt: row.raisedAt.toISOString(),
  state: row.state,
})
