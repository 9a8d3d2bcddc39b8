import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { Provocation, RedFlag, SORE_JOINT_STATES } from '#shared/contract/sore-joint'
import type { Joint, Side } from '#shared/mechanics/vocabulary'
import { User } from '../people/entity'

export type SoreJointState = (typeof SORE_JOINT_STATES)[number]

/**
 * An athlete's report of a sore joint: open → closed, or redFlag → open (a physio's clearance) → closed.
 * At most one report per joint and side stands (is not closed); the database keeps that with the expression index
 * `sore_joints_one_standing`, which entities cannot express.
 */
@Entity({ name: 'sore_joints' })
@Index('sore_joints_one_standing', { synchronize: false })
@Index('sore_joints_history_idx', { synchronize: false })
@Check(
  'sore_joints_joint_check',
  "joint in ('neck', 'shoulder', 'elbow', 'wrist', 'lowerBack', 'hip', 'knee', 'ankle')",
)
@Check(
  'sore_joints_side_check',
  "case when joint in ('neck', 'lowerBack') then side is null else side is not null and side in ('left', 'right') end",
)
@Check('sore_joints_rating_check', 'rating between 0 and 10')
@Check('sore_joints_state_check', "state in ('open', 'redFlag', 'closed')")
@Check('sore_joints_closed_check', "(state = 'closed') = (closed_at is not null)")
@Check('sore_joints_flagged_check', "state <> 'redFlag' or (cardinality(red_flags) > 0 and cleared_at is null)")
@Check('sore_joints_open_check', "state <> 'open' or cardinality(red_flags) = 0 or cleared_at is not null")
@Check('sore_joints_cleared_check', '(cleared_at is null) = (clearance_note is null)')
export class SoreJoint {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @ForeignKey(() => User, { name: 'sore_joints_athlete_id_fkey', onDelete: 'CASCADE' })
  @Column({ name: 'athlete_id', type: 'uuid' })
  athleteId!: string

  @Column({ name: 'joint', type: 'text' })
  joint!: Joint

  @Column({ name: 'side', type: 'text', nullable: true })
  side!: Side | null

  @Column({ name: 'rating', type: 'integer' })
  rating!: number

  @Column({ name: 'provocations', type: 'text', array: true })
  provocations!: Provocation[]

  /** Every red flag that stood at this report, including those carried over from the report before it. */
  @Column({ name: 'red_flags', type: 'text', array: true })
  redFlags!: RedFlag[]

  @Column({ name: 'note', type: 'text' })
  note!: string

  @Column({ name: 'day', type: 'date' })
  day!: string

  @Column({ name: 'state', type: 'text' })
  state!: SoreJointState

  @Column({ name: 'reported_at', type: 'timestamptz' })
  reportedAt!: Date

  @Column({ name: 'closed_at', type: 'timestamptz', nullable: true })
  closedAt!: Date | null

  @ForeignKey(() => User, { name: 'sore_joints_cleared_by_fkey', onDelete: 'SET NULL' })
  @Column({ name: 'cleared_by', type: 'uuid', nullable: true })
  clearedBy!: string | null

  @Column({ name: 'cleared_at', type: 'timestamptz', nullable: true })
  clearedAt!: Date | null

  @Column({ name: 'clearance_note', type: 'text', nullable: true })
  clearanceNote!: string | null
}
