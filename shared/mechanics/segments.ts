import type { Sex } from './sex'

/**
 * Masses (fractions of body mass), lengths and mass-centre distances (fractions of stature) of the linked segments.
 *
 * Source: de Leva 1996, J Biomech 29:1223 (masses and centres read in the source, lengths and the pelvis from memory with
 * high certainty). Ankle height, head height above the shoulders and joint widths are not in that table:
 * ankle height .039 H after Drillis & Contini (from memory, high); the head's height closes the standing stature (derived);
 * shoulder and hip half-widths are joint centres inside the biacromial .259 H and the hip breadth .191 H (from memory, medium).
 */
export interface SegmentTable {
  head: { mass: number; centre: number; length: number }
  upperTrunk: { mass: number; centre: number; length: number }
  pelvis: { mass: number; centre: number; length: number }
  upperArm: { mass: number; centre: number; length: number }
  forearm: { mass: number; centre: number; length: number }
  hand: { mass: number; centre: number; length: number }
  thigh: { mass: number; centre: number; length: number }
  shank: { mass: number; centre: number; length: number }
  foot: { mass: number; centre: number; length: number }
  shoulderHalfWidth: number
  hipHalfWidth: number
  ankleHeight: number
}

/** Where L5/S1 cuts the trunk, as a share of the hip–shoulder length above the hips. */
export const LUMBAR_CUT = 0.2
/** Heel to ankle as a share of foot length (from memory, medium). */
export const ANKLE_ALONG_FOOT = 0.25
/** Middle of a gripped bar, share of the hand's length from the wrist: it lies across the palm (our estimate). */
export const GRIP_ALONG_HAND = 0.6
/** Pressure centre of a flat hand, share of the hand's length from the wrist: the heel of the hand bears most (our estimate). */
export const PALM_ALONG_HAND = 0.35

interface Published {
  stature: number
  mass: Record<'head' | 'trunk' | 'lowerTrunk' | 'upperArm' | 'forearm' | 'hand' | 'thigh' | 'shank' | 'foot', number>
  /** % of length from the first-named endpoint (vertex, mid-shoulder, omphalion, proximal joint, heel). */
  centre: Published['mass']
  /** mm */
  length: Published['mass']
}

const MALE: Published = {
  stature: 1741,
  mass: {
    head: 6.94,
    trunk: 43.46,
    lowerTrunk: 11.17,
    upperArm: 2.71,
    forearm: 1.62,
    hand: 0.61,
    thigh: 14.16,
    shank: 4.33,
    foot: 1.37,
  },
  centre: {
    head: 59.76,
    trunk: 43.1,
    lowerTrunk: 61.15,
    upperArm: 57.72,
    forearm: 45.74,
    hand: 79.0,
    thigh: 40.95,
    shank: 43.95,
    foot: 44.15,
  },
  length: {
    head: 203.3,
    trunk: 515.5,
    lowerTrunk: 145.7,
    upperArm: 281.7,
    forearm: 268.9,
    hand: 86.2,
    thigh: 422.2,
    shank: 440.3,
    foot: 258.1,
  },
}

const FEMALE: Published = {
  stature: 1735,
  mass: {
    head: 6.68,
    trunk: 42.57,
    lowerTrunk: 12.47,
    upperArm: 2.55,
    forearm: 1.38,
    hand: 0.56,
    thigh: 14.78,
    shank: 4.81,
    foot: 1.29,
  },
  centre: {
    head: 58.94,
    trunk: 37.82,
    lowerTrunk: 49.2,
    upperArm: 57.54,
    forearm: 45.59,
    hand: 74.74,
    thigh: 36.12,
    shank: 43.52,
    foot: 40.14,
  },
  length: {
    head: 200.2,
    trunk: 497.9,
    lowerTrunk: 181.5,
    upperArm: 275.1,
    forearm: 264.3,
    hand: 78.0,
    thigh: 368.5,
    shank: 438.6,
    foot: 228.3,
  },
}

const ANKLE_HEIGHT = 0.039
const SHOULDER_HALF_WIDTH = 0.11
const HIP_HALF_WIDTH = 0.05

function tableFrom({ stature, mass, centre, length }: Published): SegmentTable {
  const limb = (name: 'upperArm' | 'forearm' | 'hand' | 'thigh' | 'shank' | 'foot') => ({
    mass: mass[name] / 100,
    centre: ((centre[name] / 100) * length[name]) / stature,
    length: length[name] / stature,
  })
  const trunk = length.trunk / stature
  const cut = LUMBAR_CUT * trunk
  // Heights above the mid-hip point. The upper part's centre keeps the whole trunk's centre where the source has it.
  const trunkCentre = (1 - centre.trunk / 100) * trunk
  const pelvisCentre = ((1 - centre.lowerTrunk / 100) * length.lowerTrunk) / stature
  const upperMass = mass.trunk - mass.lowerTrunk
  const upperCentre = (mass.trunk * trunkCentre - mass.lowerTrunk * pelvisCentre) / upperMass
  const thigh = limb('thigh')
  const shank = limb('shank')
  const headTop = 1 - (ANKLE_HEIGHT + shank.length + thigh.length + trunk)
  return {
    head: {
      mass: mass.head / 100,
      centre: headTop - ((centre.head / 100) * length.head) / stature,
      length: headTop,
    },
    upperTrunk: { mass: upperMass / 100, centre: upperCentre - cut, length: trunk - cut },
    pelvis: { mass: mass.lowerTrunk / 100, centre: pelvisCentre, length: cut },
    upperArm: limb('upperArm'),
    forearm: limb('forearm'),
    hand: limb('hand'),
    thigh,
    shank,
    foot: limb('foot'),
    shoulderHalfWidth: SHOULDER_HALF_WIDTH,
    hipHalfWidth: HIP_HALF_WIDTH,
    ankleHeight: ANKLE_HEIGHT,
  }
}

function meanOf(one: SegmentTable, other: SegmentTable): SegmentTable {
  const mix = (a: SegmentTable['head'], b: SegmentTable['head']) => ({
    mass: (a.mass + b.mass) / 2,
    centre: (a.centre + b.centre) / 2,
    length: (a.length + b.length) / 2,
  })
  return {
    head: mix(one.head, other.head),
    upperTrunk: mix(one.upperTrunk, other.upperTrunk),
    pelvis: mix(one.pelvis, other.pelvis),
    upperArm: mix(one.upperArm, other.upperArm),
    forearm: mix(one.forearm, other.forearm),
    hand: mix(one.hand, other.hand),
    thigh: mix(one.thigh, other.thigh),
    shank: mix(one.shank, other.shank),
    foot: mix(one.foot, other.foot),
    shoulderHalfWidth: SHOULDER_HALF_WIDTH,
    hipHalfWidth: HIP_HALF_WIDTH,
    ankleHeight: ANKLE_HEIGHT,
  }
}

const male = tableFrom(MALE)
const female = tableFrom(FEMALE)

/** Segment table per sex; `centre` is measured from the proximal joint (heel for the foot, L5/S1 for the upper trunk). */
export const SEGMENTS: Readonly<Record<Sex, SegmentTable>> = { male, female, unspecified: meanOf(male, female) }
