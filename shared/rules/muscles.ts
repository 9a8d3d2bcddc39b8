import type { RuleSet } from '../contract/rule-set'
import { ACTIONS, type Action, type Grip } from '../mechanics/vocabulary'
import { averageAdult } from './average-adult'
import { effortsOf, limiterAt, workAt } from './efforts'
import { loadRange, strengthBounds } from './load-range'
import { MUSCLES, TARGET_GROUPS, type Muscle, type TargetGroup } from './muscle-names'
import type { Movement } from './types'

/** A muscle's role (0–1) in an action; in elbow flexion the grip turns the roles. */
export function roleIn(action: Action, muscle: Muscle, grip: Grip, ruleSet: RuleSet): number {
  const role = ruleSet.muscles.roles[action].value[muscle] ?? 0
  return action === 'elbowFlexion' ? role * (ruleSet.muscles.gripRoles.value[grip][muscle] ?? 1) : role
}

/** The largest role any muscle of a group has in an action. */
export function groupRoleIn(action: Action, group: TargetGroup, grip: Grip, ruleSet: RuleSet): number {
  let most = 0
  for (const muscle of TARGET_GROUPS[group]) {
    const role = roleIn(action, muscle, grip, ruleSet)
    if (role > most) most = role
  }
  return most
}

/** How hard a group's hardest-driven muscle works: the largest role × demand, of demands that train. */
export function groupDrive(
  work: ReadonlyMap<Action, number>,
  group: TargetGroup,
  grip: Grip,
  ruleSet: RuleSet,
): number {
  let most = 0
  for (const [action, demand] of work) {
    const drive = groupRoleIn(action, group, grip, ruleSet) * demand
    if (drive > most) most = drive
  }
  return most
}

/** drive(muscle) = max over actions of role × demand, hardest first, equal ones in the order of their names' list. */
export function muscleDrives(
  work: ReadonlyMap<Action, number>,
  grip: Grip,
  ruleSet: RuleSet,
): Array<{ muscle: Muscle; drive: number }> {
  return MUSCLES.map((muscle) => {
    let drive = 0
    for (const action of ACTIONS) {
      const value = roleIn(action, muscle, grip, ruleSet) * (work.get(action) ?? 0)
      if (value > drive) drive = value
    }
    return { muscle, drive }
  }).sort((one, other) => other.drive - one.drive)
}

/**
 * The muscles an average adult drives hardest where the exercise's first action gives out, as a share of it (0–1), hardest
 * first: the contract's `exercise.muscles`. Without an external load that can grow, at body weight.
 */
export function musclesOf(
  movement: Pick<Movement, 'mechanics' | 'solution'>,
  ruleSet: RuleSet,
): Array<{ muscle: Muscle; drive: number }> {
  const efforts = effortsOf(movement, averageAdult('unspecified', ruleSet), ruleSet)
  const range = loadRange(strengthBounds(efforts, 1))
  const load = Number.isFinite(range.most) ? range.most : 0
  const limit = limiterAt(efforts, load)?.demand ?? 0
  if (limit === 0) return []
  return muscleDrives(workAt(efforts, load), movement.mechanics.grip, ruleSet)
    .map(({ muscle, drive }) => ({ muscle, drive: drive / limit }))
    .filter(({ drive }) => drive >= ruleSet.muscles.leastListed.value)
}
