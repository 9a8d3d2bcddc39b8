import type { Posture } from './posture'
import type { SegmentTable } from './segments'
import { ANKLE_ALONG_FOOT } from './segments'
import type { Role, Vector } from './solution'
import { add, between, scale } from './vector'

/** Segments of the linked body; limbs come as [working, idle]. */
export const SEGMENT_NAMES = [
  'pelvis',
  'upperTrunk',
  'head',
  'upperArm',
  'forearm',
  'hand',
  'thigh',
  'shank',
  'foot',
] as const
export type SegmentName = (typeof SEGMENT_NAMES)[number]
/** 0 working side, 1 idle side, undefined on the midline. */
export type LimbIndex = 0 | 1
/** A segment by name, and by side where it belongs to a limb. */
export interface SegmentRef {
  name: SegmentName
  limb?: LimbIndex
}
/** Every segment of the body. */
export const ALL_SEGMENTS: readonly SegmentRef[] = SEGMENT_NAMES.flatMap((name): SegmentRef[] =>
  name === 'pelvis' || name === 'upperTrunk' || name === 'head'
    ? [{ name }]
    : ([0, 1] as const).map((limb) => ({ name, limb })),
)

/** A segment with its share of body mass and its mass centre. */
export interface SegmentBody extends SegmentRef {
  mass: number
  centre: Vector
}

/** Every segment's mass share and mass centre in one posture. */
export function segmentBodies(posture: Posture, table: SegmentTable): SegmentBody[] {
  const bodies: SegmentBody[] = [
    { name: 'pelvis', mass: table.pelvis.mass, centre: scale(posture.pelvisAxes.up, table.pelvis.centre) },
    {
      name: 'upperTrunk',
      mass: table.upperTrunk.mass,
      centre: add(posture.lumbar, scale(posture.trunkAxes.up, table.upperTrunk.centre)),
    },
    { name: 'head', mass: table.head.mass, centre: posture.headCentre },
  ]
  for (const limb of [0, 1] as const) {
    const arm = posture.arms[limb]
    const leg = posture.legs[limb]
    const along = (name: 'upperArm' | 'forearm' | 'thigh' | 'shank', from: Vector, to: Vector): SegmentBody => ({
      name,
      limb,
      mass: table[name].mass,
      centre: between(from, to, table[name].centre / table[name].length),
    })
    // The foot's centre lies over the sole, half way up to the ankle.
    const overSole = between(leg.heel, leg.toe, table.foot.centre / table.foot.length)
    const underAnkle = between(leg.heel, leg.toe, ANKLE_ALONG_FOOT)
    const halfUp = scale(add(leg.ankle, scale(underAnkle, -1)), 0.5)
    bodies.push(
      along('upperArm', arm.shoulder, arm.elbow),
      along('forearm', arm.elbow, arm.wrist),
      {
        name: 'hand',
        limb,
        mass: table.hand.mass,
        centre: add(arm.wrist, scale(arm.handDirection, table.hand.centre)),
      },
      along('thigh', leg.hip, leg.knee),
      along('shank', leg.knee, leg.ankle),
      { name: 'foot', limb, mass: table.foot.mass, centre: add(overSole, halfUp) },
    )
  }
  return bodies
}

/** The role of a limb's joints. */
export const roleOf = (limb: LimbIndex | undefined): Role =>
  limb === undefined ? 'middle' : limb === 0 ? 'working' : 'idle'

const ARM: SegmentName[] = ['upperArm', 'forearm', 'hand']
const LEG: SegmentName[] = ['thigh', 'shank', 'foot']
/** Joints at which the body is cut in two; the pelvis is the root. */
export type CutName = 'wrist' | 'elbow' | 'shoulder' | 'hip' | 'knee' | 'ankle' | 'lumbar' | 'neck'

/** Whether a segment lies on the distal side of the cut. */
export function isDistal(segment: SegmentRef, cut: CutName, limb?: LimbIndex): boolean {
  const same = segment.limb === limb
  switch (cut) {
    case 'wrist':
      return same && segment.name === 'hand'
    case 'elbow':
      return same && (segment.name === 'forearm' || segment.name === 'hand')
    case 'shoulder':
      return same && ARM.includes(segment.name)
    case 'hip':
      return same && LEG.includes(segment.name)
    case 'knee':
      return same && (segment.name === 'shank' || segment.name === 'foot')
    case 'ankle':
      return same && segment.name === 'foot'
    case 'lumbar':
      return segment.name !== 'pelvis' && !LEG.includes(segment.name)
    case 'neck':
      return segment.name === 'head'
  }
}
