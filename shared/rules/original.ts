import type { RuleSet } from '../contract/rule-set'
import type { Dose } from '../contract/session'
import { inRepetitions, intensity } from './dose'
import { demandsAt, effortsOf, limiterAt, workAt, type Effort } from './efforts'
import { loadRange, strengthBounds } from './load-range'
import { motionOf } from './motion'
import { strengths } from './strength'
import { strainsOf, type Strain } from './stress'
import type { Athlete, Candidate } from './types'
import type { Action } from '../mechanics/vocabulary'

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
  strength: Record<Action, number> = strengths(athlete, ruleSet),
): Prepared {
  const movement = { mechanics: candidate.document.mechanics, solution: candidate.solution }
  const motion = motionOf(candidate.solution)
  const efforts = effortsOf(movement, athlete, ruleSet, strength, motion)
  return { candidate, efforts, strains: strainsOf(movement, efforts, athlete, ruleSet, motion) }
}

/** A planned exercise as a healthy athlete would do it. */
export interface Planned extends Prepared {
  /** kg as mechanics reads it. */
  load: number
  demands: ReadonlyMap<Action, number>
  /** Demands as far as they train muscles. */
  work: ReadonlyMap<Action, number>
  limiter: { action: Action; demand: number } | null
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
    const range = loadRange(strengthBounds(efforts, share))
    const possible = range.least <= range.most && Number.isFinite(range.most) ? range.most : (least ?? 0)
    load =
      kind === 'assistance'
        ? Math.min(possible, 0)
        : Math.max(least ?? 0, Math.min(possible, most ?? Number.POSITIVE_INFINITY))
  }
  return {
    ...prepared,
    load,
    demands: demandsAt(efforts, load),
    work: workAt(efforts, load),
    limiter: limiterAt(efforts, load),
    intensity: share,
    repetitions,
  }
}
