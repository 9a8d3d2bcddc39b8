import { describe, expect, it } from 'vitest'
import type { ExerciseMechanics } from '#shared/mechanics/definition'
import { SEGMENTS, solveExercise, type Axis, type SolvedFrame } from '#shared/mechanics/index'

const base: ExerciseMechanics = {
  guidance: 'ownBody',
  sides: 'both',
  grip: 'none',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['thighPad'],
  frames: [],
  loads: [],
  referenceLoad: 0,
}
const twice = (frame: Omit<ExerciseMechanics['frames'][number], 'name'>) => [
  { name: 'one', ...frame },
  { name: 'other', ...frame },
]
const first = (mechanics: ExerciseMechanics): SolvedFrame => solveExercise(mechanics, 'male').frames[0]!
const term = (frame: SolvedFrame, axis: Axis) => frame.terms.find((each) => each.axis === axis)

describe('joints of limbs that pads hold', () => {
  it('each hip of a trunk hanging level over the thigh pads carries half of its moment', () => {
    const hanging = {
      ...base,
      frames: twice({ trunk: { lean: 90 }, arms: { shoulder: 0, elbow: 0 }, legs: { hip: 0, knee: 0 } }),
    }
    const table = SEGMENTS.male
    const cut = table.pelvis.length
    const shoulder = cut + table.upperTrunk.length
    const moment =
      table.pelvis.mass * table.pelvis.centre +
      table.upperTrunk.mass * (cut + table.upperTrunk.centre) +
      table.head.mass * (shoulder + table.head.centre) +
      2 *
        (table.upperArm.mass * (shoulder - table.upperArm.centre) +
          table.forearm.mass * (shoulder - table.upperArm.length - table.forearm.centre) +
          table.hand.mass * (shoulder - table.upperArm.length - table.forearm.length - table.hand.centre))
    expect(term(first(hanging), 'hipFlexion')!.a).toBeCloseTo(-moment / 2, 10)
    expect(term(first(hanging), 'trunkFlexion')!.a).toBeLessThan(0)
  })

  it('a second pad elsewhere leaves the hips unknown again', () => {
    const held = {
      ...base,
      supports: ['thighPad', 'chestPad'] as ExerciseMechanics['supports'],
      frames: twice({ trunk: { lean: 90 }, arms: { shoulder: 0, elbow: 0 }, legs: { hip: 0, knee: 0 } }),
    }
    expect(term(first(held), 'hipFlexion')).toBeUndefined()
  })

  it('legs that push a plate away lift off the seat, legs at rest on it do not', () => {
    const seated = {
      ...base,
      supports: ['seat', 'backPad'] as ExerciseMechanics['supports'],
      frames: twice({ trunk: { lean: -30 }, arms: { shoulder: 10, elbow: 10 }, legs: { hip: 100, knee: 40 } }),
    }
    expect(term(first(seated), 'hipFlexion')).toBeUndefined()
    const pushing = { ...seated, loads: [{ at: 'feet', direction: { angle: 180 } } as const], referenceLoad: 1 }
    expect(term(first(pushing), 'hipFlexion')!.b).toBeLessThan(0)
  })

  it('a head that lies down leaves the neck out and its weight in', () => {
    const bridge: ExerciseMechanics = {
      ...base,
      supports: ['upperBack', 'feet'],
      rise: 0.06,
      balance: { solve: 'trunk' },
      frames: twice({ trunk: { lean: -105 }, arms: { shoulder: 0, elbow: 0 }, legs: { ankle: [0.24, -0.08] } }),
    }
    const lying = first({ ...bridge, headRests: true })
    expect(term(first(bridge), 'neck')).toBeDefined()
    expect(term(lying, 'neck')).toBeUndefined()
    expect(term(lying, 'hipFlexion')).toEqual(term(first(bridge), 'hipFlexion'))
  })
})
