import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Pose, SolvedFrame, Vector } from '#shared/mechanics/solution'
import { chestAxes, LEFTWARD, pelvisAxes } from '../body'
import { add, between, length, scale, subtract, unit } from '../geometry'
import type { Shape } from '../scene'
import { block, disc, line, rod } from '../solids'
import type { View } from '../view'
import { applicationsOf, type Application } from './applications'
import { barThrough, handle } from './hands'
import { BOTH, bearsOn, frontOfShank, frontOfThigh, middleOf, outward, SKIN, workingSides } from './places'
import { roller } from './supports'
import { barbell, beltPlate, dumbbell, restingPlate } from './weights'

/** A pulley farther than this is drawn this far along its cable, so that the athlete stays large. */
const FAR = 1.1

function cable(view: View, from: Vector, toward: Vector): Shape[] {
  const along = subtract(toward, from)
  const end = add(from, scale(unit(along), Math.min(FAR, length(along))))
  return [
    disc(view, 'wheel', end, LEFTWARD, 0.03, 0.004, 5),
    disc(view, 'iron', end, LEFTWARD, 0.009, 0.004, 5.1),
    line(view, 'force', [from, end], 5.2),
  ]
}

/** An arrow of force: its shaft dashed, its head at the end it pulls toward. */
function arrow(view: View, from: Vector, direction: Vector, long: number): Shape[] {
  const tip = add(from, scale(direction, long))
  const side: Vector = Math.abs(direction[2]) > 0.9 ? [1, 0, 0] : [0, 0, 1]
  const wing = (by: number): Vector => add(subtract(tip, scale(direction, 0.026)), scale(side, by))
  return [line(view, 'force', [from, tip], 5.2), line(view, 'forceHead', [wing(0.016), tip, wing(-0.016)], 5.3)]
}

function held(view: View, mechanics: ExerciseMechanics, pose: Pose, uses: readonly Application[]): Shape[] {
  const sides = uses.flatMap(({ side }) => (side === null ? [] : [side]))
  const toward = uses.flatMap(({ line: { toward } }) => (toward === undefined ? [] : [toward]))
  const oneBar = sides.length === 2 && uses[0]!.load.share !== 'each' && mechanics.grip !== 'neutral'
  if (toward.length > 0) {
    const own = typeof uses[0]!.load.direction === 'object' && 'lateral' in uses[0]!.load.direction
    const handles =
      oneBar && !own
        ? [barThrough(view, pose, sides, 0.05, 0.05)]
        : sides.map((side) => handle(view, pose, side, mechanics))
    if (own || sides.length === 1)
      return [...handles, ...uses.flatMap((use) => cable(view, use.line.at, use.line.toward!))]
    return [...handles, ...cable(view, middleOf(pose, 'grip'), between(toward[0]!, toward[1]!, 0.5))]
  }
  const direction = uses[0]!.line.direction
  const free = mechanics.guidance === 'freeWeight' || mechanics.guidance === 'ownBody'
  const implement = free
    ? oneBar && direction[2] < -0.9
      ? barbell(view, middleOf(pose, 'grip'))
      : sides.flatMap((side) => dumbbell(view, pose, side, mechanics))
    : oneBar
      ? [barThrough(view, pose, sides, 0.06, 0.05)]
      : sides.map((side) => handle(view, pose, side, mechanics))
  const arrows = oneBar
    ? arrow(view, middleOf(pose, 'grip'), direction, 0.2)
    : uses.slice(0, view.turn < 25 ? 1 : 2).flatMap((use) => arrow(view, use.line.at, use.line.direction, 0.17))
  return [...implement, ...arrows]
}

/** A band or counterweight takes weight off: toward the bar above, or a platform under knees or feet. */
function assist(view: View, mechanics: ExerciseMechanics, pose: Pose, use: Application): Shape[] {
  const from = use.line.at
  const machine = mechanics.guidance === 'leverMachine' || mechanics.guidance === 'fixedPath'
  if (machine) {
    const middle: Vector = [from[0], 0, from[2] - 0.05]
    return [
      block(
        view,
        'pad',
        middle,
        [
          [0.09, 0, 0],
          [0, 0.1, 0],
          [0, 0, 0.018],
        ],
        -5,
      ),
      ...(use.side === 'left' ? [] : arrow(view, subtract(middle, [0, 0, 0.16]), [0, 0, 1], 0.14)),
    ]
  }
  const top: Vector = bearsOn(mechanics, 'handsHanging') ? middleOf(pose, 'grip') : add(from, [0, 0, 0.5])
  return [line(view, 'band', [from, [top[0], from[1] * 0.4, top[2]]], 2.5)]
}

