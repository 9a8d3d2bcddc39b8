import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryGeneratedColumn, type Relation } from 'typeorm'
import { User } from '../people/entity'

/** One sign-in on one device: the family of all refresh tokens that descend from it. Revoking it ends it at once. */
@Entity({ name: 'sign_ins' })
@Index('sign_ins_user_id_idx', ['userId'])
export class SignIn {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ name: 'user_id', type: 'uuid' })
  userId!: string

  @ManyToOne(() => User, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'user_id', foreignKeyConstraintName: 'sign_ins_user_id_fkey' })
  user!: Relation<User>

  @Column({ name: 'created_at', type: 'timestamptz' })
  createdAt!: Date

  /** However often it is refreshed, it ends here. */
  @Column({ name: 'ends_at', type: 'timestamptz' })
  endsAt!: Date

  @Column({ name: 'revoked_at', type: 'timestamptz', nullable: true })
  revokedAt!: Date | null

  /** signedOut, tokenReused or passwordReset */
  @Column({ name: 'revoked_why', type: 'text', nullable: true })
  revokedWhy!: string | null
}

@Entity({ name: 'refresh_tokens' })
@Index('refresh_tokens_sign_in_id_idx', ['signInId'])
export class RefreshToken {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ name: 'sign_in_id', type: 'uuid' })
  signInId!: string

  @ManyToOne(() => SignIn, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'sign_in_id', foreignKeyConstraintName: 'refresh_tokens_sign_in_id_fkey' })
  signIn!: Relation<SignIn>

  /** SHA-256 of the token, hex; the token itself is kept nowhere. */
  @Index('refresh_tokens_token_hash_key', { unique: true })
  @Column({ name: 'token_hash', type: 'text' })
  tokenHash!: string

  @Column({ name: 'issued_at', type: 'timestamptz' })
  issuedAt!: Date

  @Column({ name: 'expires_at', type: 'timestamptz' })
  expiresAt!: Date

  /** When it was traded for the next one. */
  @Column({ name: 'used_at', type: 'timestamptz', nullable: true })
  usedAt!: Date | null
}

@Entity({ name: 'password_resets' })
@Index('password_resets_user_id_idx', ['userId'])
export class PasswordReset {
  @PrimaryGeneratedColumn('uuid')
  id!: string

  @Column({ name: 'user_id', type: 'uuid' })
  userId!: string

  @ManyToOne(() => User, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'user_id', foreignKeyConstraintName: 'password_resets_user_id_fkey' })
  user!: Relation<User>

  /** SHA-256 of the token, hex. */
  @Index('password_resets_token_hash_key', { unique: true })
  @Column({ name: 'token_hash', type: 'text' })
  tokenHash!: string

  @Column({ name: 'created_at', type: 'timestamptz' })
  createdAt!: Date

  @Column({ name: 'expires_at', type: 'timestamptz' })
  expiresAt!: Date

  @Column({ name: 'used_at', type: 'timestamptz', nullable: true })
  usedAt!: Date | null
}
