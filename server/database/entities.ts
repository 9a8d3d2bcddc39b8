import { AuditEntry } from '../features/audit/entity'
import { PasswordReset, RefreshToken, SignIn } from '../features/auth/entity'
import { AthleteProfile, Club, Consent, Membership, User } from '../features/people/entity'

/** Every entity by name; a glob would break in the built server. */
export const entities = [
  Club,
  User,
  Membership,
  AthleteProfile,
  Consent,
  SignIn,
  RefreshToken,
  PasswordReset,
  AuditEntry,
]
