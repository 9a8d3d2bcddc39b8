import type { Action, Side, Support } from './vocabulary'

/** [x forward, y left, z up]; positions in fractions of stature, forces in the unit of their set. */
export type Vector = readonly [number, number, number]

/**
 * A signed line through a joint on which the muscles answer, with the action that serves each sign.
 * Axes without actions carry forces other rules need: tension along the forearm (negative is a push), and the force
 * along the spine at L5/S1 (positive pulls it apart).
 */
export const AXES = {
  grip: ['grip', null],
  wristFlexion: ['wristFlexion', 'wristExtension'],
  wristDeviation: ['wristRadialDeviation', 'wristUlnarDeviation'],
  elbow: ['elbowFlexion', 'elbowExtension'],
  shoulderFlexion: ['shoulderFlexion', 'shoulderExtension'],
  shoulderAbduction: ['shoulderAbduction', 'shoulderAdduction'],
  shoulderHorizontal: ['shoulderHorizontalAdduction', 'shoulderHorizontalAbduction'],
  shoulderRotation: ['shoulderInternalRotation', 'shoulderExternalRotation'],
  scapulaSagittal: ['scapularRetraction', 'scapularProtraction'],
  scapulaVertical: ['scapularElevation', 'scapularDepression'],
  neck: ['neckFlexion', 'neckExtension'],
  trunkFlexion: ['trunkFlexion', 'trunkExtension'],
  trunkLateral: ['trunkLateralFlexion', 'trunkLateralFlexion'],
  trunkRotation: ['trunkRotation', 'trunkRotation'],
  hipFlexion: ['hipFlexion', 'hipExtension'],
  hipAbduction: ['hipAbduction', 'hipAdduction'],
  knee: ['kneeFlexion', 'kneeExtension'],
  ankle: ['anklePlantarflexion', 'ankleDorsiflexion'],
  handAxial: [null, null],
  lumbarAxial: [null, null],
} as const satisfies Record<string, readonly [Action | null, Action | null]>
export type Axis = keyof typeof AXES

/** Which limb a term belongs to: the working (or each) side, the idle side of a one-sided exercise, or the midline. */
export type Role = 'working' | 'idle' | 'middle'

/**
 * One muscle moment or force, affine in the external load L (kg) for an athlete of mass m (kg) and stature H (m):
 * moment axes in N·m = m·g·H·a + L·g·H·b, force axes in N = m·g·a + L·g·b. Dimensionless a, b.
 * Positive works as the axis' first action, negative as its second.
 */
export interface Term {
  axis: Axis
  role: Role
  a: number
  b: number
}

/** Drawn points on the midline, and those that each side has. */
export const POINTS = ['pelvis', 'lumbar', 'neckBase', 'headCentre', 'headTop'] as const
export const SIDE_POINTS = [
  'shoulder',
  'elbow',
  'wrist',
  'grip',
  'fingers',
  'hip',
  'knee',
  'ankle',
  'heel',
  'toe',
] as const
export type PointName = (typeof POINTS)[number] | `${Side}.${(typeof SIDE_POINTS)[number]}`

/** Joint positions in stature fractions. The lowest bearing point, or else the lowest point, lies at z = 0. */
export type Pose = Readonly<Record<PointName, Vector>>

/** Anatomical angles in degrees, working side: 0 is the anatomical position, flexion, abduction and plantarflexion positive. */
export interface PoseAngles {
  trunkLean: number
  lumbar: number
  neck: number
  shoulder: number
  elbow: number
  /** Bend between forearm and hand: positive flexed, negative extended. */
  wrist: number
  hip: number
  knee: number
  ankle: number
}

/** What one contact of a solved support bears. */
export interface Reaction {
  support: Support
  role: Role
  at: Vector
  /** Vertical force (one contact) as a share: of m·g, and of L·g. */
  a: number
  b: number
}

/** Where and how the external load pulls, for the figure: unit direction at a point, per application. */
export interface LoadLine {
  at: Vector
  direction: Vector
  kind: 'gravity' | 'cable' | 'pad' | 'assist'
  /** The pulley, when the line ends at one. */
  toward?: Vector
}

/** One posture with all that was computed for it. */
export interface SolvedFrame {
  name: string
  pose: Pose
  angles: PoseAngles
  terms: Term[]
  reactions: Reaction[]
  loadLines: LoadLine[]
}

/** The mechanics of one exercise for one sex' segment table: what is computed once, at publication. */
export interface ExerciseSolution {
  frames: SolvedFrame[]
}
