import type { ExerciseDocument } from '../contract/exercise'
import type { RuleSet } from '../contract/rule-set'
import type { ExerciseSolution } from '../mechanics/solution'

/** Coordination demand 0–100 from structure alone. */
export function coordinationDemand(
  _document: Pick<ExerciseDocument, 'mechanics' | 'skill' | 'speed'>,
  _solution: ExerciseSolution,
  _ruleSet: RuleSet,
): number {
  throw new Error('to be written')
}
