import type { RuleSet } from '../contract/rule-set'
import { JOINTS, type Joint } from '../mechanics/vocabulary'
import { GRAVITY } from './efforts'
import { power } from './numbers'
import { planOf } from './plan'
import { strengthTables, type StrengthTables } from './strength'
import type { Athlete, Movement, StressChannel } from './types'

/** One way a joint is stressed in one frame: max(0, constant + slope·L), a share of strength. */
export interface Strain {
  joint: Joint
  channel: StressChannel
  frame: number
  constant: number
  slope: number
}

/** The push (N) on one hand that counts as 1: a share of the norm's body weight, grown like a force. */
export function pushReference(athlete: Pick<Athlete, 'sex' | 'bodyMass'>, ruleSet: RuleSet): number {
  const { male, female } = ruleSet.body.mass.value
  const norm = athlete.sex === 'unspecified' ? (male + female) / 2 : athlete.sex === 'male' ? male : female
  const growth = power(athlete.bodyMass / norm, ruleSet.strength.forceExponent.value)
  return ruleSet.stress.leaning.value.reference * norm * GRAVITY * growth
}

/**
 * Everything that stresses some joints through the repetition, each affine in the load (see `planOf`); L5/S1 compression
 * stands with the lower back as what leans on it.
 */
export function strainsOf(
  movement: Pick<Movement, 'mechanics' | 'solution'>,
  athlete: Athlete,
  ruleSet: RuleSet,
  joints: readonly Joint[] = JOINTS,
  tables: StrengthTables = strengthTables(athlete, ruleSet),
): Strain[] {
  const strength = movement.mechanics.gripFree ? tables.carried : tables.working
  const push = pushReference(athlete, ruleSet)
  const weight = athlete.bodyMass * GRAVITY
  const strains: Strain[] = []
  const plan = planOf(ruleSet)(movement.solution)
  for (const joint of joints) {
    for (const { channel, frame, a, b, force, against } of plan.strains[joint]) {
      const full = against === 'push' ? push : strength[against]
      const arm = force ? 1 : athlete.stature
      strains.push({ joint, channel, frame, constant: (weight * arm * a) / full, slope: (GRAVITY * arm * b) / full })
    }
    if (joint !== 'lowerBack') continue
    const most = ruleSet.stress.compressionFull.value
    for (const { frame, constant, slope } of compressions(movement, athlete, ruleSet)) {
      strains.push({ joint, channel: 'leaning', frame, constant: constant / most, slope: slope / most })
    }
  }
  return strains
}

/**
 * L5/S1 compression (N) per frame as the larger of two affine forms: the back's or the belly's muscles pull across the joint
 * at the rule set's arm, and the weight above presses along the spine.
 */
function compressions(
  movement: Pick<Movement, 'solution'>,
  athlete: Athlete,
  ruleSet: RuleSet,
): Array<{ frame: number; constant: number; slope: number }> {
  const arms = athlete.stature / ruleSet.stress.backMuscleArm.value
  const weight = athlete.bodyMass * GRAVITY
  return planOf(ruleSet)(movement.solution).compressions.flatMap(({ frame, moment, axial }) =>
    [arms, -arms].map((arm) => ({
      frame,
      constant: weight * (arm * moment[0] - axial[0]),
      slope: GRAVITY * (arm * moment[1] - axial[1]),
    })),
  )
}

/** L5/S1 compression (kN) of one frame at a load; 0 where the spine is unloaded or pulled. */
export function compressionAt(
  movement: Pick<Movement, 'solution'>,
  frame: number,
  athlete: Athlete,
  load: number,
  ruleSet: RuleSet,
): number {
  let most = 0
  for (const form of compressions(movement, athlete, ruleSet)) {
    if (form.frame !== frame) continue
    const value = form.constant + form.slope * load
    if (value > most) most = value
  }
  return most / 1000
}
