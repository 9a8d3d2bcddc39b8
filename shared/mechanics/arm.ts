import { planeOf, type PlaneAxes } from './arm-plane'
import type { Arm, Frame } from './definition'
import { MechanicsError } from './errors'
import { GRIP_ALONG_HAND, PALM_ALONG_HAND, type SegmentTable } from './segments'
import type { Vector } from './solution'
import type { TrunkAxes } from './trunk-axes'
import { foldAngle, turn } from './two-links'
import { add, degrees, dot, inPlane, radians, safeAcos, scale } from './vector'
import type { ArmPlane, Grip } from './vocabulary'
import { wristAxis, type WristAxis } from './wrist'

/** One arm with every joint placed, from the mid-hip point. */
export interface SolvedArm {
  shoulder: Vector
  elbow: Vector
  wrist: Vector
  /** Where the load or the ground meets the hand. */
  grip: Vector
  fingers: Vector
  /** Unit direction wrist → fingers. */
  handDirection: Vector
  plane: PlaneAxes
  /** +1 when elbow flexion turns the forearm toward growing θ in the plane, −1 when folded the other way. */
  elbowSign: 1 | -1
  wristAxis: WristAxis
  /** Whether the elbow's hinge lies in the plane, so that loads in the plane do not bend or straighten it. */
  hingeAcross: boolean
  /** degrees */
  angles: { shoulder: number; elbow: number; wrist: number }
}

interface ArmSetting {
  plane: ArmPlane
  grip: Grip
  table: SegmentTable
  /** Dotted path of the arm in the definition, for errors. */
  field: string
}

/** Angles of the upper arm and the forearm in the plane (radians from p), for a wrist bent by `bend` toward growing θ. */
function placeArm(
  arm: Arm,
  trunk: TrunkAxes,
  { p, q }: PlaneAxes,
  elbowSign: 1 | -1,
  bend: number,
  { plane, table, field }: ArmSetting,
): { upper: number; lower: number } {
  if ('hand' in arm && arm.hand !== undefined) {
    // A gripping hand is rigid with the forearm: together they make the second link, turned by `offset` from the forearm.
    const reach = arm.flat === undefined ? GRIP_ALONG_HAND * table.hand.length : 0
    const along = table.forearm.length + reach * Math.cos(bend)
    const across = reach * Math.sin(bend)
    const links = { first: table.upperArm.length, second: Math.hypot(along, across) }
    const offset = Math.atan2(across, along)
    const [u, v, x = 0] = arm.hand
    const target = plane === 'sagittal' ? ([u, 0, v] as Vector) : add(scale(trunk.lateral, u), [x, 0, v])
    const place: [number, number] =
      arm.from === 'world'
        ? [dot(target, p), dot(target, q)]
        : [u, arm.hand.length === 3 ? Math.hypot(v, x) * (v < 0 ? -1 : 1) : v]
    const { fold, atFirst } = foldAngle(links, Math.hypot(place[0], place[1]), `${field}.hand`)
    const upper = Math.atan2(place[1], place[0]) - elbowSign * atFirst
    return { upper, lower: upper + elbowSign * fold - offset }
  }
  if (arm.from === 'world' && plane !== 'sagittal') {
    throw new MechanicsError(
      'unsupported_combination',
      `${field}.from`,
      'Only sagittal arms can take their angles from the upright.',
    )
  }
  const angles = arm as { shoulder: number; elbow: number }
  const lean = arm.from === 'world' ? Math.atan2(trunk.up[0], trunk.up[2]) : 0
  const upper = radians(angles.shoulder) + lean
  return { upper, lower: upper + elbowSign * radians(angles.elbow) }
}

/**
 * Places one arm from its authored form.
 * @throws MechanicsError unreachable_endpoint when the hand's place is out of reach; unsupported_combination
 */
export function solveArm(arm: Arm, shoulder: Vector, trunk: TrunkAxes, setting: ArmSetting): SolvedArm {
  const { table } = setting
  const plane = planeOf(setting.plane, arm, trunk)
  const elbowSign = arm.elbowSide === 'reversed' ? -1 : 1
  const place = (bend: number) => placeArm(arm, trunk, plane, elbowSign, bend, setting)
  // What a bend of the wrist means depends on where the forearm points: ask with a straight wrist first.
  const straight = place(0)
  const wrist = wristAxis(setting.plane, setting.grip, straight.lower)
  const bend = arm.flat === undefined ? wrist.sign * radians(arm.wrist ?? 0) : 0
  const { upper, lower } = bend === 0 ? straight : place(bend)

  const elbow = add(shoulder, scale(inPlane(plane.p, plane.q, upper), table.upperArm.length))
  const forearm = inPlane(plane.p, plane.q, lower)
  const wristPoint = add(elbow, scale(forearm, table.forearm.length))
  const handDirection: Vector =
    arm.flat === undefined ? inPlane(plane.p, plane.q, lower + bend) : arm.flat === 'forward' ? [1, 0, 0] : [-1, 0, 0]
  const contact = arm.flat === undefined ? GRIP_ALONG_HAND * table.hand.length : PALM_ALONG_HAND * table.hand.length
  const flatBend = arm.flat === undefined ? 0 : -degrees(safeAcos(dot(forearm, handDirection)))
  return {
    shoulder,
    elbow,
    wrist: wristPoint,
    grip: add(wristPoint, scale(handDirection, contact)),
    fingers: add(wristPoint, scale(handDirection, table.hand.length)),
    handDirection,
    plane,
    elbowSign,
    wristAxis: wrist,
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
