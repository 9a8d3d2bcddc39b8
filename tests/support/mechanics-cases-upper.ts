import type { ExerciseMechanics, Frame } from '#shared/mechanics/definition'
import { base, held, upright } from './mechanics-case-base'

/** A hang or pull with the arms overhead in the given plane, legs straight; trunk balanced under the bar. */
export const hang = (change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  guidance: 'ownBody',
  armPlane: 'frontal',
  supports: ['handsHanging'],
  balance: { solve: 'trunk' },
  loads: [{ at: 'hips', direction: 'down' }],
  referenceLoad: 0,
  frames: [
    { name: 'hang', ...upright, arms: { shoulder: 165, elbow: 5 } },
    { name: 'pull', ...upright, arms: { hand: [0.06, 0.08], from: 'world' } },
  ],
  ...change,
})

/** A weight in the hands of somebody standing, arms in the given posture. */
export const standing = (arms: Frame['arms'], change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  balance: { solve: 'trunk' },
  frames: held({ ...upright, arms }),
  ...change,
})

export const curl = (grip: ExerciseMechanics['grip'] = 'underhand'): ExerciseMechanics =>
  standing({ shoulder: 0, elbow: 90 }, { grip })

export const dip = (change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  guidance: 'ownBody',
  grip: 'neutral',
  supports: ['handsPushing'],
  balance: { solve: 'trunk' },
  loads: [{ at: 'hips', direction: 'down' }],
  referenceLoad: 0,
  frames: [
    { name: 'straight', trunk: { lean: 8 }, arms: { hand: [-0.01, -0.32], from: 'world' }, legs: { hip: 5, knee: 40 } },
    { name: 'deep', trunk: { lean: 25 }, arms: { hand: [-0.03, -0.17], from: 'world' }, legs: { hip: 5, knee: 60 } },
  ],
  ...change,
})

/** Lying supine on a bench, feet on the floor. */
export const benchPress = (change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  armPlane: 'transverse',
  gripWidth: 'wide',
  supports: ['backPad', 'feet'],
  referenceLoad: 0.8,
  frames: [
    { name: 'low', trunk: { lean: -90 }, arms: { hand: [0.1, 0.08] }, legs: { ankle: [0.3, -0.2] } },
    { name: 'half', trunk: { lean: -90 }, arms: { hand: [0.1, 0.2] }, legs: { ankle: [0.3, -0.2] } },
    { name: 'high', trunk: { lean: -90 }, arms: { hand: [0.1, 0.3] }, legs: { ankle: [0.3, -0.2] } },
  ],
  ...change,
})

/** Hands flat under the shoulders; `outward` moves them apart from there, in fractions of stature. */
export const pushUp = (outward = 0, change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  guidance: 'ownBody',
  grip: 'none',
  armPlane: 'transverse',
  supports: ['handsPushing', 'feet'],
  balance: { solve: 'trunk', range: [-40, 40] },
  loads: [],
  referenceLoad: 0,
  frames: [
    {
      name: 'up',
      trunk: { lean: 70 },
      arms: { hand: [outward, -0.29], from: 'world', flat: 'forward' },
      legs: { hip: 0, knee: 0, ankle: -10 },
    },
    {
      name: 'down',
      trunk: { lean: 82 },
      arms: { hand: [outward, -0.08], from: 'world', flat: 'forward' },
      legs: { hip: 0, knee: 0, ankle: -10 },
    },
  ],
  ...change,
})

/** On the knees, shanks lying on the floor. */
export const kneePushUp = (): ExerciseMechanics =>
  pushUp(0, {
    supports: ['handsPushing', 'knees'],
    frames: [
      {
        name: 'up',
        trunk: { lean: 60 },
        arms: { hand: [0, -0.29], from: 'world', flat: 'forward' },
        legs: { hip: 0, knee: 30 },
      },
      {
        name: 'down',
        trunk: { lean: 78 },
        arms: { hand: [0, -0.08], from: 'world', flat: 'forward' },
        legs: { hip: 0, knee: 15 },
      },
    ],
  })

export const handstand = (change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  guidance: 'ownBody',
  grip: 'none',
  armPlane: 'frontal',
  supports: ['handsPushing'],
  balance: { solve: 'trunk' },
  loads: [],
  referenceLoad: 0,
  frames: [
    {
      name: 'straight',
      trunk: { lean: 178 },
      arms: { hand: [0.02, -0.3], from: 'world', flat: 'forward' },
      legs: { hip: 0, knee: 0 },
    },
    {
      name: 'bent',
      trunk: { lean: 175 },
      arms: { hand: [0.06, -0.15], from: 'world', flat: 'forward' },
      legs: { hip: 0, knee: 0 },
    },
  ],
  ...change,
})

export const oneArmRow = (change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  sides: 'oneAtATime',
  grip: 'neutral',
  supports: ['feet', 'offHand'],
  rise: -0.3,
  balance: { solve: 'trunk' },
  frames: [
    {
      name: 'low',
      trunk: { lean: 65 },
      arms: { shoulder: 65, elbow: 5 },
      offArm: { hand: [0.06, -0.3], from: 'world' },
      legs: { ankle: [-0.02, -0.46] },
    },
    {
      name: 'high',
      trunk: { lean: 65 },
      arms: { shoulder: -10, elbow: 80 },
      offArm: { hand: [0.06, -0.3], from: 'world' },
      legs: { ankle: [-0.02, -0.46] },
    },
  ],
  ...change,
})

export const pulldown = (change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  guidance: 'cable',
  armPlane: 'frontal',
  supports: ['seat', 'thighPad'],
  loads: [{ at: 'hands', direction: 'up' }],
  referenceLoad: 0.6,
  frames: [
    { name: 'reach', trunk: { lean: 0 }, arms: { shoulder: 165, elbow: 5 }, legs: { hip: 90, knee: 90 } },
    { name: 'pull', trunk: { lean: 0 }, arms: { hand: [0.06, 0.08], from: 'world' }, legs: { hip: 90, knee: 90 } },
  ],
  ...change,
})

/** Cable at chest height, elbows out. */
export const wideCableRow = (): ExerciseMechanics =>
  standing(
    { hand: [0.05, 0.2] },
    {
      armPlane: 'transverse',
      guidance: 'cable',
      loads: [{ at: 'hands', direction: { toward: [0.8, 0.2], of: 'ankle', lateral: 0.1 } }],
    },
  )

/** Lever machine for the shoulders: a pad square to the upper arms. */
export const pullover = (): ExerciseMechanics => ({
  ...base,
  guidance: 'leverMachine',
  supports: ['seat', 'backPad'],
  loads: [{ at: 'upperArm', direction: { square: 'flexing' }, along: 0.95 }],
  frames: [
    { name: 'overhead', trunk: { lean: -5 }, arms: { shoulder: 150, elbow: 90 }, legs: { hip: 85, knee: 85 } },
    { name: 'low', trunk: { lean: -5 }, arms: { shoulder: 10, elbow: 90 }, legs: { hip: 85, knee: 85 } },
  ],
  gripFree: true,
})
