import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Pose, Vector } from '#shared/mechanics/solution'
import type { Side, Support } from '#shared/mechanics/vocabulary'
import { add, between, cross, dot, length, scale, subtract, unit } from '../geometry'

/** The frames of a one-sided exercise describe the right side, which is the near one. */
export const WORKING: Side = 'right'
export const IDLE: Side = 'left'
export const BOTH: readonly Side[] = ['right', 'left']

/** How far the skin lies from the bone's line where something bears on it, in fractions of stature. */
export const SKIN = {
  chest: 0.066,
  back: 0.066,
  buttock: 0.07,
  thigh: 0.046,
  shank: 0.027,
  upperArm: 0.03,
  forearm: 0.021,
}

export const workingSides = (mechanics: ExerciseMechanics): readonly Side[] =>
  mechanics.sides === 'both' ? BOTH : [WORKING]
export const bearsOn = (mechanics: ExerciseMechanics, ...supports: Support[]): boolean =>
  supports.some((support) => mechanics.supports.includes(support))

export const handsLieFlat = (mechanics: ExerciseMechanics): boolean =>
  mechanics.grip === 'none' || mechanics.frames.some((frame) => frame.arms.flat !== undefined)

/** Sides whose hand bears weight. */
export function bearingHands(mechanics: ExerciseMechanics): readonly Side[] {
  if (bearsOn(mechanics, 'handsHanging', 'handsPushing')) return workingSides(mechanics)
  return bearsOn(mechanics, 'offHand') ? [IDLE] : []
}

/** The direction of whatever a hand closes round: across for over- and underhand, fore and aft for neutral. */
export function gripAxis(pose: Pose, side: Side, mechanics: ExerciseMechanics): Vector {
  const hand = unit(subtract(pose[`${side}.grip`], pose[`${side}.wrist`]))
  const lateral: Vector = [0, 1, 0]
  const foreAndAft = unit(cross(hand, lateral), [1, 0, 0])
  if (mechanics.grip === 'neutral') return foreAndAft
  const across = subtract(lateral, scale(hand, dot(hand, lateral)))
  return length(across) < 0.5 ? foreAndAft : unit(across)
}

export const middleOf = (
  pose: Pose,
  name: 'grip' | 'shoulder' | 'hip' | 'knee' | 'ankle' | 'toe' | 'heel' | 'wrist',
): Vector => between(pose[`left.${name}`], pose[`right.${name}`], 0.5)

/** The direction out of the front of a limb: the way its distal joint bends, square to the limb, in the limb's plane. */
export function frontOfThigh(pose: Pose, side: Side): Vector {
  const thigh = unit(subtract(pose[`${side}.knee`], pose[`${side}.hip`]))
  // Seen from the right, a quarter turn from a hanging thigh (down) to the athlete's front.
  return unit([-thigh[2], 0, thigh[0]], [1, 0, 0])
}
export function frontOfShank(pose: Pose, side: Side): Vector {
  const shank = unit(subtract(pose[`${side}.ankle`], pose[`${side}.knee`]))
  return unit([-shank[2], 0, shank[0]], [1, 0, 0])
}
export const outward = (side: Side): Vector => [0, side === 'left' ? 1 : -1, 0]
export const lift = (place: Vector, by: number): Vector => add(place, [0, 0, by])
