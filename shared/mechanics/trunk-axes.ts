import type { Vector } from './solution'
import { radians } from './vector'

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
