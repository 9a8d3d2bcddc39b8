import type { SwapTaken } from '#shared/contract/swap'
import { presentExerciseName } from '../exercises/present'
import type { SwapRow } from './repository'

export const presentSwap = (row: SwapRow): SwapTaken => ({
  id: row.id,
  slotId: row.slotId,
  exercise: presentExerciseName(row.exerciseId, row),
  dose: {
    sets: row.sets,
    repetitions: row.repetitions,
    unit: row.unit,
    rir: row.rir,
    load: row.load,
    pieces: row.pieces,
  },
  rank: row.rank,
  ruleSetVersion: row.ruleSetVersion,
  takenAt: row.takenAt.toISOString(),
  undoneAt: row.undoneAt?.toISOString() ?? null,
})
