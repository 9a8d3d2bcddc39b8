import type { Exercise } from '#shared/contract/exercise'
import {
  MechanicsError,
  solveExercise,
  type ExerciseMechanics,
  type Sex,
  type SolvedFrame,
} from '#shared/mechanics/index'

const solved = new WeakMap<ExerciseMechanics, Map<Sex, readonly SolvedFrame[] | null>>()

/** Postures of an exercise for one segment table, solved once; null when this version's geometry cannot be solved here. */
export function framesOf(
  { mechanics }: Pick<Exercise, 'mechanics'>,
  sex: Sex = 'unspecified',
): readonly SolvedFrame[] | null {
  const bySex = solved.get(mechanics) ?? new Map<Sex, readonly SolvedFrame[] | null>()
  solved.set(mechanics, bySex)
  let frames = bySex.get(sex)
  if (frames === undefined) {
    try {
      frames = solveExercise(mechanics, sex).frames
    } catch (error) {
      // The server published it, so only an older client can fail to solve it; the page stands without its drawing.
      if (!(error instanceof MechanicsError)) throw error
      frames = null
    }
    bySex.set(sex, frames)
  }
  return frames
}
