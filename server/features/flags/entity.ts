import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { FLAG_REASONS } from '#shared/contract/flag'
import { Club, User } from '../people/entity'
import { Exercise, RuleSetRow } from '../exercises/entity'
import { Slot } from '../sessions/entity'

/** A person's objection to a swap, for the admin of the club that planned the session. */
@Entity({ name: 'flags' })
@Index('flags_club_id_idx', { synchronize: false })
@Index('flags_raised_by_idx', { synchronize: false })
@Index('flags_slot_id_idx', ['slotId'])
@Check('flags_reason_check', "reason in ('hurts', 'wrongMuscle', 'loadOff', 'notPossibleHere', 'other')")
@Check('flags_state_check', "state in ('open', 'settled')")
@Check('flags_note_check', 'char_length(note) <= 2000')
export class Flag {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @ForeignKey(() => Club, { name: 'flags_club_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'club_id', type: 'uuid' })
  clubId!: string

  @ForeignKey(() => User, { name: 'flags_raised_by_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'raised_by', type: 'uuid' })
  raisedBy!: string

  @ForeignKey(() => Slot, { name: 'flags_slot_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'slot_id', type: 'uuid' })
  slotId!: string

  @ForeignKey(() => Exercise, { name: 'flags_original_id_fkey' })
  @Column({ name: 'original_id', type: 'uuid' })
  originalId!: string

  @ForeignKey(() => Exercise, { name: 'flags_exercise_id_fkey' })
  @Column({ name: 'exercise_id', type: 'uuid' })
  exerciseId!: string

  @Column({ name: 'reason', type: 'text' })
  reason!: (typeof FLAG_REASONS)[number]

  @Column({ name: 'note', type: 'text' })
  note!: string

  @ForeignKey(() => RuleSetRow, { name: 'flags_rule_set_version_fkey' })
  @Column({ name: 'rule_set_version', type: 'integer' })
  ruleSetVersion!: number

  @Column({ name: 'raised_at', type: 'timestamptz' })
  raisedAt!: Date

  @Column({ name: 'state', type: 'text' })
  state!: 'open' | 'settled'
}
