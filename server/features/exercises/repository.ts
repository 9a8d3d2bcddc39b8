import type { EntityManager } from 'typeorm'
import type { ExerciseDocument } from '#shared/contract/exercise'

export interface ExerciseRow {
  id: string
  versionId: string
  version: number
  document: ExerciseDocument
  coordination: number
}

const SELECT = `
  select v.exercise_id as id, v.id as "versionId", v.version, v.document, v.coordination
    from exercise_versions v`

const escapeLike = (text: string) => text.replace(/[\\%_]/g, (character) => `\\${character}`)

/** One page of published exercises by name, and one row more. */
export const findExercises = (
  manager: EntityManager,
  { search, ids, after, limit }: { search?: string; ids?: string[]; after: [string, string] | null; limit: number },
): Promise<ExerciseRow[]> =>
  manager.query(
    `${SELECT}
      where v.is_current
        and ($1::text is null or v.name ilike '%' || $1 || '%')
        and ($2::uuid[] is null or v.exercise_id = any($2::uuid[]))
        and ($3::text is null or (v.name, v.exercise_id) > ($3::text, $4::uuid))
      order by v.name, v.exercise_id
      limit $5`,
    [
      search === undefined || search === '' ? null : escapeLike(search),
      ids ?? null,
      after?.[0] ?? null,
      after?.[1] ?? null,
      limit + 1,
    ],
  )

export async function findExerciseBySlug(manager: EntityManager, slug: string): Promise<ExerciseRow | null> {
  const rows: ExerciseRow[] = await manager.query(
    `${SELECT} join exercises e on e.id = v.exercise_id where v.is_current and e.slug = $1`,
    [slug],
  )
  return rows[0] ?? null
}
