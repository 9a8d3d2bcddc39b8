import type { Arm, Frame, Leg } from './definition'
import { MechanicsError } from './errors'
import type { SegmentTable } from './segments'
import { ANKLE_ALONG_FOOT, GRIP_ALONG_HAND, PALM_ALONG_HAND } from './segments'
import type { Vector } from './solution'
import { add, degrees, dot, inPlane, radians, safeAcos, scale, unit } from './vector'
import type { ArmPlane, Grip } from './vocabulary'

/** Directions of a trunk part: out of the head, out of the chest, and out of the limb's own side. */
export interface TrunkAxes {
  up: Vector
  forward: Vector
  lateral: Vector
}

/** Axes of a trunk part leaning `lean` degrees forward, for the side whose outward direction is `lateral`. */
export function trunkAxes(lean: number, lateral: Vector): TrunkAxes {
  const t = radians(lean)
  return { up: [Math.sin(t), 0, Math.cos(t)], forward: [Math.cos(t), 0, -Math.sin(t)], lateral }
}

/** The plane an arm moves in: θ = 0 points along p, θ = 90° along q (see definition.ts). */
export function armPlaneAxes(plane: ArmPlane, trunk: TrunkAxes): { p: Vector; q: Vector } {
  if (plane === 'transverse') return { p: trunk.lateral, q: trunk.forward }
  return { p: scale(trunk.up, -1), q: plane === 'sagittal' ? trunk.forward : trunk.lateral }
}

/**
 * The plane of a hand placed in world axes: for frontal and transverse arms it holds the lateral direction and the line from the
 * shoulder down (or up) to the hand, upright unless the hand lies ahead of or behind the shoulder.
 */
function worldPlaneAxes(plane: ArmPlane, trunk: TrunkAxes, [, z, x = 0]: readonly number[]): { p: Vector; q: Vector } {
  if (plane === 'sagittal') return armPlaneAxes(plane, trunk)
  const line: Vector = x === 0 ? [0, 0, 1] : unit([x, 0, z ?? 0])
  const along = (wanted: Vector): Vector => scale(line, dot(line, wanted) < 0 ? -1 : 1)
  if (plane === 'frontal') return { p: along([0, 0, -1]), q: trunk.lateral }
  return { p: trunk.lateral, q: along(trunk.forward) }
}

/** The arm plane turned about p so that it holds a hand that lies off it: forward, outward or toward the head. */
function turnedPlaneAxes(plane: ArmPlane, trunk: TrunkAxes, [, v, off]: readonly [number, number, number]) {
  const { p, q } = armPlaneAxes(plane, trunk)
  const offPlane = { frontal: trunk.forward, sagittal: trunk.lateral, transverse: trunk.up }[plane]
  const turned = unit(add(scale(q, v), scale(offPlane, off)))
  return { p, q: v < 0 ? scale(turned, -1) : turned }
}

/**
 * What turning the hand in the arm plane toward growing θ means at the wrist, from where the palm faces.
 * Trade and anatomy, no source: in the anatomical position the palm looks forward, pronated it looks back,
 * in neutral it looks at the thigh.
 */
export const WRIST_IN_PLANE: Readonly<
  Record<ArmPlane, Record<Exclude<Grip, 'none'>, { axis: 'wristFlexion' | 'wristDeviation'; sign: 1 | -1 }>>
> = {
  sagittal: {
    overhand: { axis: 'wristFlexion', sign: -1 },
    underhand: { axis: 'wristFlexion', sign: 1 },
    neutral: { axis: 'wristDeviation', sign: 1 },
  },
  frontal: {
    overhand: { axis: 'wristDeviation', sign: -1 },
    underhand: { axis: 'wristDeviation', sign: 1 },
    neutral: { axis: 'wristFlexion', sign: -1 },
  },
  transverse: {
    overhand: { axis: 'wristDeviation', sign: 1 },
    underhand: { axis: 'wristDeviation', sign: -1 },
    neutral: { axis: 'wristFlexion', sign: 1 },
  },
}

export interface SolvedArm {
  shoulder: Vector
  elbow: Vector
  wrist: Vector
  /** Where the load or the ground meets the hand. */
  grip: Vector
  fingers: Vector
  /** Unit direction wrist → fingers. */
  handDirection: Vector
  plane: { p: Vector; q: Vector }
  /** +1 when elbow flexion turns the forearm toward growing θ in the plane, −1 when folded the other way. */
  elbowSign: 1 | -1
  /** Whether the elbow's hinge lies in the plane, so that loads in the plane do not bend or straighten it. */
  hingeAcross: boolean
  /** degrees */
  angles: { shoulder: number; elbow: number; wrist: number }
}

