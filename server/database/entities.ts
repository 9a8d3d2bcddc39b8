import { AuditEntry } from '../features/audit/entity'
import { PasswordReset, RefreshToken, SignIn } from '../features/auth/entity'
import { CatalogueState, Exercise, ExerciseVersion, RuleSetRow } from '../features/exercises/entity'
import { Flag } from '../features/flags/entity'
import { AthleteProfile, Club, Consent, Membership, User } from '../features/people/entity'
import { Place, PlaceEquipment } from '../features/places/entity'
import { Session, Slot } from '../features/sessions/entity'
import { SoreJoint } from '../features/sore-joints/entity'
import { Swap } from '../features/swaps/entity'

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
  Exercise,
  ExerciseVersion,
  RuleSetRow,
  CatalogueState,
  Place,
  PlaceEquipment,
  Session,
  Slot,
  SoreJoint,
  Swap,
  Flag,
]
