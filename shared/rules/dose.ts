import type { RuleSet } from '../contract/rule-set'
import type { Dose, Intent } from '../contract/session'

/** Share of the 1RM at which r repetitions leave q in reserve: 1 ÷ (1 + (r + q) ÷ 30), from Epley. */
export const intensity = (repetitions: number, rir: number, ruleSet: RuleSet): number =>
  1 / (1 + (repetitions + rir) / ruleSet.dose.epley.value)

/** Repetitions possible at a share of the 1RM, not rounded; Infinity at none. Epley turned round. */
export const repetitionsAt = (share: number, ruleSet: RuleSet): number =>
  share <= 0 ? Number.POSITIVE_INFINITY : ruleSet.dose.epley.value * (1 / share - 1)

/** 1RM from a set taken to `rir` in reserve, on the total resisted load (kg): w(1 + (r + q) ÷ 30). Epley. */
export const oneRepMax = (load: number, repetitions: number, rir: number, ruleSet: RuleSet): number =>
  load * (1 + (repetitions + rir) / ruleSet.dose.epley.value)

/** A dose's length in repetitions; a hold counts one for every few seconds. */
export const inRepetitions = (dose: Pick<Dose, 'repetitions' | 'unit'>, ruleSet: RuleSet): number =>
  dose.unit === 'seconds' ? dose.repetitions / ruleSet.dose.secondsPerRepetition.value : dose.repetitions

/** Repetitions in the unit of the exercise, whole and at least 1. */
export function inUnit(repetitions: number, unit: Dose['unit'], ruleSet: RuleSet): number {
  const { secondsPerRepetition, mostSeconds } = ruleSet.dose
  if (unit === 'repetitions') return Math.max(1, Math.floor(repetitions + 1e-9))
  return Math.max(1, Math.floor(Math.min(repetitions * secondsPerRepetition.value, mostSeconds.value) + 1e-9))
}

/**
 * Repetitions of a set whose limiter works at `share` of its strength, and the share of the planned intensity they keep.
 * Fewer than planned when the load cannot be made light enough; more, for size and endurance, when it is lighter than
 * planned; for strength and skill the loss stays a loss. Null when not one repetition leaves the planned reserve.
 */
export function setAt(
  share: number,
  planned: { repetitions: number; rir: number },
  intent: Intent,
  ruleSet: RuleSet,
): { repetitions: number; kept: number } | null {
  const { mostRepetitions, leastIntensity } = ruleSet.dose
  const possible = Math.floor(repetitionsAt(share, ruleSet) - planned.rir + 1e-9)
  if (possible < 1) return null
  const mayRaise = (intent === 'size' || intent === 'endurance') && share >= leastIntensity.value
  const most = mayRaise ? Math.max(planned.repetitions, mostRepetitions.value) : planned.repetitions
  // A planned hold may come to a fraction of a repetition; it stays as planned unless it must change.
  const repetitions =
    possible < planned.repetitions ? possible : Math.max(planned.repetitions, Math.min(possible, most))
  return { repetitions, kept: Math.min(1, share / intensity(repetitions, planned.rir, ruleSet)) }
}
