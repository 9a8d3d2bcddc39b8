import type { RuleSet } from '../contract/rule-set'
import type { Muscle } from './muscle-names'
import type { Movement } from './types'

/** The muscles an average adult drives at the exercise's limit, hardest first: the contract's `exercise.muscles`. */
export function musclesOf(
  _movement: Pick<Movement, 'mechanics' | 'solution'>,
  _ruleSet: RuleSet,
): Array<{ muscle: Muscle; drive: number }> {
  throw new Error('to be written')
}