interface TwoLinks {
  first: number
  second: number
}

/** Angle between two links of a triangle whose third side is `distance`; refuses what they cannot span. */
function foldAngle({ first, second }: TwoLinks, distance: number, field: string): { fold: number; atFirst: number } {
  if (distance > first + second || distance < Math.abs(first - second)) {
    throw new MechanicsError(
      'unreachable_endpoint',
      field,
      `This place is ${distance.toFixed(3)} of stature away; the limb spans ${Math.abs(first - second).toFixed(3)} to ${(first + second).toFixed(3)}. Move it into reach.`,
    )
  }
  return {
    fold: Math.PI - safeAcos((first * first + second * second - distance * distance) / (2 * first * second)),
    atFirst: safeAcos((first * first + distance * distance - second * second) / (2 * first * distance)),
  }
}

function planeOf(plane: ArmPlane, arm: Arm, trunk: TrunkAxes): { p: Vector; q: Vector } {
  if (!('hand' in arm) || arm.hand === undefined) return armPlaneAxes(plane, trunk)
  if (arm.from === 'world') return worldPlaneAxes(plane, trunk, arm.hand)
  return arm.hand.length === 3 ? turnedPlaneAxes(plane, trunk, arm.hand) : armPlaneAxes(plane, trunk)
}

/**
 * Places one arm from its authored form.
 * @throws MechanicsError unreachable_endpoint when the hand's place is out of reach.
 */
export function solveArm(
  arm: Arm,
  shoulder: Vector,
  trunk: TrunkAxes,
  setting: { plane: ArmPlane; grip: Grip; table: SegmentTable; field: string },
): SolvedArm {
  const { table, field } = setting
  const plane = planeOf(setting.plane, arm, trunk)
  const elbowSign = arm.elbowSide === 'reversed' ? -1 : 1
  const wristSign = WRIST_IN_PLANE[setting.plane][setting.grip === 'none' ? 'neutral' : setting.grip].sign
  const bend = arm.flat === undefined ? wristSign * radians(arm.wrist ?? 0) : 0
  const reach = GRIP_ALONG_HAND * table.hand.length
  // A gripping hand is rigid with the forearm: together they make the second link, turned by `offset` from the forearm.
  const along = arm.flat === undefined ? table.forearm.length + reach * Math.cos(bend) : table.forearm.length
  const across = arm.flat === undefined ? reach * Math.sin(bend) : 0
  const second = Math.hypot(along, across)
  const offset = Math.atan2(across, along)

  let upper: number
  let lower: number
  if ('hand' in arm && arm.hand !== undefined) {
    const [u, v, x = 0] = arm.hand
    const target = setting.plane === 'sagittal' ? ([u, 0, v] as Vector) : add(scale(trunk.lateral, u), [x, 0, v])
    const place: [number, number] =
      arm.from === 'world'
        ? [dot(target, plane.p), dot(target, plane.q)]
        : [u, arm.hand.length === 3 ? Math.hypot(v, x) * (v < 0 ? -1 : 1) : v]
    const { fold, atFirst } = foldAngle(
      { first: table.upperArm.length, second },
      Math.hypot(place[0], place[1]),
      `${field}.hand`,
    )
    upper = Math.atan2(place[1], place[0]) - elbowSign * atFirst
    lower = upper + elbowSign * fold - offset
  } else {
    const angles = arm as { shoulder: number; elbow: number }
    if (arm.from === 'world' && setting.plane !== 'sagittal') {
      throw new MechanicsError(
        'unsupported_combination',
        `${field}.from`,
        'Only sagittal arms can take their angles from the upright.',
      )
    }
    const lean = arm.from === 'world' ? Math.atan2(trunk.up[0], trunk.up[2]) : 0
    upper = radians(angles.shoulder) + lean
    lower = upper + elbowSign * radians(angles.elbow)
  }

  const elbow = add(shoulder, scale(inPlane(plane.p, plane.q, upper), table.upperArm.length))
  const forearm = inPlane(plane.p, plane.q, lower)
  const wrist = add(elbow, scale(forearm, table.forearm.length))
  const handDirection: Vector =
    arm.flat === undefined ? inPlane(plane.p, plane.q, lower + bend) : arm.flat === 'forward' ? [1, 0, 0] : [-1, 0, 0]
  const contact = arm.flat === undefined ? reach : PALM_ALONG_HAND * table.hand.length
  const flatBend = arm.flat === undefined ? 0 : -degrees(safeAcos(dot(forearm, handDirection)))
  return {
    shoulder,
    elbow,
    wrist,
    grip: add(wrist, scale(handDirection, contact)),
    fingers: add(wrist, scale(handDirection, table.hand.length)),
    handDirection,
    plane,
    elbowSign,
    hingeAcross: arm.elbowSide === 'across',
    angles: {
      shoulder: turn(degrees(upper) - 90) + 90,
      elbow: elbowSign * turn(degrees(lower - upper)),
      wrist: arm.flat === undefined ? (arm.wrist ?? 0) : flatBend,
    },
  }
}

