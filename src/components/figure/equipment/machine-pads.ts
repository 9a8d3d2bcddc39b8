import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Pose, Vector } from '#shared/mechanics/solution'
import { chestAxes } from '../body'
import { add, between, scale, subtract, unit } from '../geometry'
import type { Shape } from '../scene'
import { block } from '../solids'
import type { View } from '../view'
import { handle } from './hands'
import { bearsOn, frontOfShank, frontOfThigh, outward, SKIN, workingSides } from './places'
import { roller } from './supports'

/** Pads of machines whose lever loads one action directly; they press against the way that action moves. */
export function leverPads(view: View, mechanics: ExerciseMechanics, pose: Pose): Shape[] {
  return (mechanics.moments ?? []).flatMap(({ action }) =>
    workingSides(mechanics).flatMap((side): Shape[] => {
      const layer = side === 'left' ? -3 : 2
      const shank = between(pose[`${side}.knee`], pose[`${side}.ankle`], 0.86)
      const thigh = between(pose[`${side}.hip`], pose[`${side}.knee`], 0.85)
      const forearm = between(pose[`${side}.elbow`], pose[`${side}.wrist`], 0.9)
      const upperArm = between(pose[`${side}.shoulder`], pose[`${side}.elbow`], 0.85)
      const press = (place: Vector, out: Vector, skin: number): Shape[] => [
        roller(view, add(place, scale(unit(out), skin)), out, 0.05, layer),
      ]
      const upright = (place: Vector, out: Vector, skin: number): Shape[] => [
        block(
          view,
          'pad',
          add(place, scale(out, skin + 0.015)),
          [
            [0.045, 0, 0],
            [0, 0.014, 0],
            [0, 0, 0.035],
          ],
          layer,
        ),
      ]
      const { forward, up } = chestAxes(pose)
      const chest = between(pose.pelvis, pose.neckBase, 0.82)
      switch (action) {
        case 'kneeExtension':
          return press(shank, frontOfShank(pose, side), SKIN.shank - 0.008)
        case 'kneeFlexion':
          return press(shank, scale(frontOfShank(pose, side), -1), SKIN.shank - 0.008)
        case 'hipAbduction':
          return upright(thigh, outward(side), 0.036)
        case 'hipAdduction':
          return upright(thigh, scale(outward(side), -1), 0.036)
        case 'hipExtension':
          return press(thigh, scale(frontOfThigh(pose, side), -1), 0.036)
        case 'hipFlexion':
          return press(thigh, frontOfThigh(pose, side), 0.036)
        case 'shoulderAbduction':
          return upright(upperArm, outward(side), 0.025)
        case 'shoulderExtension':
        case 'shoulderFlexion': {
          const arm = unit(subtract(pose[`${side}.elbow`], pose[`${side}.shoulder`]))
          const front: Vector = unit([-arm[2], 0, arm[0]], [1, 0, 0])
          return press(upperArm, scale(front, action === 'shoulderFlexion' ? 1 : -1), 0.02)
        }
        case 'elbowFlexion':
        case 'elbowExtension':
        case 'shoulderHorizontalAdduction':
        case 'shoulderHorizontalAbduction':
        case 'wristFlexion':
        case 'wristExtension':
          return [handle(view, pose, side, mechanics, 0.05)]
        case 'shoulderInternalRotation':
        case 'shoulderExternalRotation':
          return [handle(view, pose, side, mechanics, 0.04), ...press(forearm, [0, 0, -1], 0.012).slice(1)]
        case 'trunkFlexion':
          return side === 'left'
            ? []
            : [
                block(
                  view,
                  'pad',
                  add(chest, scale(forward, 0.085)),
                  [scale(up, 0.04), [0, 0.1, 0], scale(forward, 0.018)],
                  2,
                ),
              ]
        case 'trunkExtension':
          return side === 'left'
            ? []
            : [
                block(
                  view,
                  'pad',
                  subtract(chest, scale(forward, 0.085)),
                  [scale(up, 0.04), [0, 0.1, 0], scale(forward, 0.018)],
                  -2,
                ),
              ]
        case 'anklePlantarflexion':
        case 'ankleDorsiflexion': {
          const knee = add(thigh, scale(frontOfThigh(pose, side), 0.04))
          return bearsOn(mechanics, 'seat') ? [roller(view, knee, frontOfThigh(pose, side), 0.05, layer)] : []
        }
        default:
          return []
      }
    }),
  )
}
