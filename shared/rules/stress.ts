import type { RuleSet } from '../contract/rule-set'
import { ACTION_JOINT, type Action, type Joint } from '../mechanics/vocabulary'
import { GRAVITY, type Effort } from './efforts'
import { motionOf, stressFactor, type Motion } from './motion'
import { clamp, power } from './numbers'
import type { Athlete, Movement, StressChannel } from './types'

/** One way a joint is stressed in one frame: max(0, constant + slope·L), a share of strength. */
export interface Strain {
  joint: Joint
  channel: StressChannel
  frame: number
  constant: number
  slope: number
}

const JOINT_OF_ANGLE = {
  lumbar: 'lowerBack',
  neck: 'neck',
  shoulder: 'shoulder',
  elbow: 'elbow',
  wrist: 'wrist',
  hip: 'hip',
  knee: 'knee',
  ankle: 'ankle',
} as const satisfies Record<RuleSet['stress']['endRange'][number]['angle'], Joint>

/** Actions that say nothing about the end of a joint's range. */
const WITHOUT_RANGE: readonly Action[] = [
  'grip',
  'scapularRetraction',
  'scapularProtraction',
  'scapularElevation',
  'scapularDepression',
]

/**
 * Everything that stresses a joint through the repetition, each affine in the load:
 * - every action's demand × its joint's motion factor,
 * - the grip's demand, weighted, at the wrist and the elbow,
 * - weight leaned on hand or forearm, at wrist, elbow and shoulder, and L5/S1 compression at the lower back,
 * - demand (and at the wrist the hand's push) at the end of the range.
 */
export function strainsOf(
  movement: Pick<Movement, 'mechanics' | 'solution'>,
  efforts: readonly Effort[],
  athlete: Athlete,
  ruleSet: RuleSet,
  motion: Motion = motionOf(movement.solution),
): Strain[] {
  const rules = ruleSet.stress
  const push = pushReference(athlete, ruleSet)
  const strains: Strain[] = []
  const add = (joint: Joint, channel: StressChannel, frame: number, constant: number, slope: number) => {
    if (constant > 0 || slope !== 0) strains.push({ joint, channel, frame, constant, slope })
  }
  for (const effort of efforts) {
    const { frame, axis, role, alpha, beta } = effort
    if (axis === 'handAxial') {
      // A push along the forearm; leaned-on joints pass it on.
      for (const joint of rules.leaning.value.joints) add(joint, 'leaning', frame, -alpha / push, -beta / push)
      const severity = role === 'idle' ? 0 : endRange(movement, frame, 'wrist', ruleSet)
      if (severity > 0) add('wrist', 'endRange', frame, (-alpha / push) * severity, (-beta / push) * severity)
      continue
    }
    for (const sign of [1, -1] as const) {
      const action = sign === 1 ? effort.positive : effort.negative
      if (action === null) continue
      const strength = sign === 1 ? effort.strengthPositive : effort.strengthNegative
      const constant = (sign * alpha) / strength
      const slope = (sign * beta) / strength
      const joint = ACTION_JOINT[action]
      if (action === 'grip') {
        const { wrist, elbow } = rules.grip.value
        add('wrist', 'grip', frame, constant * wrist, slope * wrist)
        add('elbow', 'gripPull', frame, constant * elbow, slope * elbow)
        continue
      }
      const factor = stressFactor(motion[role][joint], ruleSet)
      add(joint, action, frame, constant * factor, slope * factor)
      if (role === 'idle' || WITHOUT_RANGE.includes(action)) continue
      const severity = endRange(movement, frame, joint, ruleSet)
      if (severity > 0) add(joint, 'endRange', frame, constant * severity, slope * severity)
    }
  }
  addForearms(movement, athlete, ruleSet, add)
  for (const { frame, constant, slope } of compressions(efforts, ruleSet)) {
    add('lowerBack', 'leaning', frame, constant / rules.compressionFull.value, slope / rules.compressionFull.value)
  }
  return strains
}

/** The push (N) on one hand that counts as 1: a share of the norm's body weight, grown like a force. */
function pushReference(athlete: Athlete, ruleSet: RuleSet): number {
  const { male, female } = ruleSet.body.mass.value
  const norm = athlete.sex === 'unspecified' ? (male + female) / 2 : athlete.sex === 'male' ? male : female
  const growth = power(athlete.bodyMass / norm, ruleSet.strength.forceExponent.value)
  return ruleSet.stress.leaning.value.reference * norm * GRAVITY * growth
}

/** How far into the end of its range a joint is in a frame, 0–1. */
function endRange(movement: Pick<Movement, 'solution'>, frame: number, joint: Joint, ruleSet: RuleSet): number {
  const angles = movement.solution.frames[frame]?.angles
  if (!angles) return 0
  let most = 0
  for (const { angle, from, full } of ruleSet.stress.endRange) {
    if (JOINT_OF_ANGLE[angle] !== joint) continue
    const severity = clamp((angles[angle] - from) / (full - from), 0, 1)
    if (severity > most) most = severity
  }
  return most
}

/** Weight on the forearms leans on elbow and shoulder. */
function addForearms(
  movement: Pick<Movement, 'solution'>,
  athlete: Athlete,
  ruleSet: RuleSet,
  add: (joint: Joint, channel: StressChannel, frame: number, constant: number, slope: number) => void,
): void {
  const push = pushReference(athlete, ruleSet)
  movement.solution.frames.forEach((frame, index) => {
    for (const { support, a, b } of frame.reactions) {
      if (support !== 'forearms') continue
      const constant = (athlete.bodyMass * GRAVITY * a) / push
      const slope = (GRAVITY * b) / push
      add('elbow', 'leaning', index, constant, slope)
      add('shoulder', 'leaning', index, constant, slope)
    }
  })
}

/**
 * L5/S1 compression (N) per frame as the larger of two affine forms: the back's or the belly's muscles pull across the joint
 * at the rule set's arm, and the weight above presses along the spine.
 */
export function compressions(
  efforts: readonly Effort[],
  ruleSet: RuleSet,
): Array<{ frame: number; constant: number; slope: number }> {
  const arm = ruleSet.stress.backMuscleArm.value
  const frames = new Map<number, { moment: [number, number]; axial: [number, number] }>()
  for (const { axis, frame, alpha, beta } of efforts) {
    if (axis !== 'trunkFlexion' && axis !== 'lumbarAxial') continue
    const entry = frames.get(frame) ?? { moment: [0, 0], axial: [0, 0] }
    entry[axis === 'trunkFlexion' ? 'moment' : 'axial'] = [alpha, beta]
    frames.set(frame, entry)
  }
  return [...frames].flatMap(([frame, { moment, axial }]) =>
    [1, -1].map((sign) => ({
      frame,
      constant: (sign * moment[0]) / arm - axial[0],
      slope: (sign * moment[1]) / arm - axial[1],
    })),
  )
}

/** L5/S1 compression (kN) of one frame at a load; 0 where the spine is unloaded or pulled. */
export function compressionAt(efforts: readonly Effort[], frame: number, load: number, ruleSet: RuleSet): number {
  let most = 0
  for (const form of compressions(efforts, ruleSet)) {
    if (form.frame !== frame) continue
    const value = form.constant + form.slope * load
    if (value > most) most = value
  }
  return most / 1000
}
