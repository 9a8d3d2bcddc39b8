import type { Axis, ExerciseMechanics, Role, SolvedFrame, Vector } from '#shared/mechanics/index'
import type { Pose } from '#shared/mechanics/solution'
import type { Side } from '#shared/mechanics/vocabulary'
import type { Rig } from './mujoco'
import { armForm, inner, minus, normal, outer, times, turned, X, Y, Z } from './mujoco-body'

/** One axis of one joint, read from MuJoCo in the sense of Pintle's actions. */
export interface Reading {
  axis: Axis
  role: Role
  /** The part just beyond the cut. */
  part: string
  read: (held: ReturnType<Rig['hold']>) => number
  unsigned?: boolean
}

/**
 * Where the thumb points on a bar or handle, and from it the palm: overhand thumbs point at each other, underhand thumbs
 * away from each other, and in a neutral grip the palms face each other (trade, no source).
 */
function wristReading(
  mechanics: ExerciseMechanics,
  frame: ExerciseMechanics['frames'][number],
  centred: Pose,
  side: Side,
  hinge: Vector,
): { axis: Axis; sign: number; unsigned: boolean } {
  if (armForm(mechanics, frame, side === 'left')?.flat !== undefined)
    return { axis: 'wristFlexion', sign: -1, unsigned: false }
  const fingers = normal(minus(centred[`${side}.fingers`], centred[`${side}.wrist`]))
  const medial = side === 'left' ? times(Y, -1) : Y
  const hand = side === 'right' ? 1 : -1
  const neutral = mechanics.grip === 'neutral' || mechanics.grip === 'none'
  const thumb = neutral ? times(outer(fingers, medial), hand) : times(medial, mechanics.grip === 'overhand' ? 1 : -1)
  const palm = neutral ? medial : times(outer(thumb, fingers), hand)
  const grows = outer(hinge, fingers)
  const [flexes, deviates] = [inner(grows, palm), inner(grows, thumb)]
  const axis = Math.abs(flexes) > Math.abs(deviates) ? 'wristFlexion' : 'wristDeviation'
  const strongest = axis === 'wristFlexion' ? flexes : deviates
  // A forearm pointing sideways lies along the thumb's own line: which way such a hand is turned is a convention.
  return { axis, sign: Math.sign(strongest) || 1, unsigned: Math.abs(strongest) < 0.5 }
}

/** Every axis that a frame can have a term for. */
export function readings(
  mechanics: ExerciseMechanics,
  index: number,
  solved: SolvedFrame,
  centred: Pose,
  body: Rig,
): Reading[] {
  const frame = mechanics.frames[index]!
  const lean = ((solved.angles.trunkLean + solved.angles.lumbar) * Math.PI) / 180
  const [up, forward] = [turned(Z, Y, lean), turned(X, Y, lean)]
  const list: Reading[] = [
    { axis: 'trunkFlexion', role: 'middle', part: 'upperTrunk', read: (held) => held.torque('lumbar') },
    { axis: 'trunkLateral', role: 'middle', part: 'upperTrunk', read: (held) => held.torque('lumbar.lateral') },
    { axis: 'trunkRotation', role: 'middle', part: 'upperTrunk', read: (held) => held.torque('lumbar.rotation') },
    {
      axis: 'lumbarAxial',
      role: 'middle',
      part: 'upperTrunk',
      read: (held) => -inner(held.fromParent('upperTrunk'), up),
    },
    { axis: 'neck', role: 'middle', part: 'head', read: (held) => held.torque('neck') },
  ]
  const sides: Side[] = mechanics.sides === 'both' ? ['right'] : ['right', 'left']
  for (const side of sides) {
    const role = side === 'right' ? 'working' : 'idle'
    const form = armForm(mechanics, frame, side === 'left')
    const plane = form === null ? 'sagittal' : mechanics.armPlane
    const shoulder = (
      { sagittal: 'shoulderFlexion', frontal: 'shoulderAbduction', transverse: 'shoulderHorizontal' } as const
    )[plane]
    const fold = form?.elbowSide === 'reversed' ? -1 : 1
    const wrist = wristReading(mechanics, frame, centred, side, body.axis(`${side}.wrist`))
    const forearm = normal(minus(centred[`${side}.wrist`], centred[`${side}.elbow`]))
    const part = (name: string) => `${side}.${name}`
    list.push(
      {
        axis: wrist.axis,
        role,
        part: part('hand'),
        read: (held) => wrist.sign * held.torque(part('wrist')),
        unsigned: wrist.unsigned,
      },
      { axis: 'handAxial', role, part: part('hand'), read: (held) => -inner(held.fromParent(part('hand')), forearm) },
      {
        axis: 'elbow',
        role,
        part: part('forearm'),
        read: (held) =>
          form?.elbowSide === 'across' ? held.torque(part('elbow.across')) : fold * held.torque(part('elbow')),
      },
      { axis: shoulder, role, part: part('upperArm'), read: (held) => held.torque(part('shoulder')) },
      {
        axis: 'scapulaVertical',
        role,
        part: part('upperArm'),
        read: (held) => inner(held.fromParent(part('upperArm')), up),
      },
      {
        axis: 'scapulaSagittal',
        role,
        part: part('upperArm'),
        read: (held) => -inner(held.fromParent(part('upperArm')), forward),
      },
      { axis: 'hipFlexion', role, part: part('thigh'), read: (held) => held.torque(part('hip')) },
      { axis: 'hipAbduction', role, part: part('thigh'), read: (held) => held.torque(part('hip.abduction')) },
      { axis: 'knee', role, part: part('shank'), read: (held) => held.torque(part('knee')) },
      { axis: 'ankle', role, part: part('foot'), read: (held) => held.torque(part('ankle')) },
    )
  }
  return list
}
