import { describe, expect, it } from 'vitest'
import { inUnit, intensity, oneRepMax, repetitionsAt, setAt } from '#shared/rules/dose'
import { ruleSet } from '#tests/shared/rules/movements'

/** % of the 1RM for a number of repetitions, NSCA chart (read; 15 from memory, middle certainty). */
const NSCA: Array<[repetitions: number, percent: number]> = [
  [2, 95],
  [3, 93],
  [4, 90],
  [5, 87],
  [6, 85],
  [7, 83],
  [8, 80],
  [9, 77],
  [10, 75],
  [12, 70],
  [15, 65],
]

/** % of the 1RM at five repetitions by other formulas (derived from formulas remembered with high certainty). */
const AT_FIVE = { brzycki: 88.9, lombardi: 85.1, oConner: 88.9, wathen: 85.8 }

describe('intensity', () => {
  it('is Epley’s: 1RM = w(1 + r/30) (read)', () => {
    expect(oneRepMax(100, 5, 0, ruleSet)).toBeCloseTo(116.667, 3)
    expect(100 * intensity(5, 0, ruleSet)).toBeCloseTo(85.7, 1)
    expect(repetitionsAt(intensity(8, 0, ruleSet), ruleSet)).toBeCloseTo(8, 9)
  })

  it.each(NSCA)(
    'at %i repetitions lies within 2.5 points of the NSCA chart’s %i % (tolerance ours)',
    (repetitions, percent) => {
      expect(Math.abs(100 * intensity(repetitions, 0, ruleSet) - percent)).toBeLessThanOrEqual(2.5)
    },
  )

  it('misses the chart’s 100 % at one repetition by 3.2 points, as Epley does', () => {
    expect(100 - 100 * intensity(1, 0, ruleSet)).toBeCloseTo(3.2, 1)
  })

  it.each(Object.entries(AT_FIVE))(
    'at five repetitions lies within 3.5 points of %s (tolerance ours)',
    (_, percent) => {
      expect(Math.abs(100 * intensity(5, 0, ruleSet) - percent)).toBeLessThanOrEqual(3.5)
    },
  )

  it('counts repetitions in reserve as repetitions not done: RIR = 10 − RPE (read)', () => {
    expect(intensity(6, 2, ruleSet)).toBe(intensity(8, 0, ruleSet))
    expect(oneRepMax(80, 6, 2, ruleSet)).toBe(oneRepMax(80, 8, 0, ruleSet))
  })
})

describe('a hold', () => {
  it('lasts about 60 s at half of strength and 20 s at three quarters (Rohmert 1960, from memory, middle certainty)', () => {
    expect(inUnit(repetitionsAt(0.5, ruleSet), 'seconds', ruleSet)).toBe(60)
    expect(inUnit(repetitionsAt(0.75, ruleSet), 'seconds', ruleSet)).toBe(20)
  })
})

describe('a lighter load', () => {
  const planned = { repetitions: 8, rir: 2 }

  it('keeps the planned effort for size with more repetitions, down to about 30 % of 1RM (Schoenfeld 2017, from memory)', () => {
    const lighter = setAt(0.6, planned, 'size', ruleSet)!
    expect(lighter.repetitions).toBe(18)
    expect(lighter.kept).toBeCloseTo(1, 9)
    const light = setAt(0.35, planned, 'size', ruleSet)!
    expect(light.repetitions).toBe(30)
    expect(light.kept).toBeLessThan(0.75)
    const tooLight = setAt(0.25, planned, 'size', ruleSet)!
    expect(tooLight.repetitions).toBe(8)
    expect(tooLight.kept).toBeLessThan(0.35)
  })

  it('is a loss for strength and skill, shown and not made up for', () => {
    for (const intent of ['strength', 'skill'] as const) {
      const set = setAt(0.5, planned, intent, ruleSet)!
      expect(set.repetitions).toBe(8)
      expect(set.kept).toBeCloseTo(0.5 / 0.75, 9)
    }
  })
})

describe('a load that cannot be made light enough', () => {
  it('takes repetitions off so that the reserve stays, and is refused when not one is left', () => {
    expect(setAt(0.9, { repetitions: 8, rir: 1 }, 'size', ruleSet)?.repetitions).toBe(2)
    expect(setAt(0.95, { repetitions: 8, rir: 1 }, 'size', ruleSet)).toBeNull()
    expect(setAt(1.2, { repetitions: 8, rir: 0 }, 'size', ruleSet)).toBeNull()
  })
})
