import type { Arm, ExerciseMechanics, LoadPath } from '#shared/mechanics/definition'
import type { Pose, Vector } from '#shared/mechanics/solution'
import type { Side, Support } from '#shared/mechanics/vocabulary'
import { inner, minus, normal, outer, plus, restingArm, times, turned, Y, Z } from './mujoco-body'

/** A force on a named part of the linked body, at a point in stature fractions; a moment beside it in force × stature. */
export interface Push {
  part: string
  at: Vector
  force: Vector
  moment?: Vector
}

const radians = (angle: number) => (angle * Math.PI) / 180
const at = (from: Vector, to: Vector, share: number) => plus(from, times(minus(to, from), share))

interface Grasp {
  part: string
  at: Vector
  /** Unit direction a flexing push has here. */
  flexing: Vector
}

/** Where one load path takes hold of one side, read from the drawn pose alone. */
function grasp(load: LoadPath, mechanics: ExerciseMechanics, form: Arm, pose: Pose, side: Side): Grasp {
  const point = (name: string) => pose[`${side}.${name}` as keyof Pose]
  const up = normal(minus(pose.lumbar, pose.pelvis))
  const upper = normal(minus(pose.neckBase, pose.lumbar))
  const forwardOf = (axis: Vector) => turned(axis, Y, Math.PI / 2)
  const offset = (base: Vector, axis: Vector) =>
    plus(base, plus(times(axis, load.offset?.[0] ?? 0), times(forwardOf(axis), load.offset?.[1] ?? 0)))
  // The arm turns about the normal of its plane, which a hand in world axes or off the plane turns with it.
  const armNormal = (): Vector => {
    const sideways = side === 'left' ? Y : times(Y, -1)
    const carried = turned(restingArm(mechanics.armPlane, side).axis, Y, Math.atan2(upper[0], upper[2]))
    const inWorld = form.from === 'world' && mechanics.armPlane !== 'sagittal'
    if (!('hand' in form) || (!inWorld && (form.from === 'world' || (form.hand[2] ?? 0) === 0))) return carried
    const reach = minus(point(form.flat === undefined ? 'grip' : 'wrist'), point('shoulder'))
    const fixed = inWorld || mechanics.armPlane === 'transverse' ? sideways : upper
    // Upright unless the hand lies ahead: then the line to it is what the plane holds besides the lateral axis.
    const line: Vector = inWorld && (form.hand[2] ?? 0) === 0 ? Z : reach
    const axis = normal(outer(fixed, line))
    return inner(axis, carried) < 0 ? times(axis, -1) : axis
  }
  const limb = (part: string, from: string, to: string, axis: () => Vector, end = 1): Grasp => ({
    part: `${side}.${part}`,
    at: at(point(from), point(to), load.along ?? end),
    flexing:
      typeof load.direction === 'object' && 'square' in load.direction
        ? normal(outer(axis(), minus(point(to), point(from))))
        : [0, 0, 0],
  })
  const middle = (part: string, where: Vector, axis: Vector): Grasp => ({
    part,
    at: where,
    flexing: normal(outer(Y, axis)),
  })
  switch (load.at) {
    case 'hands':
    case 'offHand':
      return { ...limb('hand', 'wrist', 'grip', armNormal), at: point('grip') }
    case 'feet':
      return limb('foot', 'heel', 'toe', () => times(Y, -1), 0.45)
    case 'upperArm':
      return limb('upperArm', 'shoulder', 'elbow', armNormal)
    case 'forearm':
      return limb('forearm', 'elbow', 'wrist', () => times(armNormal(), form.elbowSide === 'reversed' ? -1 : 1))
    case 'thigh':
      return limb('thigh', 'hip', 'knee', () => times(Y, -1))
    case 'shank':
      return limb('shank', 'knee', 'ankle', () => Y)
    case 'shoulders': {
      const where = offset(pose.neckBase, upper)
      return middle('upperTrunk', where, minus(where, pose.lumbar))
    }
    case 'head':
      return middle('head', pose.headTop, minus(pose.headTop, pose.neckBase))
    case 'hips':
      return middle('pelvis', offset(pose.pelvis, up), up)
  }
}

function directionFor(load: LoadPath, held: Grasp, pose: Pose, side: Side): Vector {
  const { direction } = load
  if (direction === 'down') return times(Z, -1)
  if (direction === 'up') return Z
  if ('angle' in direction) return [Math.cos(radians(direction.angle)), 0, Math.sin(radians(direction.angle))]
  if ('square' in direction) return direction.square === 'flexing' ? held.flexing : times(held.flexing, -1)
  const origin = pose[`${side}.${direction.of}`]
  const y = direction.lateral === undefined ? held.at[1] : origin[1] + (side === 'left' ? 1 : -1) * direction.lateral
  return normal(minus([origin[0] + direction.toward[0], y, origin[2] + direction.toward[1]], held.at))
}

/** The external load in one frame, in units of L·g. */
export function pushesOfLoad(mechanics: ExerciseMechanics, frameIndex: number, pose: Pose): Push[] {
  const frame = mechanics.frames[frameIndex]!
  return mechanics.loads.flatMap((load) => {
    const sides: Side[] =
      load.at === 'offHand'
        ? ['left']
        : ['shoulders', 'hips', 'head'].includes(load.at) || mechanics.sides === 'oneAtATime'
          ? ['right']
          : ['right', 'left']
    const each = load.share === 'each' ? 1 : 1 / sides.length
    return sides.map((side): Push => {
      const held = grasp(load, mechanics, frame.arms, pose, side)
      return {
        part: held.part,
        at: held.at,
        force: times(directionFor(load, held, pose, side), each * (load.ratio ?? 1)),
      }
    })
  })
}

/** The segment through which each solved support bears. */
export const BEARING: Partial<Record<Support, string>> = {
  handsHanging: 'hand',
  handsPushing: 'hand',
  offHand: 'hand',
  forearms: 'forearm',
  feet: 'foot',
  offFoot: 'foot',
  knees: 'shank',
  upperBack: 'upperTrunk',
}
/** The segments that lie on each pad: what the pad takes of their load is not known. */
export const LYING: Partial<Record<Support, string[]>> = {
  seat: ['pelvis', 'thigh'],
  backPad: ['upperTrunk', 'head'],
  chestPad: ['upperTrunk'],
  thighPad: ['thigh'],
  armPad: ['upperArm'],
  forearmPad: ['forearm'],
  shankPad: ['shank'],
}

/** Parts whose contact forces are unknown because the body rests on a seat or pad; empty when statics can solve all. */
export function heldParts(mechanics: ExerciseMechanics): string[] {
  if (!mechanics.supports.some((support) => LYING[support])) return []
  // Legs that push a load away with the feet lift off the seat.
  const legsPush = mechanics.loads.some((load) => load.at === 'feet')
  const oneLegged = mechanics.frames.some((frame) => frame.offLeg !== undefined)
  return mechanics.supports.flatMap((support) => {
    const sides =
      support === 'offHand' || support === 'offFoot'
        ? ['left']
        : LYING[support] || mechanics.sides === 'both'
          ? ['right', 'left']
          : ['handsHanging', 'handsPushing', 'forearms'].includes(support) || oneLegged
            ? ['right']
            : ['right', 'left']
    const names = support === 'seat' && legsPush ? ['pelvis'] : (LYING[support] ?? [BEARING[support]!])
    return names.flatMap((name) =>
      ['pelvis', 'upperTrunk', 'head'].includes(name) ? [name] : sides.map((side) => `${side}.${name}`),
    )
  })
}
