import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { EQUIPMENT, type Equipment } from '#shared/contract/place'
import { INTENTS } from '#shared/contract/session'
import { PROVOCATIONS, RED_FLAGS } from '#shared/contract/sore-joint'
import { ranking } from '#shared/contract/swap'
import { JOINTS, MIDLINE_JOINTS, SEXES, type Joint, type Side } from '#shared/mechanics/index'
import { TARGET_GROUP_NAMES } from '#shared/rules/muscle-names'
import { affectedBy, previewOf, rank, strengths, type RankRequest, type SoreJointInput } from '#shared/rules/index'
import { candidatesFor, movementOf, ruleSet, SLUGS } from './movements'

const CANDIDATES = {
  male: candidatesFor('male'),
  female: candidatesFor('female'),
  unspecified: candidatesFor('unspecified'),
}
const RUNS = { numRuns: 150 }

const sex = fc.constantFrom(...SEXES)
const athlete = fc.record({
  sex,
  bodyMass: fc.double({ min: 35, max: 200, noNaN: true }),
  stature: fc.double({ min: 1.4, max: 2.1, noNaN: true }),
  factors: fc.oneof(
    fc.constant({}),
    fc.record({
      elbowFlexion: fc.double({ min: 0.4, max: 2.5, noNaN: true }),
      grip: fc.double({ min: 0.4, max: 2.5, noNaN: true }),
    }),
  ),
  skill: fc.constantFrom('beginner' as const, 'intermediate' as const, 'advanced' as const),
  minor: fc.boolean(),
})
const sore = (index: number) =>
  fc
    .record({
      joint: fc.constantFrom(...JOINTS),
      side: fc.constantFrom<Side>('left', 'right'),
      rating: fc.integer({ min: 0, max: 7 }),
      provocations: fc.uniqueArray(fc.constantFrom(...PROVOCATIONS), { minLength: 1, maxLength: 3 }),
    })
    .map((report): SoreJointInput => ({
      ...report,
      side: MIDLINE_JOINTS.includes(report.joint) ? null : report.side,
      soreJointId: `00000003-0000-4000-8000-00000000000${index}`,
      redFlags: [],
    }))
const place = fc.oneof(
  fc.constant(null),
  fc
    .uniqueArray(
      fc.tuple(
        fc.constantFrom(...EQUIPMENT),
        fc.option(
          fc.record({
            first: fc.constantFrom(0, 2, 5, 20),
            step: fc.constantFrom(0.5, 1, 1.25, 2.5, 4, 5, 7.5),
            last: fc.constantFrom(40, 80, 120, 240),
          }),
        ),
      ),
      { minLength: 12, maxLength: EQUIPMENT.length, selector: ([item]) => item },
    )
    .map((list) => ({ id: 'place', equipment: new Map<Equipment, (typeof list)[number][1]>(list) })),
)
const request = fc
  .record({
    athlete,
    originalSlug: fc.constantFrom(...SLUGS),
    repetitions: fc.integer({ min: 1, max: 25 }),
    rir: fc.integer({ min: 0, max: 5 }),
    load: fc.option(fc.double({ min: 0, max: 60, noNaN: true })),
    intent: fc.constantFrom(...INTENTS),
    target: fc.constantFrom(...TARGET_GROUP_NAMES),
    sore: fc.oneof(fc.constant([]), fc.tuple(sore(1)), fc.tuple(sore(1), sore(2))),
    place,
  })
  .map(({ originalSlug, repetitions, rir, load, ...rest }): RankRequest => {
    const candidates = CANDIDATES[rest.athlete.sex]
    const original = candidates.find(({ document }) => document.slug === originalSlug)!
    return {
      ...rest,
      candidates,
      original,
      planned: { sets: 3, repetitions, unit: original.document.unit, rir, load, pieces: 1 },
    }
  })

/** Every number anywhere in a value. */
function* numbers(value: unknown): Generator<number> {
  if (typeof value === 'number') yield value
  else if (value !== null && typeof value === 'object') for (const inner of Object.values(value)) yield* numbers(inner)
}
const loadOf = (dose: { load: number | null }) => dose.load ?? 0
const answer = ranking.pick({ originalRow: true, items: true, leftOut: true, sore: true, redFlags: true })

