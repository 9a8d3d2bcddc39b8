import type { ExerciseDocument } from '#shared/contract/exercise'

export type LoadKind = ExerciseDocument['load']['kind']
