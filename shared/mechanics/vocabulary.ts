/** The closed vocabularies of body, exercise and action. Everything else is typed against them. */

export const SIDES = ['left', 'right'] as const
export type Side = (typeof SIDES)[number]

/** Joints an athlete can report and the engine accounts stress for. */
export const JOINTS = ['neck', 'shoulder', 'elbow', 'wrist', 'lowerBack', 'hip', 'knee', 'ankle'] as const
export type Joint = (typeof JOINTS)[number]
/** Joints on the midline have no side. */
export const MIDLINE_JOINTS: readonly Joint[] = ['neck', 'lowerBack']

/**
 * Signed joint actions: elbow flexion is not elbow extension.
 * Force actions (grip and the scapular ones) are in N, all others in N·m.
 */
export const ACTIONS = [
  'grip',
  'wristFlexion',
  'wristExtension',
  'wristRadialDeviation',
  'wristUlnarDeviation',
  'elbowFlexion',
  'elbowExtension',
  'shoulderFlexion',
  'shoulderExtension',
  'shoulderAbduction',
  'shoulderAdduction',
  'shoulderHorizontalAdduction',
  'shoulderHorizontalAbduction',
  'shoulderInternalRotation',
  'shoulderExternalRotation',
  'scapularRetraction',
  'scapularProtraction',
  'scapularElevation',
  'scapularDepression',
  'neckFlexion',
  'neckExtension',
  'trunkFlexion',
  'trunkExtension',
  'trunkLateralFlexion',
  'trunkRotation',
  'hipFlexion',
  'hipExtension',
  'hipAbduction',
  'hipAdduction',
  'kneeFlexion',
  'kneeExtension',
  'anklePlantarflexion',
  'ankleDorsiflexion',
] as const
export type Action = (typeof ACTIONS)[number]

/** Actions whose strength is a force (N), not a moment. */
export const FORCE_ACTIONS: readonly Action[] = [
  'grip',
  'scapularRetraction',
  'scapularProtraction',
  'scapularElevation',
  'scapularDepression',
]

/** The joint each action belongs to; grip counts at the wrist, the scapular actions at the shoulder. */
export const ACTION_JOINT: Readonly<Record<Action, Joint>> = {
  grip: 'wrist',
  wristFlexion: 'wrist',
  wristExtension: 'wrist',
  wristRadialDeviation: 'wrist',
  wristUlnarDeviation: 'wrist',
  elbowFlexion: 'elbow',
  elbowExtension: 'elbow',
  shoulderFlexion: 'shoulder',
  shoulderExtension: 'shoulder',
  shoulderAbduction: 'shoulder',
  shoulderAdduction: 'shoulder',
  shoulderHorizontalAdduction: 'shoulder',
  shoulderHorizontalAbduction: 'shoulder',
  shoulderInternalRotation: 'shoulder',
  shoulderExternalRotation: 'shoulder',
  scapularRetraction: 'shoulder',
  scapularProtraction: 'shoulder',
  scapularElevation: 'shoulder',
  scapularDepression: 'shoulder',
  neckFlexion: 'neck',
  neckExtension: 'neck',
  trunkFlexion: 'lowerBack',
  trunkExtension: 'lowerBack',
  trunkLateralFlexion: 'lowerBack',
  trunkRotation: 'lowerBack',
  hipFlexion: 'hip',
  hipExtension: 'hip',
  hipAbduction: 'hip',
  hipAdduction: 'hip',
  kneeFlexion: 'knee',
  kneeExtension: 'knee',
  anklePlantarflexion: 'ankle',
  ankleDorsiflexion: 'ankle',
}

/** How free the path of the load is. */
export const GUIDANCES = ['fixedPath', 'leverMachine', 'cable', 'freeWeight', 'ownBody', 'ownBodyOnStraps'] as const
export type Guidance = (typeof GUIDANCES)[number]

/**
 * Where the body bears. The first eight can be solved from statics; the rest only hold what rests on them.
 * `offHand` and `offFoot` are the idle hand and foot of a one-sided exercise bearing weight.
 */
export const SUPPORTS = [
  'handsHanging',
  'handsPushing',
  'forearms',
  'feet',
  'knees',
  'upperBack',
  'offHand',
  'offFoot',
  'seat',
  'backPad',
  'chestPad',
  'thighPad',
  'armPad',
  'forearmPad',
  'shankPad',
] as const
export type Support = (typeof SUPPORTS)[number]

export const GRIPS = ['overhand', 'underhand', 'neutral', 'none'] as const
export type Grip = (typeof GRIPS)[number]

export const GRIP_WIDTHS = ['narrow', 'shoulder', 'wide'] as const
export type GripWidth = (typeof GRIP_WIDTHS)[number]

export const ARM_PLANES = ['sagittal', 'frontal', 'transverse'] as const
export type ArmPlane = (typeof ARM_PLANES)[number]
