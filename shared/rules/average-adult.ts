import type { RuleSet } from '../contract/rule-set'
import type { Sex } from '../mechanics/sex'
import type { Athlete } from './types'

/** The adult the norms were measured on: norm body mass and stature, no own factors. */
export function averageAdult(sex: Sex, ruleSet: RuleSet): Athlete {
  const { mass, stature } = ruleSet.body
  const mean = (value: { male: number; female: number }) =>
    sex === 'unspecified' ? (value.male + value.female) / 2 : value[sex]
  return { sex, bodyMass: mean(mass.value), stature: mean(stature.value), factors: {}, skill: 'advanced', minor: false }
}