/** An arm hanging relaxed: straight down in the world whatever the trunk does. */
export const relaxedArm = (trunk: Frame['trunk']): Arm => ({ shoulder: trunk.lean + (trunk.lumbar ?? 0), elbow: 0 })

export interface SolvedLeg {
  hip: Vector
  knee: Vector
  ankle: Vector
  heel: Vector
  toe: Vector
  /** Unit direction heel → toe. */
  soleDirection: Vector
  /** World angle of the sole, degrees, toes down positive. */
  soleAngle: number
  angles: { hip: number; knee: number; ankle: number }
}

/**
 * Places one leg from its authored form.
 * @throws MechanicsError unreachable_endpoint when the ankle's place is out of reach.
 */
export function solveLeg(leg: Leg, hip: Vector, pelvis: TrunkAxes, table: SegmentTable, field: string): SolvedLeg {
  const down = scale(pelvis.up, -1)
  let upper: number
  let lower: number
  if ('thigh' in leg && leg.thigh !== undefined) {
    // World angles: 0 is straight down; hip flexion is what is left after the pelvis' own lean.
    const lean = Math.atan2(pelvis.up[0], pelvis.up[2])
    upper = radians(leg.thigh) + lean
    lower = radians(leg.shank) + lean
  } else if ('hip' in leg && leg.hip !== undefined) {
    upper = radians(leg.hip)
    lower = upper - radians(leg.knee)
  } else {
    const { ankle: place, from } = leg as { ankle: [number, number]; from?: 'world' | 'trunk' }
    const target: Vector =
      from === 'trunk' ? add(scale(pelvis.forward, place[0]), scale(pelvis.up, place[1])) : [place[0], 0, place[1]]
    const links = { first: table.thigh.length, second: table.shank.length }
    const { fold, atFirst } = foldAngle(links, Math.hypot(place[0], place[1]), `${field}.ankle`)
    upper = Math.atan2(dot(target, pelvis.forward), dot(target, down)) + atFirst
    lower = upper - fold
  }
  const knee = add(hip, scale(inPlane(down, pelvis.forward, upper), table.thigh.length))
  const shank = inPlane(down, pelvis.forward, lower)
  const ankle = add(knee, scale(shank, table.shank.length))
  // Square to the shank on its front side, in the sagittal plane.
  const front: Vector = [-shank[2], 0, shank[0]]
  const plantar = 'hip' in leg && leg.hip !== undefined && leg.foot === undefined ? radians(leg.ankle ?? 0) : undefined
  const sole =
    plantar === undefined
      ? ([Math.cos(radians(leg.foot ?? 0)), 0, -Math.sin(radians(leg.foot ?? 0))] as Vector)
      : unit(inPlane(front, shank, plantar))
  const below: Vector = [sole[2], 0, -sole[0]]
  const base = add(ankle, scale(below, table.ankleHeight))
  return {
    hip,
    knee,
    ankle,
    heel: add(base, scale(sole, -ANKLE_ALONG_FOOT * table.foot.length)),
    toe: add(base, scale(sole, (1 - ANKLE_ALONG_FOOT) * table.foot.length)),
    soleDirection: sole,
    soleAngle: degrees(Math.atan2(-sole[2], sole[0])),
    angles: {
      hip: turn(degrees(upper)),
      knee: turn(degrees(upper - lower)),
      ankle: degrees(Math.atan2(dot(sole, shank), dot(sole, front))),
    },
  }
}

/** The same angle within (−180, 180]. */
const turn = (angle: number): number => angle - 360 * Math.ceil((angle - 180) / 360)
