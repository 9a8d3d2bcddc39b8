import { describe, expect, it } from 'vitest'
import type { Candidate, RankResult } from '#shared/rules/index'
import { rank } from '#shared/rules/index'
import { catalogueFor } from './catalogue'
import { man, requestOf, ruleSet, soreJoint, woman } from './movements'

/** Orders that the trade knows (common practice, no source). Nothing in the rules names these exercises: mechanics decides. */
const place = (result: RankResult, slug: string) => result.items.findIndex(({ exercise }) => exercise.slug === slug)
const leftOut = (result: RankResult, slug: string) => result.leftOut.find(({ exercise }) => exercise.slug === slug)
const of = (catalogue: readonly Candidate[], slug: string) => catalogue.find(({ id }) => id === slug)!

describe.each([
  ['man', man],
  ['woman', woman],
] as const)('for an average %s', (_, athlete) => {
  const candidates = catalogueFor(athlete.sex)

  describe.each(['size', 'strength'] as const)('a sore elbow (4 of 10, bending), lats for %s', (intent) => {
    const result = rank(
      requestOf({ athlete, candidates, original: of(candidates, 'pull-up-overhand'), intent, sore: [soreJoint()] }),
      ruleSet,
    )

    it('puts the straight-arm pulldown and the padded pullover above the pulldown, and the pulldown above the pull-up', () => {
      const pulldown = place(result, 'lat-pulldown-overhand')
      expect(pulldown).toBeGreaterThan(-1)
      for (const slug of ['straight-arm-pulldown', 'padded-pullover-machine']) {
        expect([slug, place(result, slug)]).not.toEqual([slug, -1])
        expect(place(result, slug)).toBeLessThan(pulldown)
      }
      const pullUp = place(result, 'pull-up-overhand')
      if (pullUp === -1) expect(['overCap', 'beyondStrength']).toContain(leftOut(result, 'pull-up-overhand')?.why)
      else expect(pullUp).toBeGreaterThan(pulldown)
    })

    it('says so in the row: the elbow stays nearly straight, the cap is 50 or 75 %', () => {
      const row = result.items[place(result, 'straight-arm-pulldown')]!
      expect(row.reason).toMatch(/Your right elbow (stays nearly straight|is held still).*the cap is (50|75) %/)
      expect(row.joints.find(({ joint }) => joint === 'elbow')).toMatchObject({ side: 'right' })
    })
  })

  describe('a sore lower back (4 of 10, bending), quadriceps for size', () => {
    const sore = [soreJoint({ joint: 'lowerBack', side: null })]
    const original = of(candidates, 'barbell-back-squat')
    const result = rank(requestOf({ athlete, candidates, original, target: 'quadriceps', sore }), ruleSet)
    const squat = place(result, 'barbell-back-squat')

    it('puts leg press and knee extension above the barbell squat', () => {
      expect(squat).toBeGreaterThan(-1)
      for (const slug of ['leg-press', 'knee-extension-machine']) {
        expect([slug, place(result, slug)]).not.toEqual([slug, -1])
        expect(place(result, slug)).toBeLessThan(squat)
      }
    })

    it('shows why in the squat’s row: its back works near its cap, that of the machines hardly', () => {
      const back = (slug: string) => {
        const { stress, cap } = result.items[place(result, slug)]!.joints.find(({ joint }) => joint === 'lowerBack')!
        return stress / cap!
      }
      expect(back('barbell-back-squat')).toBeGreaterThan(0.7)
      expect(back('leg-press')).toBeLessThan(0.5)
      expect(back('knee-extension-machine')).toBeLessThan(0.5)
      expect(result.items[squat]!.reason).toContain('Your lower back')
      expect(result.items[squat]!.factors.spare.value).toBeLessThan(0.7)
    })
  })
})
