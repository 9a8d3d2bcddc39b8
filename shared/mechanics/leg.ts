import type { Leg } from './definition'
import { ANKLE_ALONG_FOOT, type SegmentTable } from './segments'
import type { Vector } from './solution'
import type { TrunkAxes } from './trunk-axes'
import { foldAngle, turn } from './two-links'
import { add, degrees, dot, inPlane, radians, scale, unit } from './vector'

/** One leg with every joint placed, from the mid-hip point. */
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
