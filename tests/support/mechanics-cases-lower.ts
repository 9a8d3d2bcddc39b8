import type { ExerciseMechanics } from '#shared/mechanics/definition'
import { base, held, upright } from './mechanics-case-base'

export const squat = (change: Partial<ExerciseMechanics> = {}): ExerciseMechanics => ({
  ...base,
  balance: { solve: 'trunk' },
  loads: [{ at: 'shoulders', direction: 'down', offset: [0, -0.03] }],
  referenceLoad: 0.8,
  frames: [
    { name: 'tall', trunk: { lean: 8 }, arms: { shoulder: -45, elbow: 125 }, legs: { ankle: [0, -0.46] } },
    { name: 'deep', trunk: { lean: 40 }, arms: { shoulder: -45, elbow: 125 }, legs: { ankle: [0.13, -0.26] } },
  ],
  ...change,
})

export const calfRaise = (): ExerciseMechanics => ({
  ...base,
  balance: { solve: 'trunk' },
  loads: [{ at: 'shoulders', direction: 'down' }],
  frames: [
    { name: 'flat', ...upright, arms: { shoulder: 0, elbow: 0 } },
    { name: 'raised', trunk: { lean: 0 }, arms: { shoulder: 0, elbow: 0 }, legs: { hip: 0, knee: 0, ankle: 30 } },
  ],
})

export const oneLegSquat = (): ExerciseMechanics =>
  squat({
    sides: 'oneAtATime',
    frames: [
      {
        name: 'tall',
        trunk: { lean: 5 },
        arms: { shoulder: 60, elbow: 10 },
        legs: { ankle: [0, -0.46] },
        offLeg: { hip: 60, knee: 10 },
      },
      {
        name: 'deep',
        trunk: { lean: 35 },
        arms: { shoulder: 80, elbow: 10 },
        legs: { ankle: [0.1, -0.3] },
        offLeg: { hip: 80, knee: 10 },
      },
    ],
    loads: [],
    referenceLoad: 0,
  })

export const hipThrust = (): ExerciseMechanics => ({
  ...base,
  supports: ['upperBack', 'feet'],
  rise: 0.22,
  balance: { solve: 'trunk' },
  loads: [{ at: 'hips', direction: 'down', offset: [0, 0.05] }],
  referenceLoad: 0.8,
  frames: [
    { name: 'low', trunk: { lean: -50 }, arms: { shoulder: 20, elbow: 10 }, legs: { ankle: [0.25, -0.1] } },
    { name: 'high', trunk: { lean: -80 }, arms: { shoulder: 20, elbow: 10 }, legs: { ankle: [0.25, -0.24] } },
  ],
})

export const proneLegCurl = (): ExerciseMechanics => ({
  ...base,
  guidance: 'leverMachine',
  supports: ['chestPad', 'thighPad'],
  loads: [{ at: 'shank', direction: { square: 'extending' }, along: 0.9 }],
  frames: [
    { name: 'straight', trunk: { lean: 90 }, arms: { shoulder: 150, elbow: 20 }, legs: { hip: 0, knee: 10 } },
    { name: 'bent', trunk: { lean: 90 }, arms: { shoulder: 150, elbow: 20 }, legs: { hip: 0, knee: 100 } },
  ],
})

export const kneeExtension = (): ExerciseMechanics => ({
  ...base,
  guidance: 'leverMachine',
  supports: ['seat', 'backPad'],
  loads: [],
  moments: [{ action: 'kneeExtension', arm: 0.2, curve: [0.8, 1] }],
  frames: [
    { name: 'bent', trunk: { lean: -12 }, arms: { shoulder: -5, elbow: 20 }, legs: { hip: 80, knee: 90 } },
    { name: 'straight', trunk: { lean: -12 }, arms: { shoulder: -5, elbow: 20 }, legs: { hip: 80, knee: 10 } },
  ],
})

/** Shanks held, trunk out in front: both limbs carry half. */
export const backExtension = (): ExerciseMechanics => ({
  ...base,
  supports: ['thighPad', 'shankPad'],
  loads: [{ at: 'shoulders', direction: 'down' }],
  frames: [
    { name: 'level', trunk: { lean: 90 }, arms: { shoulder: 90, elbow: 90 }, legs: { hip: 0, knee: 5 } },
    { name: 'hung', trunk: { lean: 130, lumbar: 10 }, arms: { shoulder: 90, elbow: 90 }, legs: { hip: 60, knee: 5 } },
  ],
})

/** Resting on the forearms and toes. */
export const plank = (): ExerciseMechanics => ({
  ...base,
  guidance: 'ownBody',
  grip: 'none',
  supports: ['forearms', 'feet'],
  balance: { solve: 'trunk' },
  loads: [],
  referenceLoad: 0,
  frames: held({ trunk: { lean: 82 }, arms: { shoulder: 82, elbow: 90 }, legs: { hip: 0, knee: 0, ankle: -5 } }),
})

/** Lying back, feet pushing a sled along its rails. */
export const legPress = (): ExerciseMechanics => ({
  ...base,
  guidance: 'fixedPath',
  supports: ['seat', 'backPad'],
  loads: [{ at: 'feet', direction: { angle: 225 }, ratio: 0.7 }],
  referenceLoad: 1.2,
  frames: [
    {
      name: 'deep',
      trunk: { lean: -45 },
      arms: { shoulder: 10, elbow: 20 },
      legs: { ankle: [0.17, 0.25], foot: -135 },
    },
    {
      name: 'long',
      trunk: { lean: -45 },
      arms: { shoulder: 10, elbow: 20 },
      legs: { ankle: [0.22, 0.37], foot: -135 },
    },
  ],
})

/** The back against a wall that pushes straight out of it. */
export const wallSit = (): ExerciseMechanics => ({
  ...base,
  supports: ['upperBack', 'feet'],
  firstPushes: 'squareToTrunk',
  referenceLoad: 0,
  frames: held({ trunk: { lean: 0 }, arms: { shoulder: 0, elbow: 0 }, legs: { thigh: 80, shank: 0 } }),
})

/** Feet far apart, the rear one on its ball; they push toward each other against the floor. */
export const splitSquat = (): ExerciseMechanics => ({
  ...base,
  sides: 'oneAtATime',
  supports: ['feet', 'offFoot'],
  firstPushes: 'inward',
  balance: { solve: 'legs' },
  frames: [
    {
      name: 'tall',
      trunk: { lean: 5 },
      arms: { shoulder: 5, elbow: 0 },
      legs: { ankle: [0.2, -0.38] },
      offLeg: { thigh: -25, shank: -40, foot: 50 },
    },
    {
      name: 'low',
      trunk: { lean: 8 },
      arms: { shoulder: 8, elbow: 0 },
      legs: { ankle: [0.22, -0.28] },
      offLeg: { thigh: -5, shank: -75, foot: 60 },
    },
  ],
})
