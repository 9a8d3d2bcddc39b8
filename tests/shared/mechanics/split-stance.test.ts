import { describe, expect, it } from 'vitest'
import type { ExerciseMechanics } from '#shared/mechanics/definition'
import { solveExercise, type Axis, type SolvedFrame } from '#shared/mechanics/index'

const frame = {
  name: 'low',
  trunk: { lean: 10 },
  arms: { shoulder: 0, elbow: 0 },
  legs: { ankle: [0.18, -0.265] as [number, number] },
  offLeg: { ankle: [-0.295, -0.222] as [number, number], foot: 50 },
}
const splitSquat: ExerciseMechanics = {
  guidance: 'ownBody',
  sides: 'oneAtATime',
  grip: 'none',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['feet', 'offFoot'],
  firstPushes: 'inward',
  frames: [frame, frame],
  loads: [{ at: 'hips', direction: 'down' }],
  referenceLoad: 0.3,
}
const low = (mechanics: ExerciseMechanics): SolvedFrame => solveExercise(mechanics, 'male').frames[0]!
const moment = (solved: SolvedFrame, axis: Axis, role = 'working') => {
  const term = solved.terms.find((each) => each.axis === axis && each.role === role)!
  return term.a + 0.3 * term.b
}

describe('feet far apart that push inward', () => {
  it('carry the weight that upright feet at one height carry', () => {
    const shares = (mechanics: ExerciseMechanics) => low(mechanics).reactions.map(({ a, b }) => a + 0.3 * b)
    const turned = shares(splitSquat)
    expect(turned.reduce((sum, share) => sum + share, 0)).toBeCloseTo(1.3, 12)
    for (const [index, share] of shares({ ...splitSquat, firstPushes: 'upright' }).entries()) {
      expect(turned[index]).toBeCloseTo(share, 2)
    }
  })

  it('shift work from the front hip to the front knee, and spare the rear hip', () => {
    const upright = low({ ...splitSquat, firstPushes: 'upright' })
    const turned = low(splitSquat)
    expect(Math.abs(moment(turned, 'hipFlexion'))).toBeLessThan(Math.abs(moment(upright, 'hipFlexion')))
    expect(moment(turned, 'knee')).toBeLessThan(moment(upright, 'knee'))
    expect(Math.abs(moment(turned, 'hipFlexion', 'idle'))).toBeLessThan(Math.abs(moment(upright, 'hipFlexion', 'idle')))
  })

  it('leave the trunk as it is, since only the legs feel where the floor pushes', () => {
    expect(moment(low(splitSquat), 'trunkFlexion', 'middle')).toBeCloseTo(
      moment(low({ ...splitSquat, firstPushes: 'upright' }), 'trunkFlexion', 'middle'),
      12,
    )
  })
})
