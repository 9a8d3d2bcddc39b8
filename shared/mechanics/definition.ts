import type { Action, ArmPlane, Grip, GripWidth, Guidance, Support } from './vocabulary'

/**
 * What a coach authors: the geometry of an exercise. Angles in degrees, lengths in fractions of stature,
 * loads in kg (their places and directions here, their size at run time).
 *
 * World axes: x forward (the way a standing athlete faces), y to the athlete's left, z up.
 * Trunk axes: `up` from pelvis to head, `forward` out of the chest, `lateral` out of the limb's own side.
 * With trunk lean t: up = (sin t, 0, cos t), forward = (cos t, 0, −sin t). Standing is 0, prone (head forward) 90,
 * supine −90, upside down 180.
 *
 * An arm moves in one plane spanned by (p, q): sagittal p = −up, q = forward; frontal p = −up, q = lateral;
 * transverse p = lateral, q = forward. A shoulder angle θ points the upper arm along p·cos θ + q·sin θ, and the
 * elbow's flexion adds to it, so that 0 hangs beside the trunk (sagittal, frontal) or points sideways (transverse).
 */
export interface ExerciseMechanics {
  guidance: Guidance
  /** oneAtATime: the frames describe the working side; the other limb follows `offArm` and `offLeg`. */
  sides: 'both' | 'oneAtATime'
  grip: Grip
  gripWidth: GripWidth
  armPlane: ArmPlane
  /**
   * Of two that bear, the first only pushes, and the second also takes sideways pull and twist: name the hand, forearms or bench
   * first and the feet, whose base is wide, second.
   */
  supports: Support[]
  /** Height of the first support above the second when two bear (a hand on a low bar, a foot on a bench), × stature. */
  rise?: number
  /**
   * Which way the first of two supports pushes. Upright (the ground under a plank, a bench edge, a bar) unless said.
   * `inward`, as feet far apart push against the floor's friction: statics leaves the friction open, so both forces are taken
   * to meet on the line of weight at shoulder height (they must meet on that line to balance; the height is our rule: above
   * the mass centre, as in walking).
   * `squareToTrunk` is a wall or sliding back pad that pushes out of the middle of the back alone: then no `rise` applies and
   * there is nothing to balance, and the back, flat on its pad from pelvis to shoulders, asks nothing of the trunk muscles.
   */
  firstPushes?: 'upright' | 'inward' | 'squareToTrunk'
  /** Two to four postures through the repetition, in order. */
  frames: Frame[]
  balance?: Balance
  loads: LoadPath[]
  moments?: DirectMoment[]
  /** Load at which the posture is balanced, as a share of body mass (negative is assistance). */
  referenceLoad: number
  /** Straps, hooks or a cuff carry the hand, so that the grip does not. */
  gripFree?: boolean
  /** The head lies on the floor or on its pad, so that the neck does not carry it; its weight stays with the body. */
  headRests?: boolean
}

export interface Frame {
  name: string
  trunk: Trunk
  arms: Arm
  /** The idle arm of a one-sided exercise; hanging relaxed beside the trunk when left out. */
  offArm?: Arm
  legs: Leg
  /** The idle leg of a one-sided exercise; like the working leg when left out. */
  offLeg?: Leg
}

export interface Trunk {
  /** Lean of the pelvis from upright, −180 to 180. The starting guess when `balance` solves it. */
  lean: number
  /** Flexion of the upper trunk against the pelvis; negative is extension. */
  lumbar?: number
  /** Flexion of the head against the upper trunk. */
  neck?: number
}

/**
 * An arm by its hand's place or by its joint angles.
 * `hand` is [along p, along q] from the shoulder in the arm plane; a third number lies off that plane (forward for frontal
 * arms, outward for sagittal, toward the head for transverse), and the plane then turns about p to hold the hand.
 * With `from: world` it is [x, z] for sagittal arms and [outward, z] or [outward, z, x] for the others: their plane then holds
 * both shoulders and both hands, and stands upright when x is left out.
 * For a gripping hand the place is the middle of the grip, for a flat hand the wrist.
 * Angles with `from: world` (sagittal arms) count from the upright instead of from the trunk: shoulder 0 hangs straight down
 * however far the trunk leans.
 */
