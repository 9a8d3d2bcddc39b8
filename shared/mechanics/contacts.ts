import { ALL_SEGMENTS, type LimbIndex, type SegmentRef } from './bodies'
import type { ExerciseMechanics } from './definition'
import type { SolvedLeg } from './leg'
import type { Posture } from './posture'
import type { Vector } from './solution'
import { between, mean, unit } from './vector'
import type { Support } from './vocabulary'

/** Supports whose reaction statics can find; all others only hold what rests on them. */
export const SOLVABLE: readonly Support[] = [
  'handsHanging',
  'handsPushing',
  'forearms',
  'feet',
  'knees',
  'upperBack',
  'offHand',
  'offFoot',
]

const RESTING: Partial<Record<Support, SegmentRef['name'][]>> = {
  seat: ['pelvis', 'thigh'],
  backPad: ['upperTrunk', 'head'],
  chestPad: ['upperTrunk'],
  thighPad: ['thigh'],
  armPad: ['upperArm'],
  forearmPad: ['forearm'],
  shankPad: ['shank'],
}

/** One place where the body bears, on one segment. */
export interface Contact {
  support: Support
  segment: SegmentRef
  at: Vector
}

/** All contacts of one support; their reactions are equal. */
export interface ContactGroup {
  support: Support
  contacts: Contact[]
  /** Unit direction of the force it gives as the first of two. */
  push: Vector
}

/** Pressure centre of a foot flat on the ground, share of its length from the heel (quiet standing; from memory, medium). */
const MID_FOOT = 0.45
/** Ball of the foot, share of its length from the heel (from memory, medium). */
const BALL = 0.78
/** A sole steeper than this (degrees) stands on the ball or the heel. */
export const STEEP = 25
/** Where along the forearm a plank bears, from the elbow (our estimate). */
const FOREARM_BEARING = 0.2
/** Where along the upper trunk a bench edge bears, from L5/S1 (the lower shoulder blade; our estimate). */
const UPPER_BACK_BEARING = 0.75
/** Middle of a back flat on a wall or pad, from L5/S1 as a share of the upper trunk: half way from hip to shoulder (derived). */
const FLAT_BACK_BEARING = 0.375

/** Where a foot bears, given how its sole lies. */
function footContact(leg: SolvedLeg, footPoint: number | undefined): Vector {
  if (leg.soleAngle > STEEP) return between(leg.heel, leg.toe, BALL)
  if (leg.soleAngle < -STEEP) return leg.heel
  return between(leg.heel, leg.toe, footPoint ?? MID_FOOT)
}

/** Whether the whole back lies on a wall or sliding pad. */
export const flatBack = (mechanics: ExerciseMechanics): boolean => mechanics.firstPushes === 'squareToTrunk'

/** The way the ground pushes. */
export const UPRIGHT: Vector = [0, 0, 1]

/** Whether any support of the exercise is a pad or seat, which holds an unknown share. */
export const rests = (mechanics: ExerciseMechanics): boolean =>
  mechanics.supports.some((support) => !SOLVABLE.includes(support))

/**
 * Segments whose load on a pad, or on a contact beside a pad, cannot be told from statics.
 * Legs that push a load away with their feet lift off the seat: then it holds the pelvis alone.
 */
export function heldSegments(mechanics: ExerciseMechanics): SegmentRef[] {
  if (!rests(mechanics)) return []
  const legsPush = mechanics.loads.some((load) => load.at === 'feet')
  const groups = mechanics.supports.map((support): ((segment: SegmentRef) => boolean) => {
    const names = support === 'seat' && legsPush ? RESTING.seat?.filter((name) => name !== 'thigh') : RESTING[support]
    if (names) return (segment) => names.includes(segment.name)
    const limbs = bearingLimbs(mechanics, support)
    const name = BEARING_SEGMENT[support as keyof typeof BEARING_SEGMENT]
    return (segment) => segment.name === name && (segment.limb === undefined || limbs.includes(segment.limb))
  })
  return ALL_SEGMENTS.filter((segment) => groups.some((rest) => rest(segment)))
}

const BEARING_SEGMENT = {
  handsHanging: 'hand',
  handsPushing: 'hand',
  forearms: 'forearm',
  feet: 'foot',
  knees: 'shank',
  upperBack: 'upperTrunk',
  offHand: 'hand',
  offFoot: 'foot',
} as const

/** Which limbs of a support bear: both, unless the exercise is one-sided and the idle limb has a posture of its own. */
function bearingLimbs(mechanics: ExerciseMechanics, support: Support): LimbIndex[] {
  if (support === 'offHand' || support === 'offFoot') return [1]
  // One back, one place.
  if (support === 'upperBack') return [0]
  if (mechanics.sides === 'both') return [0, 1]
  const hands = support === 'handsHanging' || support === 'handsPushing' || support === 'forearms'
  if (hands) return [0]
  const ownLeg = mechanics.frames.some((frame) => frame.offLeg !== undefined)
  return ownLeg ? [0] : [0, 1]
}

/**
 * The contacts whose reactions statics must find; empty when the body rests on a seat or pad.
 * @param weightLine x of the centre of body and reference load
 */
export function contactGroups(mechanics: ExerciseMechanics, posture: Posture, weightLine: number): ContactGroup[] {
  if (rests(mechanics)) return []
  return mechanics.supports.map((support): ContactGroup => {
    const contacts = bearingLimbs(mechanics, support).map((limb): Contact => {
      const arm = posture.arms[limb]
      const leg = posture.legs[limb]
      const point = {
        handsHanging: arm.grip,
        handsPushing: arm.grip,
        offHand: arm.grip,
        forearms: between(arm.elbow, arm.wrist, FOREARM_BEARING),
        feet: footContact(leg, mechanics.balance?.footPoint),
        offFoot: footContact(leg, mechanics.balance?.footPoint),
        knees: leg.knee,
        upperBack: between(
          posture.lumbar,
          posture.neckBase,
          flatBack(mechanics) ? FLAT_BACK_BEARING : UPPER_BACK_BEARING,
        ),
      }[support as keyof typeof BEARING_SEGMENT]
      const name = BEARING_SEGMENT[support as keyof typeof BEARING_SEGMENT]
      return { support, at: point, segment: name === 'upperTrunk' ? { name } : { name, limb } }
    })
    const [x, , z] = mean(contacts.map(({ at }) => at))
    const push = {
      upright: UPRIGHT,
      inward: unit([weightLine - x, 0, posture.neckBase[2] - z]),
      squareToTrunk: posture.trunkAxes.forward,
    }[mechanics.firstPushes ?? 'upright']
    return { support, contacts, push }
  })
}
