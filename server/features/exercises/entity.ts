import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn, PrimaryGeneratedColumn } from 'typeorm'
import type { ExerciseDocument } from '#shared/contract/exercise'
import type { ExerciseSolution } from '#shared/mechanics/solution'
import type { Sex } from '#shared/mechanics/sex'

/** The coefficients of one version for every segment table, solved once at publication. */
export type Solutions = Record<Sex, ExerciseSolution>

/** An exercise keeps its id and slug for good; what it says lives in its versions. */
@Entity({ name: 'exercises' })
@Index('exercises_slug_key', ['slug'], { unique: true })
export class Exercise {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ name: 'slug', type: 'text' })
  slug!: string

  @Column({ name: 'created_at', type: 'timestamptz' })
  createdAt!: Date
}

/** One published wording and geometry of an exercise. Never changed afterwards, so that a swap taken from it stays explainable. */
@Entity({ name: 'exercise_versions' })
@Index('exercise_versions_exercise_id_version_key', ['exerciseId', 'version'], { unique: true })
@Index('exercise_versions_one_current', ['exerciseId'], { unique: true, where: 'is_current' })
@Index('exercise_versions_name_idx', ['name', 'exerciseId'], { where: 'is_current' })
@Check('exercise_versions_version_check', 'version >= 1')
@Check('exercise_versions_coordination_check', 'coordination between 0 and 100')
export class ExerciseVersion {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @ForeignKey(() => Exercise, { name: 'exercise_versions_exercise_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'exercise_id', type: 'uuid' })
  exerciseId!: string

  @Column({ name: 'version', type: 'integer' })
  version!: number

  /** Copied out of the document so that lists page and search on an index. */
  @Column({ name: 'name', type: 'text' })
  name!: string

  @Column({ name: 'document', type: 'jsonb' })
  document!: ExerciseDocument

  @Column({ name: 'solutions', type: 'jsonb' })
  solutions!: Solutions

  /** Coordination demand, 0–100. */
  @Column({ name: 'coordination', type: 'double precision' })
  coordination!: number

  @Column({ name: 'is_current', type: 'boolean' })
  isCurrent!: boolean

  @Column({ name: 'published_at', type: 'timestamptz' })
  publishedAt!: Date
}

/** A version of every constant the rules use; each ranking and swap names the one it was made with. */
@Entity({ name: 'rule_sets' })
@Index('rule_sets_one_active', ['isActive'], { unique: true, where: 'is_active' })
@Check('rule_sets_version_check', 'version >= 1')
export class RuleSetRow {
  @PrimaryColumn({ name: 'version', type: 'integer' })
  version!: number

  @Column({ name: 'data', type: 'jsonb' })
  data!: unknown

  @Column({ name: 'is_active', type: 'boolean' })
  isActive!: boolean

  @Column({ name: 'created_at', type: 'timestamptz' })
  createdAt!: Date
}

/** A single row that counts publications, so that a server knows in its ordinary query whether its copy is old. */
@Entity({ name: 'catalogue_state' })
@Check('catalogue_state_single_row', 'id = 1')
export class CatalogueState {
  @PrimaryColumn({ name: 'id', type: 'smallint' })
  id!: number

  @Column({ name: 'revision', type: 'integer' })
  revision!: number
}
