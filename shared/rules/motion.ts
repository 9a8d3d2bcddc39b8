import type { RuleSet } from '../contract/rule-set'
import type { ExerciseSolution, Pose, PoseAngles, Role, Vector } from '../mechanics/solution'
import { JOINTS, type Joint } from '../mechanics/vocabulary'
import { memo } from './memo'
import { clamp } from './numbers'

/** The solved angle that tells how far a joint moves. */
const ANGLE_OF: Readonly<Record<Joint, Exclude<keyof PoseAngles, 'trunkLean'>>> = {
  neck: 'neck',
  shoulder: 'shoulder',
  elbow: 'elbow',
  wrist: 'wrist',
  lowerBack: 'lumbar',
  hip: 'hip',
  knee: 'knee',
  ankle: 'ankle',
}

/** The corner of the idle limb at each joint; mechanics gives angles of the working side only. */
const IDLE_CORNER: Partial<Record<Joint, [keyof Pose, keyof Pose, keyof Pose]>> = {
  shoulder: ['lumbar', 'left.shoulder', 'left.elbow'],
  elbow: ['left.shoulder', 'left.elbow', 'left.wrist'],
  wrist: ['left.elbow', 'left.wrist', 'left.fingers'],
  hip: ['lumbar', 'left.hip', 'left.knee'],
  knee: ['left.hip', 'left.knee', 'left.ankle'],
  ankle: ['left.knee', 'left.ankle', 'left.toe'],
}

/** Interior angle at `at`, degrees, to a millionth so that every engine's arc cosine agrees. */
function corner([from, at, to]: readonly [Vector, Vector, Vector]): number {
  let dot = 0
  let first = 0
  let second = 0
  for (const i of [0, 1, 2] as const) {
    const u = from[i] - at[i]
    const v = to[i] - at[i]
    dot += u * v
    first += u * u
    second += v * v
  }
  if (first === 0 || second === 0) return 180
  return Math.round(((Math.acos(clamp(dot / Math.sqrt(first * second), -1, 1)) * 180) / Math.PI) * 1e6) / 1e6
}

const spread = (values: readonly number[]): number => Math.max(...values) - Math.min(...values)

/** How far a joint moves through the repetition, degrees. */
export function excursion(solution: ExerciseSolution, joint: Joint, role: Role): number {
  const points = role === 'idle' ? IDLE_CORNER[joint] : undefined
  if (points)
    return spread(solution.frames.map(({ pose }) => corner([pose[points[0]], pose[points[1]], pose[points[2]]])))
  return spread(solution.frames.map(({ angles }) => angles[ANGLE_OF[joint]]))
}

/** Excursion of every joint (degrees) for each part of the body in a one-sided exercise. */
export type Motion = Record<Role, Record<Joint, number>>

/** Measures every joint's excursion once. */
export const motionOf = memo((solution: ExerciseSolution): Motion => {
  const of = (role: Role) =>
    Object.fromEntries(JOINTS.map((joint) => [joint, excursion(solution, joint, role)])) as Record<Joint, number>
  const working = of('working')
  return { working, idle: of('idle'), middle: working }
})

/**
 * How much of a demand counts as stress: least when the joint is held still, in full from a set excursion on.
 * In single precision, so that a packed catalogue can hold the very same number.
 */
export function stressFactor(degrees: number, ruleSet: RuleSet): number {
  const { still, fullAt } = ruleSet.stress.motion.value
  return Math.fround(still + (1 - still) * clamp(degrees / fullAt, 0, 1))
}

/** How much of its isometric strength a joint has left for moving this far. */
export function movingStrength(degrees: number, ruleSet: RuleSet): number {
  const { share, fullAt } = ruleSet.strength.moving.value
  return 1 - (1 - share) * clamp(degrees / fullAt, 0, 1)
}

/** How much of a limb joint's demand counts as training its muscles, from how far it moves; in single precision as well. */
export function heldShare(degrees: number, ruleSet: RuleSet): number {
  const { share, fullAt } = ruleSet.muscles.held.value
  return Math.fround(share + (1 - share) * clamp(degrees / fullAt, 0, 1))
}
