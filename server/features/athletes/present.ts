import type { AthleteRow } from '#shared/contract/athlete'
import { presentSoreJoint } from '../sore-joints/present'
import type { SoreJointRow } from '../sore-joints/repository'
import { isMinor } from './engine-athlete'
import type { AthleteListRow } from './repository'

export const presentAthleteRow = (
  row: AthleteListRow,
  about: { sore: SoreJointRow[]; todayTitle: string | null; affectedSlots: number; now: Date },
): AthleteRow => ({
  id: row.id,
  name: row.name,
  clubName: row.clubName,
  minor: row.birthDate !== null && isMinor(row.birthDate, about.now),
  consentSince: row.consentSince.toISOString(),
  sore: about.sore.map((sore) => presentSoreJoint(sore, { self: false, physio: row.physio })),
  todayTitle: about.todayTitle,
  affectedSlots: about.affectedSlots,
})
