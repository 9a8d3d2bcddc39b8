import type { RuleSet } from '../contract/rule-set'
import { AXES, type Axis, type PoseAngles, type Role, type Term } from '../mechanics/solution'
import { ACTION_JOINT, FORCE_ACTIONS, JOINTS, type Action } from '../mechanics/vocabulary'
import { heldShare, motionOf, movingStrength, type Motion } from './motion'
import { interpolate } from './numbers'
import { strengths } from './strength'
import type { Athlete, Movement } from './types'

/** Standard gravity, m/s². */
export const GRAVITY = 9.80665

const FORCE_AXES: readonly Axis[] = ['grip', 'scapulaSagittal', 'scapulaVertical', 'handAxial', 'lumbarAxial']
const WRIST_AXES: readonly Axis[] = ['wristFlexion', 'wristDeviation']

/** Axes whose muscles mostly hold by nature: the trunk's, the neck's, the shoulder girdle's and the grip. */
const HELD_BY_NATURE: readonly Axis[] = [
  'grip',
  'scapulaSagittal',
  'scapulaVertical',
  'neck',
  'trunkFlexion',
  'trunkLateral',
  'trunkRotation',
]
/** An exercise in which no joint moves this far is a hold, degrees. */
const HOLD_UNDER = 10

/**
 * One muscle answer of one frame in the athlete's own numbers: value = alpha + beta·L, N·m or N, L in kg.
 * Positive works as `positive`, negative as `negative`, against the strength of that action at the frame's angle.
 */
export interface Effort {
  frame: number
  axis: Axis
  role: Role
  alpha: number
  beta: number
  positive: Action | null
  negative: Action | null
  /** Strength of either action here; Infinity where the axis serves none. */
  strengthPositive: number
  strengthNegative: number
  /** How much of its demand counts as training the muscles: less for a limb joint held still while others move. */
  trains: number
}

/** Factor on the best strength of an action at the posture's angle; 1 unless a published curve is in the rule set. */
function angleFactor(action: Action, angles: PoseAngles, ruleSet: RuleSet): number {
  let factor = 1
  for (const curve of ruleSet.strength.angleCurves) {
    if (curve.action === action) factor *= interpolate(curve.points, angles[curve.angle])
  }
  return factor
}

/** All muscle answers of an exercise for one athlete, frame by frame, in the order mechanics gives them. */
export function effortsOf(
  movement: Pick<Movement, 'mechanics' | 'solution'>,
  athlete: Athlete,
  ruleSet: RuleSet,
  strength: Record<Action, number> = strengths(athlete, ruleSet),
  motion: Motion = motionOf(movement.solution),
): Effort[] {
  const rules = ruleSet.strength
  const body = athlete.bodyMass * GRAVITY
  const fingers = movement.mechanics.gripFree ? 0 : rules.grippingWristArm.value * strength.grip
  const here = (action: Action | null, term: Term, angles: PoseAngles) => {
    if (action === null) return Number.POSITIVE_INFINITY
    // The finger muscles that hold a load or press on the ground cross the wrist and stiffen it.
    const fist = WRIST_AXES.includes(term.axis) ? fingers : 0
    const moved =
      FORCE_ACTIONS.includes(action) || rules.norms[action].moving ? 0 : motion[term.role][ACTION_JOINT[action]]
    const angled = term.role === 'idle' ? 1 : angleFactor(action, angles, ruleSet)
    return (strength[action] + fist) * movingStrength(moved, ruleSet) * angled
  }
  // In a hold nothing moves, and holding is the training.
  const hold = JOINTS.every((joint) => motion.working[joint] < HOLD_UNDER)
  const efforts: Effort[] = []
  movement.solution.frames.forEach((frame, index) => {
    for (const term of frame.terms) {
      const arm = FORCE_AXES.includes(term.axis) ? 1 : athlete.stature
      const [positive, negative] = AXES[term.axis]
      const joint = positive === null ? null : ACTION_JOINT[positive]
      efforts.push({
        frame: index,
        axis: term.axis,
        role: term.role,
        alpha: body * arm * term.a,
        beta: GRAVITY * arm * term.b,
        positive,
        negative,
        strengthPositive: here(positive, term, frame.angles),
        strengthNegative: here(negative, term, frame.angles),
        trains:
          hold || joint === null || HELD_BY_NATURE.includes(term.axis)
            ? 1
            : heldShare(motion[term.role][joint], ruleSet),
      })
    }
  })
  return efforts
}

/** Share of strength an effort takes at a load, with the action that answers; null for axes that no muscle answers. */
export function demandOf(effort: Effort, load: number): { action: Action; demand: number } | null {
  const value = effort.alpha + effort.beta * load
  const action = value >= 0 ? effort.positive : effort.negative
  if (action === null) return null
  return { action, demand: value >= 0 ? value / effort.strengthPositive : -value / effort.strengthNegative }
}

/** The largest demand of each action over all frames and roles at a load. */
export function demandsAt(efforts: readonly Effort[], load: number): Map<Action, number> {
  const demands = new Map<Action, number>()
  for (const effort of efforts) {
    const answer = demandOf(effort, load)
    if (answer && answer.demand > (demands.get(answer.action) ?? 0)) demands.set(answer.action, answer.demand)
  }
  return demands
}

/** The largest demand of each action that counts as training, over all frames and roles: what drives muscles. */
export function workAt(efforts: readonly Effort[], load: number): Map<Action, number> {
  const work = new Map<Action, number>()
  for (const effort of efforts) {
    const answer = demandOf(effort, load)
    const value = answer ? answer.demand * effort.trains : 0
    if (answer && value > (work.get(answer.action) ?? 0)) work.set(answer.action, value)
  }
  return work
}

/** The action nearest its strength at a load; null when nothing works. The first of equals in order of frames. */
export function limiterAt(efforts: readonly Effort[], load: number): { action: Action; demand: number } | null {
  let limiter: { action: Action; demand: number } | null = null
  for (const effort of efforts) {
    const answer = demandOf(effort, load)
    if (answer && answer.demand > (limiter?.demand ?? 0)) limiter = answer
  }
  return limiter
}
