import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation } from 'typeorm'
import { User } from '../people/entity'

/** One line of the trail. Rows are only ever added. */
@Entity({ name: 'audit_entries' })
@Index('audit_entries_at_id_idx', ['at', 'id'])
@Index('audit_entries_subject_id_idx', ['subjectId'])
export class AuditEntry {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ type: 'timestamptz', precision: 3, default: () => 'clock_timestamp()' })
  at!: Date

  @Column({ name: 'actor_id', type: 'uuid', nullable: true })
  actorId!: string | null

  @ManyToOne(() => User, { onDelete: 'SET NULL' })
  @JoinColumn({ name: 'actor_id', foreignKeyConstraintName: 'audit_entries_actor_id_fkey' })
  actor!: Relation<User> | null

  /** verb.object */
  @Column({ type: 'text' })
  action!: string

  @Column({ name: 'subject_id', type: 'uuid', nullable: true })
  subjectId!: string | null

  @ManyToOne(() => User, { onDelete: 'SET NULL' })
  @JoinColumn({ name: 'subject_id', foreignKeyConstraintName: 'audit_entries_subject_id_fkey' })
  subject!: Relation<User> | null

  /** Clubs of the subject (of the actor when there is none) at that time: their admins may read the line. */
  @Column({ name: 'club_ids', type: 'uuid', array: true })
  clubIds!: string[]

  /** Names and ids only. */
  @Column({ type: 'jsonb', default: {} })
  details!: Record<string, string>
}
