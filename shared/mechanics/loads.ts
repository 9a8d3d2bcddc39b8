import type { LimbIndex, SegmentBody, SegmentRef } from './bodies'
import type { ExerciseMechanics, LoadPath } from './definition'
import { MechanicsError } from './errors'
import type { Posture } from './posture'
import type { LoadLine, Vector } from './solution'
import { add, between, cross, radians, scale, subtract, unit } from './vector'

/** A force on a segment. Body set: in units of m·g; load set: in units of L·g. */
export interface Force {
  segment: SegmentRef
  at: Vector
  force: Vector
  /** Free moment on the segment, in the force unit × stature. */
  couple?: Vector
}

/** One set of forces (gravity, or the load) in equilibrium: the segments' own weights, and what acts from outside. */
export interface ForceSet {
  weights: readonly Force[]
  external: readonly Force[]
}

/** Gravity on every segment, in units of body weight. */
export const gravityForces = (bodies: readonly SegmentBody[]): Force[] =>
  bodies.map(({ name, limb, mass, centre }) => ({ segment: { name, limb }, at: centre, force: [0, 0, -mass] }))

interface Place {
  segment: SegmentRef
  at: Vector
  /** Ends of the segment and the way its flexion turns it, for loads square to it. */
  from: Vector
  to: Vector
  flexionAxis: Vector
}

const LATERAL_AXIS: Vector = [0, 1, 0]

function placeOf(load: LoadPath, posture: Posture, limb: LimbIndex): Place {
  const arm = posture.arms[limb]
  const leg = posture.legs[limb]
  const armAxis = cross(arm.plane.p, arm.plane.q)
  const hipAxis = scale(LATERAL_AXIS, -1)
  const trunkPoint = (at: Vector): Vector => {
    const axes = load.at === 'hips' ? posture.pelvisAxes : posture.trunkAxes
    const [up, forward] = load.offset ?? [0, 0]
    return add(at, add(scale(axes.up, up), scale(axes.forward, forward)))
  }
  const segment = (name: SegmentRef['name'], from: Vector, to: Vector, flexionAxis: Vector, end = 1): Place => ({
    segment: { name, limb },
    at: between(from, to, load.along ?? end),
    from,
    to,
    flexionAxis,
  })
  switch (load.at) {
    case 'hands':
    case 'offHand':
      return { ...segment('hand', arm.wrist, arm.grip, armAxis), at: arm.grip }
    case 'feet':
      return segment('foot', leg.heel, leg.toe, hipAxis, 0.45)
    case 'upperArm':
      return segment('upperArm', arm.shoulder, arm.elbow, armAxis)
    case 'forearm':
      return segment('forearm', arm.elbow, arm.wrist, scale(armAxis, arm.elbowSign))
    case 'thigh':
      return segment('thigh', leg.hip, leg.knee, hipAxis)
    case 'shank':
      return segment('shank', leg.knee, leg.ankle, LATERAL_AXIS)
    case 'shoulders': {
      const at = trunkPoint(posture.neckBase)
      return { segment: { name: 'upperTrunk' }, at, from: posture.lumbar, to: at, flexionAxis: LATERAL_AXIS }
    }
    case 'head':
      return {
        segment: { name: 'head' },
        at: posture.headTop,
        from: posture.neckBase,
        to: posture.headTop,
        flexionAxis: LATERAL_AXIS,
      }
    case 'hips': {
      const at = trunkPoint([0, 0, 0])
      return { segment: { name: 'pelvis' }, at, from: [0, 0, 0], to: posture.lumbar, flexionAxis: LATERAL_AXIS }
    }
  }
}

function directionOf(
  load: LoadPath,
  place: Place,
  posture: Posture,
  limb: LimbIndex,
): { direction: Vector; toward?: Vector } {
  const { direction } = load
  if (direction === 'down') return { direction: [0, 0, -1] }
  if (direction === 'up') return { direction: [0, 0, 1] }
  if ('angle' in direction)
    return { direction: [Math.cos(radians(direction.angle)), 0, Math.sin(radians(direction.angle))] }
  if ('square' in direction) {
    const flexing = unit(cross(place.flexionAxis, unit(subtract(place.to, place.from))))
    return { direction: direction.square === 'flexing' ? flexing : scale(flexing, -1) }
  }
  const origin = {
    hip: posture.legs[limb].hip,
    shoulder: posture.arms[limb].shoulder,
    ankle: posture.legs[limb].ankle,
  }[direction.of]
  const outward = limb === 0 ? -1 : 1
  const toward: Vector = [
    origin[0] + direction.toward[0],
    direction.lateral === undefined ? place.at[1] : origin[1] + outward * direction.lateral,
    origin[2] + direction.toward[1],
  ]
  const line = subtract(toward, place.at)
  if (Math.hypot(...line) < 1e-9) {
    throw new MechanicsError('bad_number', 'loads', 'The pulley lies at the hand: move it away.')
  }
  return { direction: unit(line), toward }
}

const MIDLINE = ['shoulders', 'hips', 'head']

/** The external load's forces, in units of L·g, and the lines the figure draws for them. */
export function loadForces(mechanics: ExerciseMechanics, posture: Posture): { forces: Force[]; lines: LoadLine[] } {
  const forces: Force[] = []
  const lines: LoadLine[] = []
  for (const load of mechanics.loads) {
    const midline = MIDLINE.includes(load.at)
    const limbs: LimbIndex[] = load.at === 'offHand' ? [1] : midline || mechanics.sides === 'oneAtATime' ? [0] : [0, 1]
    for (const limb of limbs) {
      const place = placeOf(load, posture, limb)
      const { direction, toward } = directionOf(load, place, posture, limb)
      const share = load.share === 'each' ? 1 : 1 / limbs.length
      forces.push({ segment: place.segment, at: place.at, force: scale(direction, share * (load.ratio ?? 1)) })
      const kind = toward
        ? 'cable'
        : load.direction === 'down'
          ? mechanics.referenceLoad < 0
            ? 'assist'
            : 'gravity'
          : load.direction === 'up'
            ? 'assist'
            : 'pad'
      lines.push({ at: place.at, direction, kind, ...(toward ? { toward } : {}) })
    }
  }
  return { forces, lines }
}
