import { describe, expect, it } from 'vitest'
import { averageAdult, previewOf, strengths } from '#shared/rules/index'
import { catalogueFor } from '#tests/shared/rules/catalogue'
import { movementOf, ruleSet } from '#tests/shared/rules/movements'

/**
 * 1RM ÷ body mass, mean and SD: Johnson 2009, J Strength Cond Res 23:1022 (read). The pull-up counts body weight.
 * The norms are taken as published but for one factor on joints that move (rule set, strength.moving), which was chosen so that
 * these four hold together: they show that one set of norms can serve both movements, not that it was foretold.
 */
const JOHNSON = {
  'pull-up-overhand': { male: [1.16, 0.15], female: [0.73, 0.09] },
  'lat-pulldown-overhand': { male: [0.93, 0.17], female: [0.55, 0.11] },
} as const

describe.each(['male', 'female'] as const)('the average %s adult', (sex) => {
  const adult = averageAdult(sex, ruleSet)
  const catalogue = catalogueFor(sex)
  const oneRepMax = (slug: string) => {
    const candidate = catalogue.find(({ id }) => id === slug)!
    const preview = previewOf(movementOf(candidate), adult, 0, [], ruleSet)
    return {
      ...preview,
      ratio: (preview.oneRepMax! + (slug.startsWith('pull-up') ? adult.bodyMass : 0)) / adult.bodyMass,
    }
  }

  it.each(Object.entries(JOHNSON))('has a 1RM in the %s within 1.5 SD of the published mean', (slug, published) => {
    const [mean, deviation] = published[sex]
    expect(Math.abs(oneRepMax(slug).ratio - mean)).toBeLessThanOrEqual(1.5 * deviation)
  })

  it('is ended by the shoulder or the elbow in the overhand pull-up, not by the grip', () => {
    expect(oneRepMax('pull-up-overhand').limiter).toMatch(/^(shoulder|elbow)/)
  })
})

describe('strength', () => {
  it('grows with mass to the first power for moments and 0.67 for forces (Jaric 2002, read)', () => {
    const adult = averageAdult('male', ruleSet)
    const norm = strengths(adult, ruleSet)
    const heavy = strengths({ ...adult, bodyMass: 2 * adult.bodyMass }, ruleSet)
    expect(heavy.kneeExtension / norm.kneeExtension).toBeCloseTo(2, 9)
    expect(heavy.grip / norm.grip).toBeCloseTo(2 ** 0.67, 6)
  })

  it('of unspecified sex is the mean of both', () => {
    const body = { bodyMass: 70, factors: {} }
    const [male, female, either] = (['male', 'female', 'unspecified'] as const).map((sex) =>
      strengths({ ...body, sex }, ruleSet),
    )
    expect(either!.elbowFlexion).toBeCloseTo((male!.elbowFlexion + female!.elbowFlexion) / 2, 9)
    expect(either!.grip).toBeCloseTo((male!.grip + female!.grip) / 2, 9)
  })

  it('stands at the norm for an adult of the norm’s mass, times the athlete’s own factor within its bounds', () => {
    const adult = averageAdult('female', ruleSet)
    expect(strengths(adult, ruleSet).elbowFlexion).toBe(ruleSet.strength.norms.elbowFlexion.value.female)
    const own = strengths({ ...adult, factors: { elbowFlexion: 1.5, grip: 99 } }, ruleSet)
    expect(own.elbowFlexion).toBeCloseTo(1.5 * ruleSet.strength.norms.elbowFlexion.value.female, 9)
    expect(own.grip).toBeCloseTo(2.5 * ruleSet.strength.norms.grip.value.female, 9)
  })

  it('keeps the published ratios of the shoulder, 5:4 extension to flexion (read), and 3:2 inward to outward rotation in men', () => {
    const { shoulderExtension, shoulderFlexion, shoulderInternalRotation, shoulderExternalRotation } =
      ruleSet.strength.norms
    expect(shoulderExtension.value.male / shoulderFlexion.value.male).toBeCloseTo(1.25, 1)
    expect(shoulderExtension.value.female / shoulderFlexion.value.female).toBeCloseTo(1.25, 1)
    expect(shoulderInternalRotation.value.male / shoulderExternalRotation.value.male).toBeCloseTo(1.5, 0)
  })
})
