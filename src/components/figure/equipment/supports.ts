import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Pose, Vector } from '#shared/mechanics/solution'
import type { Side } from '#shared/mechanics/vocabulary'
import { chestAxes, LEFTWARD, pelvisAxes } from '../body'
import { add, between, length, scale, subtract, unit } from '../geometry'
import type { Shape } from '../scene'
import { block, rod } from '../solids'
import type { View } from '../view'
import { BOTH, bearsOn, frontOfShank, frontOfThigh, IDLE, SKIN, workingSides } from './places'

const BEHIND = -5
const THICK = 0.022

/** A pad lying along `along` with its face at `face`, looking `out` toward the body. */
function pad(view: View, face: Vector, along: Vector, out: Vector, long: number, wide: number, layer = BEHIND): Shape {
  const normal = unit(out)
  return block(
    view,
    'pad',
    subtract(face, scale(normal, THICK)),
    [scale(unit(along), long), scale(LEFTWARD, wide), scale(normal, THICK)],
    layer,
  )
}

/** An upright from under a pad down to the floor, when the pad is high enough to need one. */
function post(view: View, from: Vector, floor: number): Shape[] {
  return from[2] - floor > 0.07 ? [rod(view, 'iron', from, [from[0], from[1], floor], 0.012, BEHIND - 1)] : []
}

/** The seat stands square to a trunk that leans back, level under one that sits up or bends forward. */
function seat(view: View, pose: Pose, floor: number): Shape[] {
  const axes = pelvisAxes(pose)
  const reclined = axes.up[0] < 0
  const along: Vector = reclined ? axes.forward : [1, 0, 0]
  const up: Vector = reclined ? axes.up : [0, 0, 1]
  const under = subtract(pose.pelvis, scale(up, SKIN.buttock - 0.012))
  const middle = add(under, scale(along, 0.07))
  return [pad(view, middle, along, up, 0.13, 0.1), ...post(view, subtract(middle, scale(up, 2 * THICK)), floor)]
}

function backPad(view: View, pose: Pose, floor: number): Shape[] {
  const { up, forward } = chestAxes(pose)
  const lying = Math.abs(up[2]) < 0.5
  const upper = between(pose.pelvis, pose.neckBase, 1.05)
  const lower = between(pose.pelvis, pose.neckBase, lying ? -0.12 : 0.18)
  const middle = subtract(between(lower, upper, 0.5), scale(forward, SKIN.back))
  const half = length(subtract(upper, lower)) / 2
  const under = subtract(middle, scale(forward, 2 * THICK))
  const shapes = [pad(view, middle, up, forward, half, lying ? 0.085 : 0.1)]
  if (lying) for (const end of [-0.7, 0.7]) shapes.push(...post(view, add(under, scale(up, half * end)), floor))
  return shapes
}

function chestPad(view: View, pose: Pose, floor: number): Shape[] {
  const { up, forward } = chestAxes(pose)
  const middle = add(between(pose.pelvis, pose.neckBase, 0.68), scale(forward, SKIN.chest))
  const lying = Math.abs(up[2]) < 0.8
  const shapes = [pad(view, middle, up, scale(forward, -1), lying ? 0.2 : 0.1, 0.085)]
  const behind = add(middle, scale(forward, 2 * THICK))
  return [...shapes, ...(lying ? post(view, behind, floor) : [])]
}

/** Over the thighs of a seated athlete, or under the hips of one who hangs over the pad: the front of the thigh either way. */
function thighPad(view: View, pose: Pose, seated: boolean, floor: number): Shape[] {
  const front = frontOfThigh(pose, 'right')
  const along = subtract(pose['right.knee'], pose['right.hip'])
  const place = between(
    between(pose['right.hip'], pose['left.hip'], 0.5),
    between(pose['right.knee'], pose['left.knee'], 0.5),
    seated ? 0.62 : 0.08,
  )
  const face = add(place, scale(front, SKIN.thigh))
  const under = add(face, scale(front, 2 * THICK))
  return [
    pad(view, face, along, scale(front, -1), seated ? 0.035 : 0.07, 0.13, seated ? 3 : BEHIND),
    ...(seated ? [] : post(view, under, floor)),
  ]
}

function limbPad(
  view: View,
  from: Vector,
  to: Vector,
  share: number,
  skin: number,
  long: number,
  floor: number,
): Shape[] {
  const along = unit(subtract(to, from))
  // Whatever a limb rests on lies under it.
  const down = subtract([0, 0, -1], scale(along, -along[2]))
  const out = unit(down, [1, 0, 0])
  const face = add(between(from, to, share), scale(out, skin))
  return [
    pad(view, face, along, scale(out, -1), long, 0.13, 0.4),
    ...post(view, add(face, scale(out, 2 * THICK)), floor),
  ]
}

const middle = (pose: Pose, name: 'shoulder' | 'elbow' | 'wrist', sides: readonly Side[]): Vector =>
  sides.length === 2 ? between(pose[`left.${name}`], pose[`right.${name}`], 0.5) : pose[`${sides[0]!}.${name}`]

