import type { ExerciseMechanics } from '#shared/mechanics/definition'

/** Plain exercises, authored only as far as drawings and pages need them; the true ones are in seeds/catalogue. */
const standing = { ankle: [0, -0.44] as [number, number] }

const pullUp: ExerciseMechanics = {
  guidance: 'ownBody',
  sides: 'both',
  grip: 'overhand',
  gripWidth: 'shoulder',
  armPlane: 'frontal',
  supports: ['handsHanging'],
  frames: [
    { name: 'hang', trunk: { lean: 0 }, arms: { hand: [-0.32, 0.1] }, legs: { hip: 5, knee: 25, ankle: 30 } },
    { name: 'half way', trunk: { lean: 0 }, arms: { hand: [-0.2, 0.1] }, legs: { hip: 5, knee: 25, ankle: 30 } },
    { name: 'chin over bar', trunk: { lean: 0 }, arms: { hand: [-0.08, 0.1] }, legs: { hip: 5, knee: 25, ankle: 30 } },
  ],
  loads: [{ at: 'hips', direction: 'down' }],
  referenceLoad: 0,
}

const straightArmPulldown: ExerciseMechanics = {
  guidance: 'cable',
  sides: 'both',
  grip: 'overhand',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['feet'],
  frames: [130, 85, 30].map((shoulder, index) => ({
    name: ['start', 'middle', 'end'][index]!,
    trunk: { lean: 18 },
    arms: { shoulder, elbow: 10 },
    legs: standing,
  })),
  balance: { solve: 'legs' },
  loads: [{ at: 'hands', direction: { toward: [0.55, 1.05], of: 'ankle' } }],
  referenceLoad: 0.25,
}

const benchPress: ExerciseMechanics = {
  guidance: 'freeWeight',
  sides: 'both',
  grip: 'overhand',
  gripWidth: 'wide',
  armPlane: 'transverse',
  supports: ['backPad', 'feet'],
  frames: [0.3, 0.2, 0.08].map((up, index) => ({
    name: ['start', 'middle', 'end'][index]!,
    trunk: { lean: -90 },
    arms: { hand: [0.1, up] },
    legs: { ankle: [0.3, -0.2] },
  })),
  loads: [{ at: 'hands', direction: 'down' }],
  referenceLoad: 0.8,
}

const squat: ExerciseMechanics = {
  guidance: 'freeWeight',
  sides: 'both',
  grip: 'overhand',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['feet'],
  frames: [
    { name: 'start', trunk: { lean: 8 }, arms: { shoulder: -45, elbow: 125 }, legs: { ankle: [0, -0.44] } },
    { name: 'middle', trunk: { lean: 30 }, arms: { shoulder: -45, elbow: 125 }, legs: { ankle: [0.1, -0.38] } },
    { name: 'end', trunk: { lean: 42 }, arms: { shoulder: -45, elbow: 125 }, legs: { ankle: [0.15, -0.26] } },
  ],
  balance: { solve: 'legs' },
  loads: [{ at: 'shoulders', direction: 'down', offset: [0, -0.04] }],
  referenceLoad: 0.8,
}

const kneeExtension: ExerciseMechanics = {
  guidance: 'leverMachine',
  sides: 'both',
  grip: 'neutral',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['seat', 'backPad'],
  frames: [90, 50, 5].map((knee, index) => ({
    name: ['start', 'middle', 'end'][index]!,
    trunk: { lean: -12 },
    arms: { shoulder: -5, elbow: 20 },
    legs: { hip: 80, knee },
  })),
  loads: [],
  moments: [{ action: 'kneeExtension', arm: 0.2 }],
  referenceLoad: 0.4,
  gripFree: true,
}

const pushUp: ExerciseMechanics = {
  guidance: 'ownBody',
  sides: 'both',
  grip: 'none',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['handsPushing', 'feet'],
  frames: [
    {
      name: 'top',
      trunk: { lean: 68 },
      arms: { hand: [0, -0.3], from: 'world', flat: 'forward' },
      legs: { hip: 0, knee: 0, ankle: -10 },
    },
    {
      name: 'bottom',
      trunk: { lean: 84 },
      arms: { hand: [-0.03, -0.07], from: 'world', flat: 'forward' },
      legs: { hip: 0, knee: 0, ankle: -10 },
    },
  ],
  balance: { solve: 'trunk' },
  loads: [],
  referenceLoad: 0,
}

const oneArmRow: ExerciseMechanics = {
  guidance: 'freeWeight',
  sides: 'oneAtATime',
  grip: 'neutral',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['offHand', 'feet'],
  rise: 0.26,
  frames: [
    {
      name: 'start',
      trunk: { lean: 70 },
      arms: { shoulder: 70, elbow: 0 },
      offArm: { shoulder: 75, elbow: 10 },
      legs: { ankle: [-0.02, -0.44] },
    },
    {
      name: 'end',
      trunk: { lean: 70 },
      arms: { shoulder: -10, elbow: 90 },
      offArm: { shoulder: 75, elbow: 10 },
      legs: { ankle: [-0.02, -0.44] },
    },
  ],
  loads: [{ at: 'hands', direction: 'down' }],
  referenceLoad: 0.3,
}

const ringDip: ExerciseMechanics = {
  guidance: 'ownBodyOnStraps',
  sides: 'both',
  grip: 'neutral',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['handsPushing'],
  frames: [
    { name: 'top', trunk: { lean: 8 }, arms: { shoulder: 8, elbow: 0 }, legs: { hip: 5, knee: 20 } },
    { name: 'bottom', trunk: { lean: 25 }, arms: { shoulder: -40, elbow: 75 }, legs: { hip: 30, knee: 40 } },
  ],
  balance: { solve: 'legs' },
  loads: [{ at: 'hips', direction: 'down' }],
  referenceLoad: 0,
}

export const SAMPLE_MECHANICS = {
  pullUp,
  straightArmPulldown,
  benchPress,
  squat,
  kneeExtension,
  pushUp,
  oneArmRow,
  ringDip,
  dip: { ...ringDip, guidance: 'ownBody' },
} satisfies Record<string, ExerciseMechanics>
