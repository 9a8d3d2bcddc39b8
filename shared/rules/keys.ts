import type { ExerciseMechanics } from '../mechanics/definition'
import { ACTIONS, GRIPS, type Action, type Grip } from '../mechanics/vocabulary'

/**
 * Keys of the packed format: what an effort is measured against. Every action has one; elbow flexion has one per grip, because
 * the grip turns its muscles' roles, and the wrist's actions have a second one for a hand that is carried.
 */
const CARRIED: readonly Action[] = ['wristFlexion', 'wristExtension', 'wristRadialDeviation', 'wristUlnarDeviation']
export const KEYS: ReadonlyArray<{ action: Action | null; grip: Grip | null; carried: boolean }> = [
  ...ACTIONS.map((action) => ({ action, grip: null, carried: false })),
  ...GRIPS.map((grip) => ({ action: 'elbowFlexion' as const, grip, carried: false })),
  ...CARRIED.map((action) => ({ action, grip: null, carried: true })),
  { action: null, grip: null, carried: false },
  { action: null, grip: null, carried: false },
]
/** The side of an axis that no muscle answers. */
export const NOBODY = KEYS.length - 2
/** The push on a hand that counts as 1. */
export const PUSH = KEYS.length - 1

const FIRST_GRIP = ACTIONS.length
const FIRST_CARRIED = FIRST_GRIP + GRIPS.length

/** The key of an action as an exercise finds it. */
export function keyOf(action: Action | null, { grip, gripFree }: Pick<ExerciseMechanics, 'grip' | 'gripFree'>): number {
  if (action === null) return NOBODY
  if (action === 'elbowFlexion') return FIRST_GRIP + GRIPS.indexOf(grip)
  const carried = gripFree ? CARRIED.indexOf(action) : -1
  return carried >= 0 ? FIRST_CARRIED + carried : ACTIONS.indexOf(action)
}
