import type { RuleSet } from '../contract/rule-set'
import { AXES, type Axis, type ExerciseSolution, type PoseAngles, type Role } from '../mechanics/solution'
import { ACTION_JOINT, FORCE_ACTIONS, JOINTS, type Action, type Joint } from '../mechanics/vocabulary'
import { memo } from './memo'
import { heldShare, motionOf, movingStrength, stressFactor } from './motion'
import { clamp, interpolate } from './numbers'
import type { StressChannel } from './types'

/** A muscle answer with everything about it that no athlete changes. */
export interface TermPlan {
  frame: number
  axis: Axis
  role: Role
  a: number
  b: number
  /** A force scales with m·g, a moment with m·g·H. */
  force: boolean
  positive: Action | null
  negative: Action | null
  /** Share of the action's best strength left at this angle and for moving this far. */
  leftPositive: number
  leftNegative: number
  /** How much of its demand counts as training the muscles: less for a limb joint held still while others move. */
  trains: number
}

/** One way a joint is stressed, one-sided: value(a, b) ÷ what it is measured against. */
export interface StrainPlan {
  joint: Joint
  channel: StressChannel
  frame: number
  /** Signed coefficients, already weighted. */
  a: number
  b: number
  force: boolean
  /** The action whose strength it is a share of, or the push on a hand that counts as 1. */
  against: Action | 'push'
}

/** Coefficients of the trunk's moment and of the force along the spine, from which compression is made. */
export interface CompressionPlan {
  frame: number
  moment: readonly [a: number, b: number]
  axial: readonly [a: number, b: number]
}

/** What the rules make of a solved exercise before they know the athlete. */
export interface Plan {
  terms: readonly TermPlan[]
  strains: Readonly<Record<Joint, readonly StrainPlan[]>>
  compressions: readonly CompressionPlan[]
}

const FORCE_AXES: readonly Axis[] = ['grip', 'scapulaSagittal', 'scapulaVertical', 'handAxial', 'lumbarAxial']
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

/** Factor on the best strength of an action at the posture's angle; 1 unless a published curve is in the rule set. */
function angleFactor(action: Action, angles: PoseAngles, ruleSet: RuleSet): number {
  let factor = 1
  for (const curve of ruleSet.strength.angleCurves) {
    if (curve.action === action) factor *= interpolate(curve.points, angles[curve.angle])
  }
  return factor
}

/** How far into the end of its range every joint is in a frame, 0–1. */
function endRanges(angles: PoseAngles, ruleSet: RuleSet): Partial<Record<Joint, number>> {
  const severities: Partial<Record<Joint, number>> = {}
  for (const { angle, from, full } of ruleSet.stress.endRange) {
    const joint = JOINT_OF_ANGLE[angle]
    const severity = clamp((angles[angle] - from) / (full - from), 0, 1)
    if (severity > (severities[joint] ?? 0)) severities[joint] = severity
  }
  return severities
}

/**
 * The plan of a solved exercise under a rule set: strength left, stress channels and training value of every term.
 * - every action's demand × its joint's motion factor,
 * - the grip's demand, weighted, at the wrist and the elbow,
 * - weight leaned on hand or forearm, at wrist, elbow and shoulder,
 * - demand (and at the wrist the hand's push) at the end of the range.
 */
export const planOf = memo((ruleSet: RuleSet) =>
  memo((solution: ExerciseSolution): Plan => makePlan(solution, ruleSet)),
)

function makePlan(solution: ExerciseSolution, ruleSet: RuleSet): Plan {
  const motion = motionOf(solution)
  const rules = ruleSet.stress
  // In a hold nothing moves, and holding is the training.
  const hold = JOINTS.every((joint) => motion.working[joint] < HOLD_UNDER)
  const terms: TermPlan[] = []
  const strains = Object.fromEntries(JOINTS.map((joint) => [joint, [] as StrainPlan[]])) as Record<Joint, StrainPlan[]>
  const compressions: CompressionPlan[] = []
  const strain = (plan: StrainPlan) => {
    if (plan.a > 0 || plan.b !== 0) strains[plan.joint].push(plan)
  }
  solution.frames.forEach(({ terms: solved, angles, reactions }, frame) => {
    const ends = endRanges(angles, ruleSet)
    let moment: readonly [number, number] = [0, 0]
    let axial: readonly [number, number] = [0, 0]
    for (const { axis, role, a, b } of solved) {
      const force = FORCE_AXES.includes(axis)
      if (axis === 'trunkFlexion') moment = [a, b]
      if (axis === 'lumbarAxial') axial = [a, b]
      if (axis === 'handAxial') {
        for (const joint of rules.leaning.value.joints) {
          strain({ joint, channel: 'leaning', frame, a: -a, b: -b, force, against: 'push' })
        }
        const end = role === 'idle' ? 0 : (ends.wrist ?? 0)
        if (end > 0)
          strain({ joint: 'wrist', channel: 'endRange', frame, a: -a * end, b: -b * end, force, against: 'push' })
      }
      const [positive, negative] = AXES[axis]
      if (positive === null) continue
      const joint = ACTION_JOINT[positive]
      const moved = motion[role][joint]
      const left = (action: Action | null) =>
        action === null
          ? 1
          : movingStrength(
              FORCE_ACTIONS.includes(action) || ruleSet.strength.norms[action].moving ? 0 : moved,
              ruleSet,
            ) * (role === 'idle' ? 1 : angleFactor(action, angles, ruleSet))
      const term: TermPlan = {
        frame,
        axis,
        role,
        a,
        b,
        force,
        positive,
        negative,
        leftPositive: left(positive),
        leftNegative: left(negative),
        trains: hold || HELD_BY_NATURE.includes(axis) ? 1 : heldShare(moved, ruleSet),
      }
      terms.push(term)
      for (const sign of [1, -1] as const) {
        const action = sign === 1 ? positive : negative
        if (action === null) continue
        const share = sign / (sign === 1 ? term.leftPositive : term.leftNegative)
        const weighted = (weight: number) => ({
          frame,
          a: a * share * weight,
          b: b * share * weight,
          force,
          against: action,
        })
        if (action === 'grip') {
          strain({ joint: 'wrist', channel: 'grip', ...weighted(rules.grip.value.wrist) })
          strain({ joint: 'elbow', channel: 'gripPull', ...weighted(rules.grip.value.elbow) })
          continue
        }
        strain({ joint: ACTION_JOINT[action], channel: action, ...weighted(stressFactor(moved, ruleSet)) })
        // The angles of the idle side are not known, and the shoulder girdle has no range here.
        const end = role === 'idle' || FORCE_ACTIONS.includes(action) ? 0 : (ends[ACTION_JOINT[action]] ?? 0)
        if (end > 0) strain({ joint: ACTION_JOINT[action], channel: 'endRange', ...weighted(end) })
      }
    }
    for (const { support, a, b } of reactions) {
      if (support !== 'forearms') continue
      for (const joint of ['elbow', 'shoulder'] as const) {
        strain({ joint, channel: 'leaning', frame, a, b, force: true, against: 'push' })
      }
    }
    compressions.push({ frame, moment, axial })
  })
  return { terms, strains, compressions }
}
