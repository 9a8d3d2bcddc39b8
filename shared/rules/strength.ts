import type { RuleSet } from '../contract/rule-set'
import { ACTIONS, FORCE_ACTIONS, type Action } from '../mechanics/vocabulary'
import { clamp, power } from './numbers'
import type { Athlete } from './types'

/**
 * Strength of every action for an athlete at the joint's best angle: the norm of their sex, grown with body mass, times the
 * athlete's own factor within the rule set's bounds. N·m per side (whole trunk and neck), N for force actions.
 * Unspecified sex is the mean of both. Sources and certainty stand beside each norm in the rule set.
 */
export function strengths(
  athlete: Pick<Athlete, 'sex' | 'bodyMass' | 'factors'>,
  ruleSet: RuleSet,
): Record<Action, number> {
  const { norms, momentExponent, forceExponent, ownFactor } = ruleSet.strength
  const { mass } = ruleSet.body
  const growth = (sex: 'male' | 'female', exponent: number) => power(athlete.bodyMass / mass.value[sex], exponent)
  const moment = { male: growth('male', momentExponent.value), female: growth('female', momentExponent.value) }
  const force = { male: growth('male', forceExponent.value), female: growth('female', forceExponent.value) }
  const result = {} as Record<Action, number>
  for (const action of ACTIONS) {
    const norm = norms[action].value
    const grown = FORCE_ACTIONS.includes(action) ? force : moment
    const male = norm.male * grown.male
    const female = norm.female * grown.female
    const usual = athlete.sex === 'unspecified' ? (male + female) / 2 : athlete.sex === 'male' ? male : female
    result[action] = usual * clamp(athlete.factors[action] ?? 1, ownFactor.value.least, ownFactor.value.most)
  }
  return result
}

/** Strength as an exercise finds it: with the hand working, and with straps or a cuff carrying it. */
export interface StrengthTables {
  working: Readonly<Record<Action, number>>
  carried: Readonly<Record<Action, number>>
}

const WRIST: readonly Action[] = ['wristFlexion', 'wristExtension', 'wristRadialDeviation', 'wristUlnarDeviation']

/**
 * Both tables for an athlete. The finger muscles that hold a load or press on the ground cross the wrist and stiffen it,
 * unless the hand is carried.
 */
export function strengthTables(
  athlete: Pick<Athlete, 'sex' | 'bodyMass' | 'factors'>,
  ruleSet: RuleSet,
): StrengthTables {
  const carried = strengths(athlete, ruleSet)
  const fingers = ruleSet.strength.grippingWristArm.value * carried.grip
  const working = { ...carried }
  for (const action of WRIST) working[action] += fingers
  return { working, carried }
}
