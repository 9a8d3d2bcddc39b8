import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Pose, Vector } from '#shared/mechanics/solution'
import type { Side } from '#shared/mechanics/vocabulary'
import { LEFTWARD, limbBias } from '../body'
import { add, between, cross, scale, subtract, unit } from '../geometry'
import type { Shape } from '../scene'
import { disc, layerAt, line, rod } from '../solids'
import type { View } from '../view'
import { bearingHands, bearsOn, gripAxis, handsLieFlat, middleOf } from './places'

const BAR = 0.009
/** How far a bar reaches past the hands, and how far straps and posts are followed. */
const PAST = 0.09
const STRAP = 0.3

/** A bar through one or both hands. */
export function barThrough(view: View, pose: Pose, sides: readonly Side[], past = PAST, layer = 0): Shape {
  const reach = (side: Side): Vector => add(pose[`${side}.grip`], scale(LEFTWARD, side === 'left' ? past : -past))
  const [from, to] =
    sides.length === 2
      ? [reach('right'), reach('left')]
      : [reach(sides[0]!), add(pose[`${sides[0]!}.grip`], scale(LEFTWARD, sides[0] === 'left' ? -past : past))]
  return rod(view, 'rod', from, to, BAR, layerAt(view, between(from, to, 0.5)) + layer)
}

/** Just behind the hand, before whatever the hand is before. */
const handLayer = (view: View, pose: Pose, side: Side): number =>
  layerAt(view, between(pose[`${side}.wrist`], pose[`${side}.grip`], 0.5)) + limbBias(view, side) + 0.021

/** A short handle through one hand; a fixed one lies level however the hand is turned on it. */
export function handle(
  view: View,
  pose: Pose,
  side: Side,
  mechanics: ExerciseMechanics,
  half = 0.035,
  fixed = false,
): Shape {
  const grip = pose[`${side}.grip`]
  const turned = gripAxis(pose, side, mechanics)
  const axis = fixed ? unit([turned[0], turned[1], 0], [1, 0, 0]) : turned
  return rod(
    view,
    'rod',
    subtract(grip, scale(axis, half)),
    add(grip, scale(axis, half)),
    BAR,
    layerAt(view, grip) + 0.001,
  )
}

function ring(view: View, pose: Pose, side: Side, mechanics: ExerciseMechanics): Shape[] {
  const grip = pose[`${side}.grip`]
  const centre = add(grip, [0, 0, 0.045])
  const normal = unit(cross(gripAxis(pose, side, mechanics), [0, 0, 1]), LEFTWARD)
  const layer = handLayer(view, pose, side)
  return [
    line(view, 'strap', [add(centre, [0, 0, 0.045]), add(centre, [0, 0, STRAP])], layer - 0.002),
    disc(view, 'wheel', centre, normal, 0.05, 0.001, layer - 0.001),
  ]
}

/** What bearing hands bear on, apart from the floor: bar, handles, rings, or rails on posts. */
export function bearingHandShapes(view: View, mechanics: ExerciseMechanics, pose: Pose, floor: number | null): Shape[] {
  const sides = bearingHands(mechanics)
  if (sides.length === 0 || handsLieFlat(mechanics)) return []
  if (mechanics.guidance === 'ownBodyOnStraps') return sides.flatMap((side) => ring(view, pose, side, mechanics))
  if (bearsOn(mechanics, 'offHand') && !bearsOn(mechanics, 'handsHanging', 'handsPushing')) return []
  if (bearsOn(mechanics, 'handsHanging')) {
    if (mechanics.grip !== 'neutral') return [barThrough(view, pose, sides, 0.14, -0.3)]
    const above = sides.map((side) => handle(view, pose, side, mechanics, 0.06, true))
    return above
  }
  const shapes: Shape[] = []
  const stand = (place: Vector, layer: number): void => {
    if (floor !== null) shapes.push(rod(view, 'iron', place, [place[0], place[1], floor], 0.008, layer))
  }
  if (mechanics.grip === 'neutral') {
    for (const side of sides) {
      const grip = pose[`${side}.grip`]
      const layer = handLayer(view, pose, side) - 0.003
      shapes.push(handle(view, pose, side, mechanics, 0.13, true))
      for (const end of [-0.11, 0.11]) stand(add(grip, [end, 0, -BAR]), layer)
    }
    return shapes
  }
  shapes.push(barThrough(view, pose, sides, 0.12, -0.3))
  const grip = middleOf(pose, 'grip')
  for (const end of [-0.23, 0.23]) stand(add(grip, [0, end, 0]), layerAt(view, add(grip, [0, end, 0])) - 0.31)
  return shapes
}
