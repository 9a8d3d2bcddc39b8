import type { Arm } from './definition'
import type { Vector } from './solution'
import type { TrunkAxes } from './trunk-axes'
import { add, dot, scale, unit } from './vector'
import type { ArmPlane } from './vocabulary'

/** The plane an arm moves in: θ = 0 points along p, θ = 90° along q (see definition.ts). */
export interface PlaneAxes {
  p: Vector
  q: Vector
}

/** The plane as the trunk carries it. */
function armPlaneAxes(plane: ArmPlane, trunk: TrunkAxes): PlaneAxes {
  if (plane === 'transverse') return { p: trunk.lateral, q: trunk.forward }
  return { p: scale(trunk.up, -1), q: plane === 'sagittal' ? trunk.forward : trunk.lateral }
}

/**
 * The plane of a hand placed in world axes: for frontal and transverse arms it holds the lateral direction and the line from the
 * shoulder down (or up) to the hand, upright unless the hand lies ahead of or behind the shoulder. Of the line's two senses the one
 * nearer the trunk's own axis counts, so that shoulder angles keep their meaning upside down.
 */
function worldPlaneAxes(plane: ArmPlane, trunk: TrunkAxes, [, z, x = 0]: readonly number[]): PlaneAxes {
  if (plane === 'sagittal') return armPlaneAxes(plane, trunk)
  const line: Vector = x === 0 ? [0, 0, 1] : unit([x, 0, z ?? 0])
  const along = (wanted: Vector): Vector => scale(line, dot(line, wanted) < 0 ? -1 : 1)
  if (plane === 'frontal') return { p: along(scale(trunk.up, -1)), q: trunk.lateral }
  return { p: trunk.lateral, q: along(trunk.forward) }
}

/** The arm plane turned about p so that it holds a hand that lies off it: forward, outward or toward the head. */
function turnedPlaneAxes(plane: ArmPlane, trunk: TrunkAxes, [, v, off]: readonly [number, number, number]): PlaneAxes {
  const { p, q } = armPlaneAxes(plane, trunk)
  const offPlane = { frontal: trunk.forward, sagittal: trunk.lateral, transverse: trunk.up }[plane]
  const turned = unit(add(scale(q, v), scale(offPlane, off)))
  return { p, q: v < 0 ? scale(turned, -1) : turned }
}

/** The plane that one authored arm moves in. */
export function planeOf(plane: ArmPlane, arm: Arm, trunk: TrunkAxes): PlaneAxes {
  if (!('hand' in arm) || arm.hand === undefined) return armPlaneAxes(plane, trunk)
  if (arm.from === 'world') return worldPlaneAxes(plane, trunk, arm.hand)
  return arm.hand.length === 3 ? turnedPlaneAxes(plane, trunk, arm.hand) : armPlaneAxes(plane, trunk)
}
