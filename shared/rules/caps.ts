import { OTHER_CHANNELS, type RuleSet } from '../contract/rule-set'
import { ACTIONS, ACTION_JOINT, type Joint } from '../mechanics/vocabulary'
import { clamp } from './numbers'
import type { Cap, SoreJointInput, StressChannel } from './types'

/** Which of the loads that are no action a joint can bear. */
const OTHERS_OF: Readonly<Record<Joint, readonly StressChannel[]>> = {
  neck: ['endRange'],
  shoulder: ['leaning', 'endRange'],
  elbow: ['gripPull', 'leaning', 'endRange'],
  wrist: ['leaning', 'endRange'],
  lowerBack: ['leaning', 'endRange'],
  hip: ['endRange'],
  knee: ['endRange'],
  ankle: ['endRange'],
}

/** Every channel through which a joint can be stressed, actions first, always in the same order. */
export function channelsOf(joint: Joint): StressChannel[] {
  return [
    ...ACTIONS.filter((action) => ACTION_JOINT[action] === joint),
    ...OTHER_CHANNELS.filter((channel) => OTHERS_OF[joint].includes(channel)),
  ]
}

/** Whether a report stops training of the joint: a red flag stands, or the pain is rated that high. */
export const isRedFlagged = (sore: Pick<SoreJointInput, 'rating' | 'redFlags'>, ruleSet: RuleSet): boolean =>
  sore.redFlags.length > 0 || sore.rating >= ruleSet.caps.redFlagFrom.value

/** The cap a rating sets on what provokes the joint, 0–1; 0 while a red flag stands. */
export function capOfRating(sore: Pick<SoreJointInput, 'rating' | 'redFlags'>, ruleSet: RuleSet): number {
  if (isRedFlagged(sore, ruleSet)) return 0
  return ruleSet.caps.byRating.value[clamp(Math.ceil(sore.rating), 0, 10)] ?? 0
}

/** The cap on the joint's other channels, at a part of the reduction; null when every channel of the joint is bound. */
export function otherCapOf(sore: SoreJointInput, ruleSet: RuleSet): number | null {
  if (provoked(sore, ruleSet).size === channelsOf(sore.joint).length) return null
  return isRedFlagged(sore, ruleSet) ? 0 : 1 - (1 - capOfRating(sore, ruleSet)) * ruleSet.caps.otherShare.value
}

/** The channels that the reported provocations bind; all of the joint's when one of them is unknown or has no channel. */
function provoked({ joint, provocations }: SoreJointInput, ruleSet: RuleSet): ReadonlySet<StressChannel> {
  const map = ruleSet.caps.provocations.value[joint]
  const all = channelsOf(joint)
  const bound = new Set<StressChannel>()
  if (provocations.length === 0) return new Set(all)
  for (const provocation of provocations) {
    const channels = map[provocation]
    for (const channel of channels.length === 0 ? all : channels) bound.add(channel)
  }
  return bound
}

/**
 * The caps that standing sore joints set, one per channel of each joint: the rating's cap on what provokes it, and at a
 * part of the reduction on the joint's other channels. A red flag caps every channel at 0. Reports of the same joint and side
 * all stay in the list; the strictest binds.
 */
export function capsFromSoreness(sore: readonly SoreJointInput[], ruleSet: RuleSet): Cap[] {
  return sore.flatMap((report) => {
    const limit = capOfRating(report, ruleSet)
    const other = otherCapOf(report, ruleSet) ?? limit
    const bound = provoked(report, ruleSet)
    return channelsOf(report.joint).map((channel): Cap => ({
      joint: report.joint,
      channel,
      side: report.side,
      limit: bound.has(channel) ? limit : other,
      source: { kind: 'soreJoint', soreJointId: report.soreJointId, joint: report.joint },
    }))
  })
}
