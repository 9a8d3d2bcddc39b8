import type { RuleSet } from '../contract/rule-set'
import type { Action } from '../mechanics/vocabulary'
import type { Athlete } from './types'

/** Strength of every action for an athlete: N·m per side (whole trunk), N for force actions. */
export function strengths(_athlete: Athlete, _ruleSet: RuleSet): Record<Action, number> {
  throw new Error('to be written')
}
