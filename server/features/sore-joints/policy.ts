import type { AthleteAccess } from '../people/access'
import type { SoreJointState } from './entity'

/** Only the body's owner says what is sore. */
export const canReport = (access: Pick<AthleteAccess, 'self'>): boolean => access.self

/** A standing red flag is not the athlete's to end. */
export const canClose = (access: Pick<AthleteAccess, 'self'>, state: SoreJointState): boolean =>
  access.self && state === 'open'

/** A physio who was let in, and never oneself. */
export const mayClear = (access: Pick<AthleteAccess, 'self' | 'physio'>): boolean => access.physio && !access.self

export const canClear = (access: Pick<AthleteAccess, 'self' | 'physio'>, state: SoreJointState): boolean =>
  mayClear(access) && state === 'redFlag'
