import type { Preview } from '../contract/exercise'
import type { RuleSet } from '../contract/rule-set'
import type { Athlete, Cap, Movement } from './types'

/** Moments, demands and stresses per frame at a load (kg), with the 1RM, the limiter and the muscles driven. */
export function previewOf(
  _movement: Movement,
  _athlete: Athlete,
  _load: number,
  _caps: readonly Cap[],
  _ruleSet: RuleSet,
): Preview {
  throw new Error('to be written')
}
