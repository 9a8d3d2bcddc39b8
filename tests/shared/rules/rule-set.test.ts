import { describe, expect, it } from 'vitest'
import { ruleSet as schema } from '#shared/contract/rule-set'
import { ACTIONS, ACTION_JOINT, JOINTS } from '#shared/mechanics/index'
import { type MUSCLES, TARGET_GROUPS } from '#shared/rules/muscle-names'
import { ruleSet } from './movements'

/** Every cited leaf of the rule set. */
function* cited(value: unknown): Generator<{ source: string; certainty: string }> {
  if (value === null || typeof value !== 'object') return
  if ('source' in value && 'certainty' in value) yield value as { source: string; certainty: string }
  for (const inner of Object.values(value)) yield* cited(inner)
}

describe('rule set 1', () => {
  it('names a source and a certainty beside every value', () => {
    const all = [...cited(ruleSet)]
    expect(all.length).toBeGreaterThan(90)
    for (const { source, certainty } of all) expect([source.length > 3, certainty.length > 3]).toEqual([true, true])
  })

  it('is refused with anything missing or unknown', () => {
    const { title: _, ...rest } = ruleSet
    expect(schema.safeParse(rest).success).toBe(false)
    expect(schema.safeParse({ ...ruleSet, extra: 1 }).success).toBe(false)
    const { grip: __, ...norms } = ruleSet.strength.norms
    expect(schema.safeParse({ ...ruleSet, strength: { ...ruleSet.strength, norms } }).success).toBe(false)
  })

  it('gives every action a prime mover with role 1, and every muscle of a target group an action', () => {
    for (const action of ACTIONS) {
      expect([action, Math.max(...Object.values(ruleSet.muscles.roles[action].value))]).toEqual([action, 1])
    }
    for (const muscle of Object.values(TARGET_GROUPS).flat()) {
      expect([muscle, ACTIONS.some((action) => ruleSet.muscles.roles[action].value[muscle])]).toEqual([muscle, true])
    }
  })

  it('binds only channels of the joint a provocation is reported for', () => {
    for (const joint of JOINTS) {
      for (const channels of Object.values(ruleSet.caps.provocations.value[joint])) {
        for (const channel of channels) {
          if (channel in ACTION_JOINT) expect(ACTION_JOINT[channel as keyof typeof ACTION_JOINT]).toBe(joint)
        }
      }
    }
  })

  it('never lets a worse rating cap less', () => {
    const caps = ruleSet.caps.byRating.value
    expect(caps).toEqual([...caps].sort((one, other) => other - one))
    expect(caps.slice(ruleSet.caps.redFlagFrom.value).every((cap) => cap === 0)).toBe(true)
  })

  it('gives coordination 100 points in all', () => {
    expect(Object.values(ruleSet.coordination.points.value).reduce((sum, points) => sum + points, 0)).toBe(100)
  })
})

/**
 * Shares of muscles in an action, %, as read or derived (tolerance about ±15 points). Roles are shares scaled to the prime
 * mover; taken back to shares they must agree. Heads that the rule set counts together are added up here.
 */
const SHARES: Array<[(typeof ACTIONS)[number], Partial<Record<(typeof MUSCLES)[number], number>>, string]> = [
  ['elbowFlexion', { biceps: 54, brachialis: 30, brachioradialis: 16 }, 'derived, at 90°'],
  ['elbowExtension', { triceps: 61, tricepsLongHead: 39 }, 'derived'],
  ['kneeExtension', { vasti: 81, rectusFemoris: 19 }, 'Narici 1992, by force, read'],
  ['anklePlantarflexion', { soleus: 57, gastrocnemius: 43 }, 'by force, read'],
  ['hipExtension', { gluteusMaximus: 48, hamstrings: 46, hipAdductors: 7 }, 'at 0°, read'],
]

describe('muscle roles', () => {
  it.each(SHARES)('of %s agree with published shares within 15 points', (action, shares) => {
    const roles = ruleSet.muscles.roles[action].value
    const sum = Object.values(roles).reduce((total, role) => total + role, 0)
    for (const [muscle, share] of Object.entries(shares)) {
      const own = (100 * (roles[muscle as keyof typeof roles] ?? 0)) / sum
      expect([muscle, Math.abs(own - share) <= 15]).toEqual([muscle, true])
    }
  })

  it('rank the biceps underhand over neutral over overhand (PMC10054060, read)', () => {
    const { underhand, neutral, overhand } = ruleSet.muscles.gripRoles.value
    expect(underhand.biceps ?? 1).toBeGreaterThan(neutral.biceps!)
    expect(neutral.biceps!).toBeGreaterThan(overhand.biceps!)
  })
})
