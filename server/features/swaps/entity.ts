import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { Ranking } from '#shared/contract/swap'
import { User } from '../people/entity'
import { ExerciseVersion, RuleSetRow } from '../exercises/entity'
import { Slot } from '../sessions/entity'

/** An alternative put in a slot's place, with the ranking it was taken from. At most one per slot stands. */
@Entity({ name: 'swaps' })
@Index('swaps_one_standing', ['slotId'], { unique: true, where: 'undone_at is null' })
@Index('swaps_slot_id_idx', ['slotId'])
@Check('swaps_sets_check', 'sets between 1 and 20')
@Check('swaps_repetitions_check', 'repetitions between 1 and 300')
@Check('swaps_unit_check', "unit in ('repetitions', 'seconds')")
@Check('swaps_rir_check', 'rir between 0 and 10')
@Check('swaps_pieces_check', 'pieces in (1, 2)')
@Check('swaps_rank_check', 'rank >= 1')
@Check('swaps_undone_check', 'undone_by is null or undone_at is not null')
export class Swap {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @ForeignKey(() => Slot, { name: 'swaps_slot_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'slot_id', type: 'uuid' })
  slotId!: string

  @ForeignKey(() => ExerciseVersion, { name: 'swaps_exercise_version_id_fkey' })
  @Column({ name: 'exercise_version_id', type: 'uuid' })
  exerciseVersionId!: string

  @Column({ name: 'sets', type: 'integer' })
  sets!: number

  @Column({ name: 'repetitions', type: 'integer' })
  repetitions!: number

  @Column({ name: 'unit', type: 'text' })
  unit!: 'repetitions' | 'seconds'

  @Column({ name: 'rir', type: 'double precision' })
  rir!: number

  @Column({ name: 'load', type: 'double precision', nullable: true })
  load!: number | null

  @Column({ name: 'pieces', type: 'integer' })
  pieces!: number

  @Column({ name: 'rank', type: 'integer' })
  rank!: number

  @Column({ name: 'fingerprint', type: 'text' })
  fingerprint!: string

  @ForeignKey(() => RuleSetRow, { name: 'swaps_rule_set_version_fkey' })
  @Column({ name: 'rule_set_version', type: 'integer' })
  ruleSetVersion!: number

  /** The whole table as it was read, so that the choice can be explained later. */
  @Column({ name: 'ranking', type: 'jsonb' })
  ranking!: Ranking

  @ForeignKey(() => User, { name: 'swaps_taken_by_fkey', onDelete: 'SET NULL' })
  @Column({ name: 'taken_by', type: 'uuid', nullable: true })
  takenBy!: string | null

  @Column({ name: 'taken_at', type: 'timestamptz' })
  takenAt!: Date

  @ForeignKey(() => User, { name: 'swaps_undone_by_fkey', onDelete: 'SET NULL' })
  @Column({ name: 'undone_by', type: 'uuid', nullable: true })
  undoneBy!: string | null

  @Column({ name: 'undone_at', type: 'timestamptz', nullable: true })
  undoneAt!: Date | null
}
