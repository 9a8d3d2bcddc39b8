import type { RuleSet } from '../contract/rule-set'
import type { Dose } from '../contract/session'
import { inRepetitions, intensity } from './dose'
import { askedAt, effortsOf, type Asked, type Effort } from './efforts'
import { strengthRange } from './load-range'
import { strengthTables, type StrengthTables } from './strength'
import { strainsOf, type Strain } from './stress'
import type { Athlete, Candidate } from './types'
import { JOINTS, type Joint } from '../mechanics/vocabulary'

/** An exercise with everything about it that depends on the athlete but not on the load. */
export interface Prepared {
  candidate: Candidate
  efforts: Effort[]
  strains: Strain[]
}

/** Works out an exercise for an athlete. */
export function prepare(
  candidate: Candidate,
  athlete: Athlete,
  ruleSet: RuleSet,
  joints: readonly Joint[] = JOINTS,
  tables: StrengthTables = strengthTables(athlete, ruleSet),
): Prepared {
  const movement = { mechanics: candidate.document.mechanics, solution: candidate.solution }
  return {
    candidate,
    efforts: effortsOf(movement, athlete, ruleSet, tables),
    strains: strainsOf(movement, athlete, ruleSet, joints, tables),
  }
}

/** A planned exercise as a healthy athlete would do it. */
export interface Planned extends Prepared, Asked {
  /** kg as mechanics reads it. */
  load: number
  /** Share of the 1RM that the planned repetitions and reserve stand for. */
  intensity: number
  repetitions: number
}

/**
 * The load of a planned dose: as planned, body weight alone for bodyweight work without one, and otherwise the load at which
 * the limiter works at the planned intensity.
 */
export function planned(prepared: Prepared, dose: Dose, ruleSet: RuleSet): Planned {
  const { candidate, efforts } = prepared
  const repetitions = inRepetitions(dose, ruleSet)
  const share = intensity(repetitions, dose.rir, ruleSet)
  const { kind, least, most } = candidate.document.load
  let load = dose.load ?? 0
  if (dose.load === null && (kind === 'external' || kind === 'assistance')) {
    const range = strengthRange(efforts, share)
    const possible = range.least <= range.most && Number.isFinite(range.most) ? range.most : (least ?? 0)
    load =
      kind === 'assistance'
        ? Math.min(possible, 0)
        : Math.max(least ?? 0, Math.min(possible, most ?? Number.POSITIVE_INFINITY))
  }
  return {
    ...prepared,
    load,
    ...askedAt(efforts, load),
    intensity: share,
    repetitions,
  }
}
