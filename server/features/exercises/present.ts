import type { Exercise } from '#shared/contract/exercise'
import type { ExerciseRow } from './repository'

export const presentExercise = (
  { id, versionId, version, document, coordination }: ExerciseRow,
  muscles: Exercise['muscles'],
): Exercise => ({
  id,
  versionId,
  version,
  slug: document.slug,
  name: document.name,
  family: document.family,
  kind: document.kind,
  unit: document.unit,
  skill: document.skill,
  equipment: document.equipment,
  load: document.load,
  setup: document.setup,
  cautions: document.cautions ?? [],
  coordination,
  muscles,
  mechanics: document.mechanics,
})

/** The name by which an exercise is spoken of elsewhere. */
export const presentExerciseName = (id: string, document: { slug: string; name: string }) => ({
  id,
  slug: document.slug,
  name: document.name,
})