/** A pad pressing on a limb, with its line of force through it. */
function pressing(view: View, use: Application, skin: number): Shape[] {
  const out = scale(use.line.direction, -1)
  const face = add(use.line.at, scale(out, skin))
  return [
    roller(view, face, out, 0.05, use.side === 'left' ? -3 : 2),
    ...(use.side === 'left' ? [] : arrow(view, add(face, scale(out, 0.16)), use.line.direction, 0.1)),
  ]
}

/** The plate of a leg press under both soles. */
function footplate(view: View, pose: Pose, direction: Vector): Shape[] {
  const sole = between(middleOf(pose, 'heel'), middleOf(pose, 'toe'), 0.5)
  const along = unit(subtract(middleOf(pose, 'toe'), middleOf(pose, 'heel')))
  const below: Vector = [along[2], 0, -along[0]]
  const middle = add(sole, scale(below, 0.014))
  return [
    block(view, 'pad', middle, [scale(along, 0.11), [0, 0.14, 0], scale(below, 0.012)], -4),
    ...arrow(view, subtract(middle, scale(direction, 0.2)), direction, 0.16),
  ]
}

function carried(view: View, mechanics: ExerciseMechanics, pose: Pose, use: Application): Shape[] {
  const { at, direction, kind } = use.line
  if (kind === 'cable') return cable(view, at, use.line.toward!)
  if (kind === 'assist') return assist(view, mechanics, pose, use)
  const free = mechanics.guidance === 'freeWeight' || mechanics.guidance === 'fixedPath'
  switch (use.load.at) {
    case 'shoulders':
      if (free) return [...barbell(view, at), ...arrow(view, at, direction, 0.2)]
      if (mechanics.guidance === 'ownBody' || mechanics.guidance === 'ownBodyOnStraps')
        return restingPlate(view, at, scale(chestAxes(pose).forward, -1))
      return [
        ...BOTH.map((side) =>
          rod(
            view,
            'pad',
            add(pose[`${side}.shoulder`], [-0.04, 0, 0.045]),
            add(pose[`${side}.shoulder`], [0.05, 0, 0.045]),
            0.018,
            side === 'left' ? -3 : 3,
          ),
        ),
        ...arrow(view, add(at, [0, 0, 0.22]), direction, 0.15),
      ]
    case 'hips':
      if (free) return [...barbell(view, at), ...arrow(view, at, direction, 0.2)]
      return [
        ...beltPlate(view, pose.pelvis, pelvisAxes(pose).forward),
        ...arrow(view, add(pose.pelvis, scale(pelvisAxes(pose).forward, 0.07)), direction, 0.3),
      ]
    case 'head':
      return [...disc2(view, at), ...arrow(view, at, direction, 0.15)]
    case 'feet':
      if (use.side === 'left') return []
      return kind === 'pad' ? footplate(view, pose, direction) : arrow(view, at, direction, 0.15)
    case 'upperArm':
      return pressing(view, use, SKIN.upperArm - 0.006)
    case 'forearm':
      return pressing(view, use, SKIN.forearm - 0.004)
    case 'thigh':
      return pressing(view, use, SKIN.thigh - 0.006)
    case 'shank':
      return pressing(view, use, SKIN.shank - 0.006)
    default:
      return []
  }
}
const disc2 = (view: View, at: Vector): Shape[] => [
  disc(view, 'plate', add(at, [0, 0, 0.02]), [0, 0, 1], 0.05, 0.03, 2),
]

/** Pads of machines whose lever loads one action directly; they press against the way that action moves. */
function leverPads(view: View, mechanics: ExerciseMechanics, pose: Pose): Shape[] {
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

/** Everything that carries the external load, and its lines of force. */
export function loadShapes(view: View, mechanics: ExerciseMechanics, frame: SolvedFrame): Shape[] {
  const applications = applicationsOf(mechanics, frame)
  const shapes: Shape[] = [...leverPads(view, mechanics, frame.pose)]
  for (const load of mechanics.loads) {
    const uses = applications.filter((use) => use.load === load)
    if (uses.length === 0) continue
    if (load.at === 'hands' || load.at === 'offHand') shapes.push(...held(view, mechanics, frame.pose, uses))
    else for (const use of uses) shapes.push(...carried(view, mechanics, frame.pose, use))
  }
  return shapes
}
