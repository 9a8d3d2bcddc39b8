import { LIMITS } from '../contract/limits'
import type { RuleSet } from '../contract/rule-set'
import { FORCE_ACTIONS, type Grip } from '../mechanics/vocabulary'
import { GRAVITY } from './efforts'
import { KEYS, PUSH } from './keys'
import { TARGET_GROUP_NAMES } from './muscle-names'
import { groupRoleIn } from './muscles'
import type { Settings } from './settings'
import type { StrengthTables } from './strength'
import { pushReference } from './stress'
import type { Athlete } from './types'

/** Share of strength per N·m or N of a coefficient, by key: value = gain × size × |L + m·shift|. */
export function gainsOf(athlete: Athlete, tables: StrengthTables, ruleSet: RuleSet): Float64Array {
  return Float64Array.from(KEYS, ({ action, carried }, key) => {
    if (key === PUSH) return GRAVITY / pushReference(athlete, ruleSet)
    if (action === null) return 0
    const arm = FORCE_ACTIONS.includes(action) ? 1 : athlete.stature
    return (GRAVITY * arm) / (carried ? tables.carried : tables.working)[action]
  })
}

/** Target groups that a key serves, with the largest role in each. */
export function groupsByKey(ruleSet: RuleSet): ReadonlyArray<ReadonlyArray<readonly [group: number, role: number]>> {
  return KEYS.map(({ action, grip }) =>
    TARGET_GROUP_NAMES.flatMap((group, g) => {
      const role = action === null ? 0 : groupRoleIn(action, group, grip ?? ('none' satisfies Grip), ruleSet)
      return role > 0 ? [[g, role] as const] : []
    }),
  )
}

/** First piece of the line of loads, a share of body mass; up to `FINE` each is a little longer than the one before. */
const FIRST = 0.03
const FINE = 3
const GROWTH = 1.1
const COARSE = 2

/** Loads as shares of body mass, cut into pieces that cover every setting for every body the contract admits. */
export function piecesOf({ lightest, heaviest }: Settings): number[] {
  const { min, max } = LIMITS.bodyMass
  const sign = lightest < 0 ? -1 : 1
  const [near, far] = sign === 1 ? [lightest, heaviest] : [-heaviest, -lightest]
  const edges = [near / max]
  for (let last = near / max; last < far / min; edges.push(last)) {
    last = Math.max(FIRST, last * (last < FINE ? GROWTH : COARSE))
  }
  return edges.map((edge) => sign * edge)
}

/**
 * The most that each target group's drive can be of the limiter's demand, whatever the load, for strengths in the ratio of
 * `gain`: an upper bound by interval arithmetic, since every row is largest at one end of a piece and smallest at the other.
 * @param gain by key, for a body mass of 1
 */
export function reachOf(
  rows: ReadonlyArray<{ key: number; a: number; b: number; trains: number }>,
  pieces: readonly number[],
  gain: Float64Array,
  groups: ReturnType<typeof groupsByKey>,
): Float64Array {
  const reach = new Float64Array(TARGET_GROUP_NAMES.length)
  const drive = new Float64Array(TARGET_GROUP_NAMES.length)
  for (let piece = 0; piece < Math.max(1, pieces.length - 1); piece++) {
    const from = pieces[piece]!
    const to = pieces[piece + 1] ?? from
    drive.fill(0)
    let limit = 0
    for (const { key, a, b, trains } of rows) {
      const one = gain[key]! * (a + b * from)
      const other = gain[key]! * (a + b * to)
      const most = one > other ? one : other
      const least = one > other ? other : one
      if (least > limit) limit = least
      if (most <= 0) continue
      for (const [group, role] of groups[key]!) {
        const value = most * role * trains
        if (value > drive[group]!) drive[group] = value
      }
    }
    for (let g = 0; g < reach.length; g++) {
      const most = limit > 0 ? drive[g]! / limit : drive[g]! > 0 ? Number.POSITIVE_INFINITY : 0
      if (most > reach[g]!) reach[g] = most
    }
  }
  return reach
}
