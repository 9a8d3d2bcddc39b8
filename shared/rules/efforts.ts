import type { RuleSet } from '../contract/rule-set'
import type { Action } from '../mechanics/vocabulary'
import { planOf, type TermPlan } from './plan'
import { strengthTables, type StrengthTables } from './strength'
import type { Athlete, Movement } from './types'

/** Standard gravity, m/s². */
export const GRAVITY = 9.80665

/**
 * One muscle answer of one frame in the athlete's own numbers: value = alpha + beta·L, N·m or N, L in kg.
 * Positive works as the plan's `positive`, negative as `negative`, against the strength of that action here.
 */
export interface Effort extends Pick<TermPlan, 'frame' | 'axis' | 'positive' | 'negative' | 'trains'> {
  alpha: number
  beta: number
  /** Strength of either action here; Infinity where the axis serves none. */
  strengthPositive: number
  strengthNegative: number
}

/** All muscle answers of an exercise for one athlete, frame by frame, in the order mechanics gives them. */
export function effortsOf(
  movement: Pick<Movement, 'mechanics' | 'solution'>,
  athlete: Athlete,
  ruleSet: RuleSet,
  tables: StrengthTables = strengthTables(athlete, ruleSet),
): Effort[] {
  const strength = movement.mechanics.gripFree ? tables.carried : tables.working
  const weight = athlete.bodyMass * GRAVITY
  const efforts: Effort[] = []
  for (const term of planOf(ruleSet)(movement.solution).terms) {
    const arm = term.force ? 1 : athlete.stature
    const { frame, axis, positive, negative, trains } = term
    efforts.push({
      frame,
      axis,
      positive,
      negative,
      trains,
      alpha: weight * arm * term.a,
      beta: GRAVITY * arm * term.b,
      strengthPositive: positive === null ? Number.POSITIVE_INFINITY : strength[positive] * term.leftPositive,
      strengthNegative: negative === null ? Number.POSITIVE_INFINITY : strength[negative] * term.leftNegative,
    })
  }
  return efforts
}

/** Share of strength an effort takes at a load, with the action that answers; null for the side no muscle answers. */
export function demandOf(effort: Effort, load: number): { action: Action; demand: number } | null {
  const value = effort.alpha + effort.beta * load
  const action = value >= 0 ? effort.positive : effort.negative
  if (action === null) return null
  return { action, demand: value >= 0 ? value / effort.strengthPositive : -value / effort.strengthNegative }
}

/** What an exercise asks at a load. */
export interface Asked {
  /** The largest demand of each action over all frames and roles. */
  demands: Map<Action, number>
  /** The same as far as it trains the muscles. */
  work: Map<Action, number>
  /** The action nearest its strength; null when nothing works. The first of equals in order of frames. */
  limiter: { action: Action; demand: number } | null
}

/** Demands, training and limiter at a load, in one pass over the efforts. */
export function askedAt(efforts: readonly Effort[], load: number): Asked {
  const demands = new Map<Action, number>()
  const work = new Map<Action, number>()
  let limiter: Asked['limiter'] = null
  for (const effort of efforts) {
    const value = effort.alpha + effort.beta * load
    const action = value >= 0 ? effort.positive : effort.negative
    if (action === null) continue
    const demand = value >= 0 ? value / effort.strengthPositive : -value / effort.strengthNegative
    if (demand > (demands.get(action) ?? 0)) demands.set(action, demand)
    const trained = demand * effort.trains
    if (trained > (work.get(action) ?? 0)) work.set(action, trained)
    if (demand > (limiter?.demand ?? 0)) limiter = { action, demand }
  }
  return { demands, work, limiter }
}
