import { describe, expect, it } from 'vitest'
import type { Arm, ExerciseMechanics } from '#shared/mechanics/definition'
import { MechanicsError, solveExercise, type SolvedFrame } from '#shared/mechanics/index'

const standing = (arms: Arm, more: Partial<ExerciseMechanics> = {}, lean = 0): SolvedFrame => {
  const frame = { trunk: { lean }, arms, legs: { thigh: 0, shank: 0 } }
  const mechanics: ExerciseMechanics = {
    guidance: 'freeWeight',
    sides: 'both',
    grip: 'neutral',
    gripWidth: 'shoulder',
    armPlane: 'sagittal',
    supports: ['seat'],
    frames: [
      { name: 'one', ...frame },
      { name: 'other', ...frame },
    ],
    loads: [{ at: 'hands', direction: 'down' }],
    referenceLoad: 0.2,
    ...more,
  }
  return solveExercise(mechanics, 'female').frames[0]!
}

describe('forms of an arm', () => {
  it('angles from the world hang straight down however far the trunk leans', () => {
    const { pose, terms } = standing({ shoulder: 0, elbow: 0, from: 'world' }, {}, 60)
    expect(pose['right.grip'][0]).toBeCloseTo(pose['right.shoulder'][0], 12)
    expect(pose['right.grip'][2]).toBeLessThan(pose['right.elbow'][2])
    expect(terms.filter(({ axis }) => axis === 'elbow' || axis === 'shoulderFlexion')).toEqual([])
  })

  it('angles from the world are refused for arms that do not move in the upright plane', () => {
    expect(() => standing({ shoulder: 0, elbow: 0, from: 'world' }, { armPlane: 'frontal' })).toThrow(MechanicsError)
  })

  it('a hand off the arm plane is reached, with the elbow below the line to it', () => {
    const arms: Arm = { hand: [0.005, 0.16, -0.055] }
    const { pose } = standing(arms, { armPlane: 'frontal' })
    const [grip, shoulder, elbow] = [pose['right.grip'], pose['right.shoulder'], pose['right.elbow']]
    expect(grip[0] - shoulder[0]).toBeCloseTo(-0.055, 12)
    expect(grip[1] - shoulder[1]).toBeCloseTo(-0.16, 12)
    expect(grip[2] - shoulder[2]).toBeCloseTo(-0.005, 12)
    expect(elbow[2]).toBeLessThan(grip[2] - 0.1)
  })

  it('an elbow whose hinge lies in the plane of the lift is asked neither to bend nor to straighten', () => {
    const raised = { shoulder: 80, elbow: 10 }
    const axes = (arms: Arm) => standing(arms, { armPlane: 'frontal' }).terms.map(({ axis }) => axis)
    expect(axes(raised)).toContain('elbow')
    expect(axes({ ...raised, elbowSide: 'across' })).not.toContain('elbow')
    expect(axes({ ...raised, elbowSide: 'across' })).toContain('shoulderAbduction')
  })
})
