import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Pose, Vector } from '#shared/mechanics/solution'
import type { Side } from '#shared/mechanics/vocabulary'
import { LEFTWARD, limbBias } from '../body'
import { add, scale, subtract } from '../geometry'
import type { Shape } from '../scene'
import { disc, layerAt, line, rod } from '../solids'
import type { View } from '../view'
import { gripAxis } from './places'

const PLATE = 0.095
const HALF_BAR = 0.3

/** A barbell with its middle at a place; the near plate is drawn over the body, see-through. */
export function barbell(view: View, middle: Vector): Shape[] {
  const near = add(middle, scale(LEFTWARD, -HALF_BAR))
  const far = add(middle, scale(LEFTWARD, HALF_BAR))
  return [
    disc(view, 'plate', far, LEFTWARD, PLATE, 0.02, -4),
    rod(view, 'rod', add(near, [0, -0.05, 0]), far, 0.008, layerAt(view, middle) - 0.001),
    disc(view, 'plate', near, LEFTWARD, PLATE, 0.02, 4),
    rod(view, 'rod', near, add(near, [0, -0.05, 0]), 0.008, 4.1),
  ]
}

export function dumbbell(view: View, pose: Pose, side: Side, mechanics: ExerciseMechanics): Shape[] {
  const grip = pose[`${side}.grip`]
  const axis = gripAxis(pose, side, mechanics)
  const layer = layerAt(view, grip) + limbBias(view, side) + 0.03
  const ends = [subtract(grip, scale(axis, 0.06)), add(grip, scale(axis, 0.06))] as const
  return [
    rod(view, 'rod', ends[0], ends[1], 0.008, layer),
    ...ends.map((end) => disc(view, 'plate', end, axis, 0.036, 0.04, layer + layerAt(view, end) - layerAt(view, grip))),
  ]
}

/** One dumbbell between both hands. */
export function sharedDumbbell(view: View, middle: Vector, axis: Vector): Shape[] {
  const ends = [subtract(middle, scale(axis, 0.055)), add(middle, scale(axis, 0.055))] as const
  return [
    rod(view, 'rod', ends[0], ends[1], 0.012, 0.9),
    ...ends.map((end) => disc(view, 'plate', end, axis, 0.05, 0.045, 0.91)),
  ]
}

/** A plate hanging from a belt between the thighs. */
export function beltPlate(view: View, hips: Vector, forward: Vector): Shape[] {
  const hook = add(hips, scale(forward, 0.07))
  const end = add(hook, [0, 0, -0.14])
  return [line(view, 'strap', [hook, end], 2), disc(view, 'plate', add(end, [0, 0, -0.06]), LEFTWARD, 0.07, 0.02, 2.1)]
}

/** A plate lying on the back of someone prone, or a vest. */
export const restingPlate = (view: View, at: Vector, normal: Vector): Shape[] => [
  disc(view, 'plate', add(at, scale(normal, 0.012)), normal, 0.08, 0.024, 2),
]