export type Arm = ({ hand: [number, number] | [number, number, number] } | { shoulder: number; elbow: number }) & {
  from?: 'trunk' | 'world'
  /**
   * `reversed` folds the forearm the other way round in the arm plane (a forearm hanging from an abducted arm).
   * `across` is a nearly straight elbow whose hinge lies in the arm plane (a palm-down lateral raise): loads in that plane
   * bend it sideways, which bone and ligament carry, and ask neither flexion nor extension of it.
   */
  elbowSide?: 'flexed' | 'reversed' | 'across'
  /** Bend of a gripping hand in the arm plane: flexion, or radial deviation where that is what the plane allows. */
  wrist?: number
  /** A hand flat on the ground, fingers along world +x (forward) or −x. */
  flat?: 'forward' | 'backward'
}

/**
 * A leg by its ankle's place, by its segments' world angles or by its joint angles.
 * `ankle` as a pair is [x, z] from the hip in world axes (`from: trunk`: [forward, up] of the pelvis).
 * `thigh` and `shank` are world angles: 0 points straight down, positive swings the lower end forward.
 * `hip`, `knee` and `ankle` as numbers are flexion, flexion and plantarflexion from the right angle.
 * `foot` is the sole's world angle, toes down positive; flat (0) when left out, except that with joint angles the
 * ankle angle (0 when left out) decides unless `foot` is given.
 */
export type Leg =
  | { ankle: [number, number]; from?: 'world' | 'trunk'; foot?: number }
  | { thigh: number; shank: number; foot?: number }
  | { hip: number; knee: number; ankle?: number; foot?: number }

/** The one angle the engine solves in every frame so that the posture can be held. */
export interface Balance {
  /** trunk: lean of the trunk; arms: turn of the arms about the shoulders; legs: turn of the legs about the hips. */
  solve: 'trunk' | 'arms' | 'legs'
  /** Search range as change from the authored posture, degrees; ±60 when left out. */
  range?: [number, number]
  /** Where along the foot the pressure should lie, 0 heel to 1 toe tip. */
  footPoint?: number
}

/** One way the external load L acts on the body; the force is ratio × L × g. */
export interface LoadPath {
  at: 'hands' | 'offHand' | 'shoulders' | 'hips' | 'feet' | 'head' | 'upperArm' | 'forearm' | 'thigh' | 'shank'
  /** total: L is shared by both sides; each: L is carried by each side (a pair of dumbbells). */
  share?: 'total' | 'each'
  direction:
    | 'down'
    | 'up'
    /** Degrees from world +x, counter-clockwise seen from the athlete's right (90 is up). */
    | { angle: number }
    /** Toward a pulley at [x, z] (world, × stature) from the hip, shoulder or ankle of this frame; `lateral` outward. */
    | { toward: [number, number]; of: 'hip' | 'shoulder' | 'ankle'; lateral?: number }
    /** Square to the segment named in `at`, in its own plane: `extending` pushes it toward extension. */
    | { square: 'flexing' | 'extending' }
  /** Pulley ratio or share of the load that acts (sled angle, lever). */
  ratio?: number
  /** Place along the segment from its upper end, 0–1, for pads; or offset [up, forward] in trunk axes for shoulders and hips. */
  along?: number
  offset?: [number, number]
}

/** A lever machine or cuff that loads one action directly: moment = L × g × arm × curve. */
export interface DirectMoment {
  /** The action that must answer the load. */
  action: Action
  /** Lever arm in fractions of stature. */
  arm: number
  ratio?: number
  /** Factor per frame (resistance curve), 1 when left out. */
  curve?: number[]
  share?: 'total' | 'each'
}
