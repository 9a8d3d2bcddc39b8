import type { RuleSet } from '../contract/rule-set'
import type { RankRequest, RankResult } from './types'

/** Ranks swaps for the original: rows best first, and everything left out by name with its reason. */
export function rank(_request: RankRequest, _ruleSet: RuleSet): RankResult {
  throw new Error('to be written')
}
