import type { RuleSet } from '../contract/rule-set'
import type { Cap, SoreJointInput } from './types'

/** Caps that standing sore joints set, one per channel of each joint. A red flag caps every channel at 0. */
export function capsFromSoreness(_sore: readonly SoreJointInput[], _ruleSet: RuleSet): Cap[] {
  throw new Error('to be written')
}
