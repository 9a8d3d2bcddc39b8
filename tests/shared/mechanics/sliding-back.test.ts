import { describe, expect, it } from 'vitest'
import type { ExerciseMechanics } from '#shared/mechanics/definition'
import { MechanicsError, SEGMENTS, solveExercise } from '#shared/mechanics/index'

const frame = {
  name: 'seated on air',
  trunk: { lean: 0 },
  arms: { shoulder: 0, elbow: 0 },
  legs: { thigh: 90, shank: 0 },
}
const wallSit: ExerciseMechanics = {
  guidance: 'ownBody',
  sides: 'both',
  grip: 'none',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['upperBack', 'feet'],
  firstPushes: 'squareToTrunk',
  frames: [frame, { ...frame, name: 'still seated' }],
  loads: [{ at: 'hips', direction: 'down' }],
  referenceLoad: 0,
}

describe('a back that bears on a wall or a sliding pad', () => {
  it('leaves all of the weight to the feet', () => {
    const { reactions } = solveExercise(wallSit, 'male').frames[0]!
    const of = (support: string) => reactions.filter((each) => each.support === support)
    expect(of('upperBack')[0]!.a).toBeCloseTo(0, 12)
    expect(of('feet').map(({ a }) => a)).toEqual([expect.closeTo(0.5, 12), expect.closeTo(0.5, 12)])
    expect(of('feet').map(({ b }) => b)).toEqual([expect.closeTo(0.5, 12), expect.closeTo(0.5, 12)])
  })

  it('asks of each knee the couple of ground and wall, by hand for a load on the hips', () => {
    const table = SEGMENTS.male
    const knee = solveExercise(wallSit, 'male').frames[0]!.terms.find(({ axis }) => axis === 'knee')!
    const wallHeight = table.pelvis.length + 0.375 * table.upperTrunk.length
    const middleOfFoot = (0.45 - 0.25) * table.foot.length
    const drop = table.shank.length + table.ankleHeight
    // Ground pushes up under mid-foot; the wall's push, which the feet must return, is sized by moments about mid-foot.
    const wall = (table.thigh.length + middleOfFoot) / (wallHeight + drop)
    expect(knee.b).toBeCloseTo(0.5 * (middleOfFoot - wall * drop), 10)
    expect(knee.b).toBeLessThan(0)
  })

  it('asks nothing of the trunk, and still lets a load on the shoulders press the spine', () => {
    const loaded = { ...wallSit, loads: [{ at: 'shoulders' as const, direction: 'down' as const }] }
    const { terms } = solveExercise(loaded, 'male').frames[0]!
    expect(terms.filter(({ axis }) => axis.startsWith('trunk'))).toEqual([])
    expect(terms.find(({ axis }) => axis === 'lumbarAxial')!.b).toBeCloseTo(-1, 12)
  })

  it('refuses a balance, since the wall holds any lean', () => {
    expect(() => solveExercise({ ...wallSit, balance: { solve: 'trunk' } }, 'male')).toThrow(MechanicsError)
  })

  it('refuses a posture that only a pulling wall could hold', () => {
    const falling = { ...frame, legs: { thigh: 0, shank: -40 } }
    expect(() => solveExercise({ ...wallSit, frames: [falling, falling] }, 'male')).toThrow(/pull/)
  })
})
