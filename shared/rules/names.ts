import type { Equipment } from '../contract/place'
import type { Action, Joint, Side } from '../mechanics/vocabulary'
import type { TargetGroup } from './muscle-names'

/** Plain words for what the sentences speak of. Trade words or everyday English only. */
export const JOINT_NAMES: Readonly<Record<Joint, string>> = {
  neck: 'neck',
  shoulder: 'shoulder',
  elbow: 'elbow',
  wrist: 'wrist',
  lowerBack: 'lower back',
  hip: 'hip',
  knee: 'knee',
  ankle: 'ankle',
}

export const TARGET_NAMES: Readonly<Record<TargetGroup, { name: string; plural: boolean }>> = {
  lats: { name: 'lats', plural: true },
  upperBack: { name: 'upper back', plural: false },
  chest: { name: 'chest', plural: false },
  frontShoulder: { name: 'front of the shoulder', plural: false },
  sideShoulder: { name: 'side of the shoulder', plural: false },
  biceps: { name: 'biceps', plural: false },
  triceps: { name: 'triceps', plural: false },
  forearms: { name: 'forearms', plural: true },
  quadriceps: { name: 'quadriceps', plural: false },
  glutes: { name: 'glutes', plural: true },
  hamstrings: { name: 'hamstrings', plural: true },
  calves: { name: 'calves', plural: true },
  abdomen: { name: 'abdomen', plural: false },
  lowerBack: { name: 'lower back', plural: false },
}

/** What gives out, as the subject of "… gives out first". */
export const ACTION_NAMES: Readonly<Record<Action, string>> = {
  grip: 'grip',
  wristFlexion: 'bending of the wrist',
  wristExtension: 'straightening of the wrist',
  wristRadialDeviation: 'thumbward hold of the wrist',
  wristUlnarDeviation: 'little-finger hold of the wrist',
  elbowFlexion: 'bending of the elbow',
  elbowExtension: 'straightening of the elbow',
  shoulderFlexion: 'forward raise of the shoulder',
  shoulderExtension: 'downward pull of the shoulder',
  shoulderAbduction: 'sideways raise of the shoulder',
  shoulderAdduction: 'inward pull of the shoulder',
  shoulderHorizontalAdduction: 'press across the chest',
  shoulderHorizontalAbduction: 'rearward pull of the shoulder',
  shoulderInternalRotation: 'inward turn of the shoulder',
  shoulderExternalRotation: 'outward turn of the shoulder',
  scapularRetraction: 'drawing back of the shoulder blade',
  scapularProtraction: 'forward push of the shoulder blade',
  scapularElevation: 'lift of the shoulder blade',
  scapularDepression: 'hold of the shoulder blade',
  neckFlexion: 'front of the neck',
  neckExtension: 'back of the neck',
  trunkFlexion: 'front of the trunk',
  trunkExtension: 'lower back',
  trunkLateralFlexion: 'side of the trunk',
  trunkRotation: 'turn of the trunk',
  hipFlexion: 'bending of the hip',
  hipExtension: 'straightening of the hip',
  hipAbduction: 'outward hold of the hip',
  hipAdduction: 'inward pull of the hip',
  kneeFlexion: 'bending of the knee',
  kneeExtension: 'straightening of the knee',
  anklePlantarflexion: 'push of the calf',
  ankleDorsiflexion: 'lift of the foot',
}

/** "right elbow", "lower back". */
export const jointName = (joint: Joint, side: Side | null): string =>
  side === null ? JOINT_NAMES[joint] : `${side} ${JOINT_NAMES[joint]}`

/** "lat pulldown" from `latPulldown`. */
export const equipmentName = (equipment: Equipment): string =>
  equipment.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`).replace('pull up', 'pull-up')

export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)

/** Whole percent, "84 %". */
export const percent = (share: number): string => `${Math.round(share * 100)} %`

/** Whole percent rounded up, for a number that is over its cap. */
export const percentOver = (share: number): string => `${Math.ceil(share * 100 - 1e-9)} %`

/** Kilograms with as many digits as the number needs. */
export const kilograms = (load: number): string => `${Math.round(load * 100) / 100} kg`
