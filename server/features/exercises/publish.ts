import { createHash, randomUUID } from 'node:crypto'
import { isDeepStrictEqual } from 'node:util'
import type { EntityManager } from 'typeorm'
import type { ExerciseDocument } from '#shared/contract/exercise'
import type { RuleSet } from '#shared/contract/rule-set'
import { solveExercise } from '#shared/mechanics/index'
import { coordinationDemand } from '#shared/rules/index'
import type { Solutions } from './entity'

/** What publishing derives from a document. Throws MechanicsError for a geometry that cannot be solved. */
export function derive(document: ExerciseDocument, ruleSet: RuleSet): { solutions: Solutions; coordination: number } {
  const solutions: Solutions = {
    male: solveExercise(document.mechanics, 'male'),
    female: solveExercise(document.mechanics, 'female'),
    unspecified: solveExercise(document.mechanics, 'unspecified'),
  }
  return { solutions, coordination: coordinationDemand(document, solutions.unspecified, ruleSet) }
}

/** jsonb keeps neither the order of keys nor undefined values, so both sides are compared as it would keep them. */
const sameJson = (a: unknown, b: unknown) => isDeepStrictEqual(a, JSON.parse(JSON.stringify(b)) as unknown)

/** An exercise keeps the same id wherever the same slug is published first, so that links and demo rows agree. */
function exerciseId(slug: string): string {
  const hash = createHash('sha256').update(`pintle exercise ${slug}`).digest()
  hash.writeUInt8((hash.readUInt8(6) & 0x0f) | 0x50, 6)
  hash.writeUInt8((hash.readUInt8(8) & 0x3f) | 0x80, 8)
  const hex = hash.toString('hex', 0, 16)
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-')
}

interface CurrentRow {
  exerciseId: string
  versionId: string | null
  version: number | null
  document: unknown
  solutions: unknown
  coordination: number | null
}

/**
 * Publishes a document as the next version of its exercise, with coefficients computed once for all. Does nothing
 * when the current version says the same. Call in a transaction; resolves to whether something was published.
 */
export async function publish(
  manager: EntityManager,
  document: ExerciseDocument,
  ruleSet: RuleSet,
  now: Date,
): Promise<boolean> {
  const { solutions, coordination } = derive(document, ruleSet)
  await manager.query(
    `insert into exercises (id, slug, created_at) values ($1, $2, $3) on conflict (slug) do nothing`,
    [exerciseId(document.slug), document.slug, now],
  )
  const rows: CurrentRow[] = await manager.query(
    `select e.id as "exerciseId", v.id as "versionId", v.version, v.document, v.solutions, v.coordination
       from exercises e
       left join exercise_versions v on v.exercise_id = e.id and v.is_current
      where e.slug = $1
        for update of e`,
    [document.slug],
  )
  const current = rows[0]
  if (current === undefined) throw new Error(`exercise ${document.slug} vanished while it was published`)
  if (
    current.coordination === coordination &&
    sameJson(current.document, document) &&
    sameJson(current.solutions, solutions)
  ) {
    return false
  }
  if (current.versionId !== null) {
    await manager.query('update exercise_versions set is_current = false where id = $1', [current.versionId])
  }
  await manager.query(
    `insert into exercise_versions
       (id, exercise_id, version, name, document, solutions, coordination, is_current, published_at)
     values ($1, $2, $3, $4, $5, $6, $7, true, $8)`,
    [
      randomUUID(),
      current.exerciseId,
      (current.version ?? 0) + 1,
      document.name,
      JSON.stringify(document),
      JSON.stringify(solutions),
      coordination,
      now,
    ],
  )
  await manager.query('update catalogue_state set revision = revision + 1 where id = 1')
  return true
}