describe('a ranking', { timeout: 60_000 }, () => {
  it('has only finite numbers and keeps the contract for any valid request', () => {
    fc.assert(
      fc.property(request, (asked) => {
        const result = rank(asked, ruleSet)
        for (const value of numbers(result)) expect(Number.isFinite(value)).toBe(true)
        expect(answer.safeParse(result).error?.issues ?? []).toEqual([])
        expect(result.items.length + result.leftOut.length).toBeLessThanOrEqual(asked.candidates.length)
        for (const { score, targetDrive, factors } of result.items) {
          for (const { value } of Object.values(factors)) expect(value >= 0 && value <= 1).toBe(true)
          expect(score >= 0 && score <= 100).toBe(true)
          expect(targetDrive > 0 && targetDrive <= 1 + 1e-9).toBe(true)
        }
      }),
      RUNS,
    )
  })

  it('does not depend on the order of the catalogue, bit for bit', () => {
    fc.assert(
      fc.property(request, fc.array(fc.nat(), { minLength: SLUGS.length, maxLength: SLUGS.length }), (asked, keys) => {
        const shuffled = asked.candidates
          .map((candidate, index) => ({ candidate, key: keys[index]! }))
          .sort((one, other) => one.key - other.key)
          .map(({ candidate }) => candidate)
        expect(JSON.stringify(rank({ ...asked, candidates: shuffled }, ruleSet))).toBe(
          JSON.stringify(rank(asked, ruleSet)),
        )
      }),
      RUNS,
    )
  })

  it('never offers a dose over a cap, rounding included', () => {
    fc.assert(
      fc.property(request, (asked) => {
        for (const { joints } of rank(asked, ruleSet).items) {
          for (const { stress, cap } of joints) if (cap !== null) expect(stress).toBeLessThanOrEqual(cap + 1e-9)
        }
      }),
      RUNS,
    )
  })

  it('never raises a load when a joint is rated sorer or another one is sore too', () => {
    fc.assert(
      fc.property(request, sore(3), fc.integer({ min: 0, max: 7 }), (asked, more, worse) => {
        const first = asked.sore[0]
        const stricter: SoreJointInput[] = [
          ...(first ? [{ ...first, rating: Math.max(first.rating, worse) }] : []),
          ...asked.sore.slice(1),
          more,
        ]
        const before = new Map(rank(asked, ruleSet).items.map(({ exercise, dose }) => [exercise.id, loadOf(dose)]))
        for (const { exercise, dose } of rank({ ...asked, sore: stricter }, ruleSet).items) {
          expect(loadOf(dose)).toBeLessThanOrEqual(before.get(exercise.id) ?? Number.POSITIVE_INFINITY)
        }
      }),
      RUNS,
    )
  })

  it('mirrors with the sore side', () => {
    const mirror = (side: Side | null): Side | null => (side === null ? null : side === 'left' ? 'right' : 'left')
    /** Sides turned round where asked, put in one order; sentences and the order of two sore sides are left aside. */
    const facing = (result: ReturnType<typeof rank>, turn: (side: Side | null) => Side | null) => {
      const joints = (row: {
        joints: Array<{ joint: Joint; side: Side | null; stress: number; cap: number | null }>
      }) => row.joints.map(({ side, ...one }) => JSON.stringify({ ...one, side: turn(side) })).sort()
      return {
        original: result.originalRow && joints(result.originalRow),
        items: result.items.map((row) => [row.exercise.id, row.score, row.dose, row.limiter, joints(row)]),
        leftOut: result.leftOut.map(({ exercise, why }) => [exercise.id, why]),
      }
    }
    fc.assert(
      fc.property(request, (asked) => {
        const mirrored = asked.sore.map((report) => ({ ...report, side: mirror(report.side) }))
        expect(facing(rank({ ...asked, sore: mirrored }, ruleSet), mirror)).toEqual(
          facing(rank(asked, ruleSet), (side) => side),
        )
      }),
      RUNS,
    )
  })
})

describe('a body', { timeout: 60_000 }, () => {
  it('never finds bodyweight work lighter for being heavier at equal strength', () => {
    const own = ['pull-up', 'push-up', 'handstand-hold', 'assisted-pull-up']
    fc.assert(
      fc.property(
        sex,
        fc.constantFrom(...own),
        fc.double({ min: 60, max: 90, noNaN: true }),
        fc.double({ min: 0, max: 30, noNaN: true }),
        (who, slug, mass, more) => {
          const movement = movementOf(CANDIDATES[who].find(({ document }) => document.slug === slug)!)
          const light = {
            sex: who,
            bodyMass: mass,
            stature: 1.7,
            factors: {},
            skill: 'advanced' as const,
            minor: false,
          }
          const strength = strengths(light, ruleSet)
          const heavyNorm = strengths({ ...light, bodyMass: mass + more }, ruleSet)
          const factors = Object.fromEntries(
            Object.entries(strength).map(([action, value]) => [
              action,
              value / heavyNorm[action as keyof typeof heavyNorm],
            ]),
          )
          const worst = (body: typeof light) =>
            Math.max(
              ...previewOf(movement, body, 0, [], ruleSet).frames.flatMap((frame) =>
                frame.actions.map((a) => a.demand),
              ),
            )
          expect(worst({ ...light, bodyMass: mass + more, factors })).toBeGreaterThanOrEqual(worst(light) - 1e-9)
        },
      ),
      RUNS,
    )
  })
})

describe('what a sore joint means for a plan', { timeout: 60_000 }, () => {
  it('names a joint only when it is over its cap or red-flagged, the flags first', () => {
    fc.assert(
      fc.property(request, fc.constantFrom(...RED_FLAGS), fc.boolean(), (asked, flag, flagged) => {
        const reports = asked.sore.map((report, index) =>
          flagged && index === 0 ? { ...report, redFlags: [flag] } : report,
        )
        const affected = affectedBy(asked.original, asked.planned, asked.athlete, reports, ruleSet)
        for (const { verdict, stress, cap } of affected) {
          if (verdict === 'overCap') expect(stress).toBeGreaterThan(cap!)
          else expect(cap).toBe(0)
        }
        const verdicts = affected.map(({ verdict }) => verdict)
        expect(verdicts).toEqual([...verdicts].sort().reverse())
      }),
      RUNS,
    )
  })
})
