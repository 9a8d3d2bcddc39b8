import {
  Check,
  Column,
  CreateDateColumn,
  Entity,
  ForeignKey,
  Index,
  JoinColumn,
  ManyToOne,
  OneToMany,
  OneToOne,
  PrimaryColumn,
  PrimaryGeneratedColumn,
  type Relation,
} from 'typeorm'
import type { Role } from '#shared/contract/me'
import type { Action } from '#shared/mechanics/vocabulary'
import type { Sex } from '#shared/mechanics/sex'
import type { ExerciseDocument } from '#shared/contract/exercise'
import { Place } from '../places/entity'

@Entity({ name: 'clubs' })
export class Club {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ type: 'text' })
  name!: string

  @CreateDateColumn({ name: 'created_at', type: 'timestamptz' })
  createdAt!: Date
}

@Entity({ name: 'users' })
export class User {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ type: 'text' })
  name!: string

  /** Always in lower case, so that one address is one person. */
  @Index('users_email_key', { unique: true })
  @Column({ type: 'text' })
  email!: string

  /** Argon2id. */
  @Column({ name: 'password_hash', type: 'text' })
  passwordHash!: string

  @Column({ type: 'text', default: 'metric' })
  units!: 'metric' | 'imperial'

  @ForeignKey(() => Place, { name: 'users_default_place_id_fkey', onDelete: 'SET NULL' })
  @Column({ name: 'default_place_id', type: 'uuid', nullable: true })
  defaultPlaceId!: string | null

  @CreateDateColumn({ name: 'created_at', type: 'timestamptz' })
  createdAt!: Date

  @OneToMany(() => Membership, (membership) => membership.user)
  memberships!: Relation<Membership>[]

  @OneToOne(() => AthleteProfile, (profile) => profile.user)
  athleteProfile!: Relation<AthleteProfile> | null
}

/** A role in a club. One person may hold several, in one club or in many. */
@Entity({ name: 'memberships' })
@Check('memberships_role_check', `role in ('athlete', 'coach', 'physio', 'admin')`)
@Index('memberships_user_id_club_id_role_key', ['userId', 'clubId', 'role'], { unique: true })
@Index('memberships_club_id_role_idx', ['clubId', 'role'])
export class Membership {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ name: 'user_id', type: 'uuid' })
  userId!: string

  @ManyToOne(() => User, (user) => user.memberships, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'user_id', foreignKeyConstraintName: 'memberships_user_id_fkey' })
  user!: Relation<User>

  @Column({ name: 'club_id', type: 'uuid' })
  clubId!: string

  @ManyToOne(() => Club, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'club_id', foreignKeyConstraintName: 'memberships_club_id_fkey' })
  club!: Relation<Club>

  @Column({ type: 'text' })
  role!: Role

  @CreateDateColumn({ name: 'created_at', type: 'timestamptz' })
  createdAt!: Date
}

/** What the engine needs to know of an athlete. There is no row until the athlete has filled it in. */
@Entity({ name: 'athlete_profiles' })
@Check('athlete_profiles_sex_check', `sex in ('male', 'female', 'unspecified')`)
@Check('athlete_profiles_skill_check', `skill in ('beginner', 'intermediate', 'advanced')`)
export class AthleteProfile {
  @PrimaryColumn({ name: 'user_id', type: 'uuid' })
  userId!: string

  @OneToOne(() => User, (user) => user.athleteProfile, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'user_id', foreignKeyConstraintName: 'athlete_profiles_user_id_fkey' })
  user!: Relation<User>

  @Column({ type: 'text' })
  sex!: Sex

  /** kg */
  @Column({ name: 'body_mass', type: 'double precision' })
  bodyMass!: number

  /** m */
  @Column({ type: 'double precision' })
  stature!: number

  @Column({ name: 'birth_date', type: 'date' })
  birthDate!: string

  /** Highest skill grade they can be given. */
  @Column({ type: 'text', default: 'beginner' })
  skill!: ExerciseDocument['skill']

  /** Own strength against the norm per action; empty until it was fitted. */
  @Column({ name: 'strength_factors', type: 'jsonb', default: {} })
  strengthFactors!: Partial<Record<Action, number>>

  @Column({ name: 'updated_at', type: 'timestamptz', default: () => 'now()' })
  updatedAt!: Date
}

/** An athlete lets a coach or physio in. It stands while `revokedAt` is null; ended ones are kept as history. */
@Entity({ name: 'consents' })
@Index('consents_standing_key', ['athleteId', 'carerId'], { unique: true, where: 'revoked_at is null' })
@Index('consents_carer_id_idx', ['carerId'])
export class Consent {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ name: 'athlete_id', type: 'uuid' })
  athleteId!: string

  @ManyToOne(() => User, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'athlete_id', foreignKeyConstraintName: 'consents_athlete_id_fkey' })
  athlete!: Relation<User>

  @Column({ name: 'carer_id', type: 'uuid' })
  carerId!: string

  @ManyToOne(() => User, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'carer_id', foreignKeyConstraintName: 'consents_carer_id_fkey' })
  carer!: Relation<User>

  @Column({ name: 'granted_at', type: 'timestamptz' })
  grantedAt!: Date

  @Column({ name: 'revoked_at', type: 'timestamptz', nullable: true })
  revokedAt!: Date | null
}