/** Every pad the body bears on. `floor` is where uprights end. */
export function padShapes(view: View, mechanics: ExerciseMechanics, pose: Pose, floor: number): Shape[] {
  const shapes: Shape[] = []
  const sides = workingSides(mechanics)
  if (upperBackOn(mechanics, pose) === 'sled') shapes.push(...backPad(view, pose, floor))
  if (bearsOn(mechanics, 'seat')) shapes.push(...seat(view, pose, floor))
  if (bearsOn(mechanics, 'backPad')) shapes.push(...backPad(view, pose, floor))
  if (bearsOn(mechanics, 'chestPad')) shapes.push(...chestPad(view, pose, floor))
  if (bearsOn(mechanics, 'thighPad')) shapes.push(...thighPad(view, pose, bearsOn(mechanics, 'seat'), floor))
  if (bearsOn(mechanics, 'armPad'))
    shapes.push(
      ...limbPad(view, middle(pose, 'shoulder', sides), middle(pose, 'elbow', sides), 0.66, SKIN.upperArm, 0.08, floor),
    )
  if (bearsOn(mechanics, 'forearmPad'))
    shapes.push(
      ...limbPad(view, middle(pose, 'elbow', sides), middle(pose, 'wrist', sides), 0.55, SKIN.forearm, 0.08, floor),
    )
  if (bearsOn(mechanics, 'shankPad'))
    for (const side of BOTH) {
      const back = scale(frontOfShank(pose, side), -1)
      const face = add(between(pose[`${side}.knee`], pose[`${side}.ankle`], 0.85), scale(back, SKIN.shank - 0.008))
      shapes.push(roller(view, face, back))
    }
  return shapes
}

/** A padded roller across a limb, pressing from `out`. */
export function roller(view: View, face: Vector, out: Vector, wide = 0.045, layer = 2): Shape {
  const centre = add(face, scale(unit(out), 0.026))
  return rod(view, 'pad', add(centre, scale(LEFTWARD, wide)), subtract(centre, scale(LEFTWARD, wide)), 0.026, layer)
}

/** Held shins with nothing else to bear on mean kneeling, too. */
const kneels = (mechanics: ExerciseMechanics): boolean =>
  bearsOn(mechanics, 'knees') || (bearsOn(mechanics, 'shankPad') && !bearsOn(mechanics, 'thighPad', 'seat', 'feet'))

/** Where each bearing that stands on the floor or on a box touches it. */
export function bearings(mechanics: ExerciseMechanics, pose: Pose): Vector[] {
  const places: Vector[] = []
  const foot = (side: Side): Vector => {
    const [heel, toe] = [pose[`${side}.heel`], pose[`${side}.toe`]]
    return Math.abs(heel[2] - toe[2]) < 0.03 ? between(heel, toe, 0.5) : heel[2] < toe[2] ? heel : toe
  }
  if (bearsOn(mechanics, 'feet'))
    for (const side of mechanics.sides === 'both' || !bearsOn(mechanics, 'offFoot')
      ? feetOf(mechanics, pose)
      : workingSides(mechanics))
      places.push(foot(side))
  if (bearsOn(mechanics, 'offFoot')) places.push(foot(IDLE))
  if (kneels(mechanics)) for (const side of BOTH) places.push(add(pose[`${side}.knee`], [0, 0, -0.02]))
  if (bearsOn(mechanics, 'forearms'))
    for (const side of BOTH) places.push(between(pose[`${side}.elbow`], pose[`${side}.wrist`], 0.2))
  return places
}

/** Both feet unless the idle one is held clear of the floor. */
function feetOf(mechanics: ExerciseMechanics, pose: Pose): readonly Side[] {
  if (mechanics.sides === 'both') return BOTH
  const low = (side: Side): number => Math.min(pose[`${side}.heel`][2], pose[`${side}.toe`][2])
  return low('left') - low('right') > 0.03 ? ['right'] : BOTH
}

/** What an upper back leans on: the pad of a machine, a wall when the trunk is upright, or else the edge of a bench. */
export function upperBackOn(mechanics: ExerciseMechanics, pose: Pose): 'sled' | 'wall' | 'bench' | null {
  if (!bearsOn(mechanics, 'upperBack')) return null
  if (mechanics.guidance === 'fixedPath' || mechanics.guidance === 'leverMachine') return 'sled'
  return chestAxes(pose).up[2] > 0.85 ? 'wall' : 'bench'
}

/** A wall behind an upright back. */
export function wall(view: View, at: Vector, floor: number): Shape {
  const tall = 0.5
  return block(
    view,
    'pad',
    [at[0] - 0.012, 0, floor + tall],
    [
      [0.012, 0, 0],
      [0, 0.2, 0],
      [0, 0, tall],
    ],
    BEHIND - 3,
  )
}

/** The bench edge under the shoulder blades. */
export const upperBackContact = (pose: Pose): Vector => {
  const { forward } = chestAxes(pose)
  return subtract(between(pose.pelvis, pose.neckBase, 0.8), scale(forward, SKIN.back))
}

/** A box from the floor up to `top`, centred under a place. */
export function standOn(view: View, at: Vector, top: number, floor: number, deep: number, wide: number): Shape {
  const half = Math.max(0.005, (top - floor) / 2)
  return block(
    view,
    'pad',
    [at[0], at[1], floor + half],
    [
      [deep, 0, 0],
      [0, wide, 0],
      [0, 0, half],
    ],
    BEHIND - 2,
  )
}
