import type { RuleSet } from '../contract/rule-set'
import { ACTIONS, GRIPS, type Action, type Grip } from '../mechanics/vocabulary'
import { averageAdult } from './average-adult'
import { askedAt, effortsOf } from './efforts'
import { strengthRange } from './load-range'
import { memo } from './memo'
import { MUSCLES, TARGET_GROUPS, TARGET_GROUP_NAMES, type Muscle, type TargetGroup } from './muscle-names'
import type { Movement } from './types'

/** Roles as tables, by grip, action and muscle or target group, in the order of their lists. */
interface RoleTables {
  muscles: Record<Grip, Record<Action, readonly number[]>>
  groups: Record<Grip, Record<Action, Readonly<Record<TargetGroup, number>>>>
}

const record = <K extends string, V>(keys: readonly K[], make: (key: K) => V): Record<K, V> =>
  Object.fromEntries(keys.map((key) => [key, make(key)])) as Record<K, V>

const tablesOf = memo((ruleSet: RuleSet): RoleTables => {
  const role = (action: Action, muscle: Muscle, grip: Grip): number => {
    const own = ruleSet.muscles.roles[action].value[muscle] ?? 0
    return action === 'elbowFlexion' ? own * (ruleSet.muscles.gripRoles.value[grip][muscle] ?? 1) : own
  }
  return {
    muscles: record(GRIPS, (grip) => record(ACTIONS, (action) => MUSCLES.map((muscle) => role(action, muscle, grip)))),
    groups: record(GRIPS, (grip) =>
      record(ACTIONS, (action) =>
        record(TARGET_GROUP_NAMES, (group) =>
          Math.max(...TARGET_GROUPS[group].map((muscle) => role(action, muscle, grip))),
        ),
      ),
    ),
  }
})

/** The roles (0–1) of every muscle in an action, in the order of `MUSCLES`; in elbow flexion the grip turns them. */
export const rolesIn = (action: Action, grip: Grip, ruleSet: RuleSet): readonly number[] =>
  tablesOf(ruleSet).muscles[grip][action]

/** The largest role any muscle of a group has in an action. */
export const groupRoleIn = (action: Action, group: TargetGroup, grip: Grip, ruleSet: RuleSet): number =>
  tablesOf(ruleSet).groups[grip][action][group]

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
  const drives = MUSCLES.map(() => 0)
  for (const [action, demand] of work) {
    rolesIn(action, grip, ruleSet).forEach((role, index) => {
      if (role * demand > drives[index]!) drives[index] = role * demand
    })
  }
  return MUSCLES.map((muscle, index) => ({ muscle, drive: drives[index]! })).sort(
    (one, other) => other.drive - one.drive,
  )
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
  const range = strengthRange(efforts, 1)
  const load = Number.isFinite(range.most) ? range.most : 0
  const { limiter, work } = askedAt(efforts, load)
  if (limiter === null) return []
  return muscleDrives(work, movement.mechanics.grip, ruleSet)
    .map(({ muscle, drive }) => ({ muscle, drive: drive / limiter.demand }))
    .filter(({ drive }) => drive >= ruleSet.muscles.leastListed.value)
}
