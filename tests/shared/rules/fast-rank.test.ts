import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { EQUIPMENT } from '#shared/contract/place'
import { INTENTS } from '#shared/contract/session'
import { PROVOCATIONS } from '#shared/contract/sore-joint'
import { JOINTS, MIDLINE_JOINTS, SEXES, type Sex, type Side } from '#shared/mechanics/index'
import { TARGET_GROUP_NAMES } from '#shared/rules/muscle-names'
import {
  packCatalogue,
  rank,
  rankTop,
  type PackedCatalogue,
  type Place,
  type RankRequest,
  type SoreJointInput,
} from '#shared/rules/index'
import { candidatesFor, requestOf, ruleSet, soreJoint } from './movements'
import { generator, syntheticCandidate } from './synthetic'

const ALL = Array.from({ length: 600 }, (_, index) => syntheticCandidate(index))
const random = generator(99)
const YARD: Place = {
  id: 'yard',
  equipment: new Map(
    EQUIPMENT.filter(() => random() < 0.7).map((item, index) => [
      item,
      index % 4 === 0 ? null : { first: [0, 2, 5, 20][index % 4]!, step: [1.25, 2.5, 4, 5][index % 4]!, last: 120 },
    ]),
  ),
}
const PLACES = [null, YARD]
const PACKED = PLACES.map(
  (place) =>
    Object.fromEntries(SEXES.map((sex) => [sex, packCatalogue(ALL, { sex, place }, ruleSet)])) as Record<
      Sex,
      PackedCatalogue
    >,
)

const request = fc
  .record({
    sex: fc.constantFrom(...SEXES),
    bodyMass: fc.double({ min: 45, max: 140, noNaN: true }),
    stature: fc.double({ min: 1.5, max: 2, noNaN: true }),
    skill: fc.constantFrom('beginner' as const, 'intermediate' as const, 'advanced' as const),
    original: fc.nat({ max: ALL.length - 1 }),
    repetitions: fc.integer({ min: 1, max: 20 }),
    rir: fc.integer({ min: 0, max: 4 }),
    intent: fc.constantFrom(...INTENTS),
    target: fc.constantFrom(...TARGET_GROUP_NAMES),
    place: fc.constantFrom(0, 1),
    sore: fc.array(
      fc.record({
        joint: fc.constantFrom(...JOINTS),
        side: fc.constantFrom<Side>('left', 'right'),
        rating: fc.integer({ min: 0, max: 7 }),
        provocations: fc.uniqueArray(fc.constantFrom(...PROVOCATIONS), { minLength: 1, maxLength: 2 }),
      }),
      { maxLength: 3 },
    ),
  })
  .map(({ sex, bodyMass, stature, skill, original, repetitions, rir, place, sore, ...rest }) => ({
    place,
    request: {
      ...rest,
      athlete: { sex, bodyMass, stature, skill, factors: {}, minor: false },
      original: ALL[original]!,
      planned: { sets: 3, repetitions, unit: 'repetitions', rir, load: null, pieces: 1 },
      candidates: ALL,
      sore: sore.map((report, index): SoreJointInput => ({
        ...report,
        side: MIDLINE_JOINTS.includes(report.joint) ? null : report.side,
        soreJointId: `00000003-0000-4000-8000-00000000000${index}`,
        redFlags: [],
      })),
      place: PLACES[place]!,
    } satisfies RankRequest,
  }))

describe('the first rows of a packed catalogue', { timeout: 60_000 }, () => {
  it('are those of the plain ranking, bit for bit, on made-up catalogues', () => {
    let offered = 0
    fc.assert(
      fc.property(request, fc.integer({ min: 1, max: 60 }), ({ request: asked, place }, count) => {
        const plain = rank(asked, ruleSet)
        const fast = rankTop(
          { request: asked, packed: PACKED[place]![asked.athlete.sex], candidateAt: (index) => ALL[index]!, count },
          ruleSet,
        )
        offered += plain.items.length
        expect(JSON.stringify(fast.items)).toBe(JSON.stringify(plain.items.slice(0, count)))
        expect(fast.originalRow).toEqual(plain.originalRow)
        expect(fast.sore).toEqual(plain.sore)
      }),
      { numRuns: 60 },
    )
    expect(offered).toBeGreaterThan(500)
  })

  it('are those of the plain ranking on true movements, for every target and sore joint', () => {
    const candidates = candidatesFor('male')
    const packed = packCatalogue(candidates, { sex: 'male', place: null }, ruleSet)
    for (const target of TARGET_GROUP_NAMES) {
      for (const joint of JOINTS) {
        const side = MIDLINE_JOINTS.includes(joint) ? null : ('left' as const)
        const sore = [soreJoint({ joint, side, provocations: ['unknown'] })]
        const asked = requestOf({ candidates, target, sore, originalSlug: 'pulldown' })
        const fast = rankTop({ request: asked, packed, candidateAt: (index) => candidates[index]!, count: 5 }, ruleSet)
        expect(fast.items).toEqual(rank(asked, ruleSet).items.slice(0, 5))
      }
    }
  })

  it('look closely at only a few of the catalogue', () => {
    const looked = new Set<number>()
    const asked = requestOf({ candidates: ALL, original: candidatesFor('male')[0]! })
    const candidateAt = (index: number) => (looked.add(index), ALL[index]!)
    const fast = rankTop({ request: asked, packed: PACKED[0]!.male, candidateAt, count: 10 }, ruleSet)
    expect(fast.items).toHaveLength(10)
    expect(looked.size).toBeLessThan(30)
  })

  it('keep a red flag’s word', () => {
    const candidates = candidatesFor('male')
    const packed = packCatalogue(candidates, { sex: 'male', place: null }, ruleSet)
    const candidateAt = (index: number) => candidates[index]!
    for (const joint of ['elbow', 'knee'] as const) {
      const asked = requestOf({
        candidates,
        originalSlug: 'pullover-machine',
        sore: [soreJoint({ joint, redFlags: ['nerve'] })],
      })
      const fast = rankTop({ request: asked, packed, candidateAt, count: 5 }, ruleSet)
      expect(fast.items).toEqual(rank(asked, ruleSet).items.slice(0, 5))
      expect(fast.redFlags).toHaveLength(1)
    }
  })
})
