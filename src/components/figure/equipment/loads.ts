import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Pose, SolvedFrame, Vector } from '#shared/mechanics/solution'
import { chestAxes, LEFTWARD, pelvisAxes } from '../body'
import { add, between, scale, subtract, unit } from '../geometry'
import type { Shape } from '../scene'
import { block, disc, line, rod } from '../solids'
import type { View } from '../view'
import { applicationsOf, type Application } from './applications'
import { barThrough, handle } from './hands'
import { BOTH, bearsOn, gripAxis, middleOf, SKIN } from './places'
import { leverPads } from './machine-pads'
import { roller } from './supports'
import { barbell, beltPlate, dumbbell, restingPlate, sharedDumbbell } from './weights'

/** Height up to which cables are followed, so that a far pulley does not make the athlete small. */
type Ceiling = number

function cable(view: View, from: Vector, toward: Vector, ceiling: Ceiling): Shape[] {
  const end =
    toward[2] > ceiling && ceiling > from[2]
      ? between(from, toward, (ceiling - from[2]) / (toward[2] - from[2]))
      : toward
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

function held(
  view: View,
  mechanics: ExerciseMechanics,
  pose: Pose,
  uses: readonly Application[],
  ceiling: Ceiling,
): Shape[] {
  const sides = uses.flatMap(({ side }) => (side === null ? [] : [side]))
  const toward = uses.flatMap(({ line: { toward } }) => (toward === undefined ? [] : [toward]))
  const barHeld = mechanics.grip === 'overhand' || mechanics.grip === 'underhand'
  const oneBar = sides.length === 2 && uses[0]!.load.share !== 'each' && barHeld
  if (toward.length > 0) {
    const own = typeof uses[0]!.load.direction === 'object' && 'lateral' in uses[0]!.load.direction
    const handles =
      oneBar && !own
        ? [barThrough(view, pose, sides, 0.05, 0.05)]
        : sides.map((side) => handle(view, pose, side, mechanics))
    if (own || sides.length === 1)
      return [...handles, ...uses.flatMap((use) => cable(view, use.line.at, use.line.toward!, ceiling))]
    return [...handles, ...cable(view, middleOf(pose, 'grip'), between(toward[0]!, toward[1]!, 0.5), ceiling)]
  }
  const direction = uses[0]!.line.direction
  const free = mechanics.guidance === 'freeWeight' || mechanics.guidance === 'ownBody'
  const shared = sides.length === 2 && uses[0]!.load.share !== 'each' && !barHeld
  const implement = free
    ? shared
      ? sharedDumbbell(view, middleOf(pose, 'grip'), gripAxis(pose, 'right', mechanics))
      : oneBar && direction[2] < -0.9
        ? barbell(view, middleOf(pose, 'grip'))
        : sides.flatMap((side) => dumbbell(view, pose, side, mechanics))
    : oneBar && mechanics.guidance === 'fixedPath'
      ? [barThrough(view, pose, sides, 0.06, 0.05)]
      : sides.map((side) => handle(view, pose, side, mechanics))
  const arrows =
    (oneBar && (free || mechanics.guidance === 'fixedPath')) || (free && shared)
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

/** Weight at the hips of a body-weight exercise: hung from a belt, or laid on the hips of someone who lies on their back. */
function hipWeight(view: View, pose: Pose, direction: Vector): Shape[] {
  const { forward } = pelvisAxes(pose)
  const front = add(pose.pelvis, scale(forward, 0.07))
  if (forward[2] > 0.5) return [...restingPlate(view, front, forward), ...arrow(view, front, direction, 0.2)]
  return [...beltPlate(view, pose.pelvis, forward), ...arrow(view, front, direction, 0.3)]
}

/** Pads over the shoulders of a sled or calf machine. */
function shoulderPads(view: View, pose: Pose): Shape[] {
  const { up, forward } = chestAxes(pose)
  return BOTH.map((side) => {
    const over = add(pose[`${side}.shoulder`], scale(up, 0.045))
    return rod(
      view,
      'pad',
      subtract(over, scale(forward, 0.04)),
      add(over, scale(forward, 0.05)),
      0.018,
      side === 'left' ? -3 : 3,
    )
  })
}

/** The plate of a leg press under the soles that push it. */
function footplate(view: View, mechanics: ExerciseMechanics, pose: Pose, direction: Vector): Shape[] {
  const [heel, toe] =
    mechanics.sides === 'both'
      ? [middleOf(pose, 'heel'), middleOf(pose, 'toe')]
      : [pose['right.heel'], pose['right.toe']]
  const sole = between(heel, toe, 0.5)
  const along = unit(subtract(toe, heel))
  const below: Vector = [along[2], 0, -along[0]]
  const middle = add(sole, scale(below, 0.014))
  return [
    block(view, 'pad', middle, [scale(along, 0.11), [0, 0.14, 0], scale(below, 0.012)], -4),
    ...arrow(view, subtract(middle, scale(direction, 0.2)), direction, 0.16),
  ]
}

function carried(view: View, mechanics: ExerciseMechanics, pose: Pose, use: Application, ceiling: Ceiling): Shape[] {
  const { at, direction, kind } = use.line
  if (kind === 'cable') return cable(view, at, use.line.toward!, ceiling)
  if (kind === 'assist') return assist(view, mechanics, pose, use)
  const upright = direction[2] < -0.9
  const free = mechanics.guidance === 'freeWeight' || (mechanics.guidance === 'fixedPath' && upright)
  switch (use.load.at) {
    case 'shoulders':
      if (free) return [...barbell(view, at), ...arrow(view, at, direction, 0.2)]
      if (mechanics.guidance === 'ownBody' || mechanics.guidance === 'ownBodyOnStraps')
        return restingPlate(view, at, scale(chestAxes(pose).forward, -1))
      return [...shoulderPads(view, pose), ...arrow(view, add(at, scale(direction, -0.2)), direction, 0.13)]
    case 'hips':
      if (free) return [...barbell(view, at), ...arrow(view, at, direction, 0.2)]
      return hipWeight(view, pose, direction)
    case 'head':
      return [...headLoad(view, at), ...arrow(view, at, direction, 0.15)]
    case 'feet':
      if (use.side === 'left') return []
      return kind === 'pad' ? footplate(view, mechanics, pose, direction) : arrow(view, at, direction, 0.15)
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
const headLoad = (view: View, at: Vector): Shape[] => [
  disc(view, 'plate', add(at, [0, 0, 0.02]), [0, 0, 1], 0.05, 0.03, 2),
]

/** Everything that carries the external load, and its lines of force. */
export function loadShapes(view: View, mechanics: ExerciseMechanics, frame: SolvedFrame, ceiling: Ceiling): Shape[] {
  const applications = applicationsOf(mechanics, frame)
  const shapes: Shape[] = [...leverPads(view, mechanics, frame.pose)]
  for (const load of mechanics.loads) {
    const uses = applications.filter((use) => use.load === load)
    if (uses.length === 0) continue
    if (load.at === 'hands' || load.at === 'offHand') shapes.push(...held(view, mechanics, frame.pose, uses, ceiling))
    else for (const use of uses) shapes.push(...carried(view, mechanics, frame.pose, use, ceiling))
  }
  return shapes
}
