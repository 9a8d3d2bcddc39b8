import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { Intent } from '#shared/contract/session'
import type { TargetGroup } from '#shared/rules/muscle-names'
import { Club, User } from '../people/entity'
import { Exercise } from '../exercises/entity'
import { Place } from '../places/entity'

/** What an athlete is to train on one calendar day of theirs. */
@Entity({ name: 'sessions' })
@Index('sessions_athlete_id_day_key', ['athleteId', 'day'], { unique: true })
@Check('sessions_minutes_check', 'minutes between 1 and 600')
export class Session {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @ForeignKey(() => User, { name: 'sessions_athlete_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'athlete_id', type: 'uuid' })
  athleteId!: string

  /** The club that planned it; its admin reviews flags raised here. */
  @ForeignKey(() => Club, { name: 'sessions_club_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'club_id', type: 'uuid' })
  clubId!: string

  @Column({ name: 'day', type: 'date' })
  day!: string

  @Column({ name: 'title', type: 'text' })
  title!: string

  @Column({ name: 'minutes', type: 'integer' })
  minutes!: number

  @ForeignKey(() => Place, { name: 'sessions_place_id_fkey', onDelete: 'SET NULL' })
  @Column({ name: 'place_id', type: 'uuid', nullable: true })
  placeId!: string | null
}

/** One exercise of a session as planned; a swap stands beside it and never overwrites it. */
@Entity({ name: 'slots' })
@Index('slots_session_id_position_key', ['sessionId', 'position'], { unique: true })
@Index('slots_exercise_id_idx', ['exerciseId'])
@Check('slots_position_check', 'position >= 1')
@Check('slots_sets_check', 'sets between 1 and 20')
@Check('slots_repetitions_check', 'repetitions between 1 and 300')
@Check('slots_unit_check', "unit in ('repetitions', 'seconds')")
@Check('slots_rir_check', 'rir between 0 and 10')
@Check('slots_load_check', 'load between -200 and 600')
@Check('slots_pieces_check', 'pieces in (1, 2)')
@Check('slots_intent_check', "intent in ('strength', 'size', 'skill', 'endurance')")
export class Slot {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @ForeignKey(() => Session, { name: 'slots_session_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'session_id', type: 'uuid' })
  sessionId!: string

  @Column({ name: 'position', type: 'integer' })
  position!: number

  @ForeignKey(() => Exercise, { name: 'slots_exercise_id_fkey' })
  @Column({ name: 'exercise_id', type: 'uuid' })
  exerciseId!: string

  @Column({ name: 'sets', type: 'integer' })
  sets!: number

  @Column({ name: 'repetitions', type: 'integer' })
  repetitions!: number

  @Column({ name: 'unit', type: 'text' })
  unit!: 'repetitions' | 'seconds'

  @Column({ name: 'rir', type: 'double precision' })
  rir!: number

  /** kg; negative is assistance; null is body weight alone. */
  @Column({ name: 'load', type: 'double precision', nullable: true })
  load!: number | null

  @Column({ name: 'pieces', type: 'integer' })
  pieces!: number

  @Column({ name: 'intent', type: 'text' })
  intent!: Intent

  @Column({ name: 'target', type: 'text' })
  target!: TargetGroup
}
