import { describe, expect, it } from 'vitest'
import { SEGMENTS, SEXES, solveExercise } from '#shared/mechanics/index'
import { MECHANICS_CASES } from '#tests/support/mechanics-cases'

describe('the body', () => {
  it.each(SEXES)('of %s weighs what it weighs and stands as tall as it stands', (sex) => {
    const table = SEGMENTS[sex]
    const paired = [table.upperArm, table.forearm, table.hand, table.thigh, table.shank, table.foot]
    const single = [table.head, table.upperTrunk, table.pelvis]
    const mass = paired.reduce((sum, { mass }) => sum + 2 * mass, 0) + single.reduce((sum, { mass }) => sum + mass, 0)
    expect(mass).toBeCloseTo(1, 3)
    const tall =
      table.ankleHeight +
      table.shank.length +
      table.thigh.length +
      table.pelvis.length +
      table.upperTrunk.length +
      table.head.length
    expect(tall).toBeCloseTo(1, 12)
    for (const segment of [...paired, table.head, table.upperTrunk]) {
      expect(segment.centre).toBeGreaterThan(0)
      expect(segment.centre).toBeLessThan(segment.length)
    }
  })

  // de Leva 1996 (F): the whole trunk's mass centre at 43.10 % (men), 37.82 % (women) from mid-shoulder to mid-hip.
  it.each([
    ['male', 0.431, 515.5 / 1741],
    ['female', 0.3782, 497.9 / 1735],
  ] as const)('of %s keeps the mass centre of the whole trunk where de Leva has it', (sex, share, trunk) => {
    const { upperTrunk, pelvis } = SEGMENTS[sex]
    const height = upperTrunk.mass * (pelvis.length + upperTrunk.centre) + pelvis.mass * pelvis.centre
    expect(pelvis.length + upperTrunk.length).toBeCloseTo(trunk, 12)
    expect(height / (upperTrunk.mass + pelvis.mass)).toBeCloseTo((1 - share) * trunk, 12)
  })

  it('is the same however often it is solved', () => {
    for (const mechanics of Object.values(MECHANICS_CASES)) {
      expect(solveExercise(mechanics, 'female')).toEqual(solveExercise(structuredClone(mechanics), 'female'))
    }
  })
})
