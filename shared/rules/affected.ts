import type { RuleSet } from '../contract/rule-set'
import type { Dose, Slot } from '../contract/session'
import type { Athlete, Candidate, SoreJointInput } from './types'

/** What a sore joint means for a planned exercise: the contract's entry of `slot.affected`. */
export type Affected = Slot['affected'][number]

/** The sore joints that a planned dose puts over their cap, or that are red-flagged and loaded; the worst first. */
export function affectedBy(
  _candidate: Candidate,
  _planned: Dose,
  _athlete: Athlete,
  _sore: readonly SoreJointInput[],
  _ruleSet: RuleSet,
): Affected[] {
  throw new Error('to be written')
}
