import type { ExerciseDocument } from '#shared/contract/exercise'
import type { ExerciseMechanics } from '#shared/mechanics/index'

const seated = { hip: 90, knee: 90 }
const standing = { ankle: [0.1, -0.44] as [number, number] }

/** Small true movements, each with just enough geometry for what the tests ask of it. */
export const MOVEMENTS: Record<string, { mechanics: ExerciseMechanics; rest: Partial<ExerciseDocument> }> = {
  'pull-up': {
    mechanics: {
      guidance: 'ownBody',
      sides: 'both',
      grip: 'overhand',
      gripWidth: 'shoulder',
      armPlane: 'frontal',
      supports: ['handsHanging'],
      frames: [
        { name: 'hang', trunk: { lean: 0 }, arms: { hand: [0.08, 0.325], from: 'world' }, legs: { hip: 0, knee: 10 } },
        { name: 'middle', trunk: { lean: 0 }, arms: { hand: [0.08, 0.17], from: 'world' }, legs: { hip: 0, knee: 10 } },
        { name: 'top', trunk: { lean: 0 }, arms: { hand: [0.08, 0.04], from: 'world' }, legs: { hip: 0, knee: 10 } },
      ],
      balance: { solve: 'trunk' },
      loads: [{ at: 'hips', direction: 'down' }],
      referenceLoad: 0,
    },
    rest: {
      equipment: ['pullUpBar'],
      load: { kind: 'added', from: 'dipBelt', most: 100 },
      kind: 'core',
      skill: 'intermediate',
    },
  },
  pulldown: {
    mechanics: {
      guidance: 'cable',
      sides: 'both',
      grip: 'overhand',
      gripWidth: 'shoulder',
      armPlane: 'frontal',
      supports: ['seat', 'thighPad'],
      frames: [
        { name: 'reach', trunk: { lean: 0 }, arms: { hand: [0.08, 0.325], from: 'world' }, legs: seated },
        { name: 'middle', trunk: { lean: 0 }, arms: { hand: [0.08, 0.17], from: 'world' }, legs: seated },
        { name: 'chest', trunk: { lean: 0 }, arms: { hand: [0.08, 0.04], from: 'world' }, legs: seated },
      ],
      loads: [{ at: 'hands', direction: 'up' }],
      referenceLoad: 0.5,
    },
    rest: { equipment: ['latPulldown'], load: { kind: 'external', from: 'latPulldown', least: 5, most: 120 } },
  },
  'straight-arm-pulldown': {
    mechanics: {
      guidance: 'cable',
      sides: 'both',
      grip: 'overhand',
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['feet'],
      frames: [
        { name: 'reach', trunk: { lean: 15 }, arms: { shoulder: 125, elbow: 15 }, legs: standing },
        { name: 'middle', trunk: { lean: 15 }, arms: { shoulder: 75, elbow: 15 }, legs: standing },
        { name: 'thighs', trunk: { lean: 15 }, arms: { shoulder: 25, elbow: 15 }, legs: standing },
      ],
      balance: { solve: 'legs' },
      loads: [{ at: 'hands', direction: { toward: [0.45, 0.35], of: 'shoulder' } }],
      referenceLoad: 0.2,
    },
    rest: { equipment: ['cableHigh'], load: { kind: 'external', from: 'cableHigh', least: 2.5, most: 80 } },
  },
  'pullover-machine': {
    mechanics: {
      guidance: 'leverMachine',
      sides: 'both',
      grip: 'none',
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['seat', 'backPad'],
      frames: [
        { name: 'overhead', trunk: { lean: -5 }, arms: { shoulder: 150, elbow: 90 }, legs: seated },
        { name: 'middle', trunk: { lean: -5 }, arms: { shoulder: 90, elbow: 90 }, legs: seated },
        { name: 'down', trunk: { lean: -5 }, arms: { shoulder: 20, elbow: 90 }, legs: seated },
      ],
      loads: [{ at: 'upperArm', direction: { square: 'flexing' }, along: 0.9 }],
      referenceLoad: 0.5,
    },
    rest: {
      equipment: ['pulloverMachine'],
      load: { kind: 'external', from: 'pulloverMachine', least: 5, most: 120 },
      kind: 'machine',
    },
  },
  'barbell-squat': {
    mechanics: {
      guidance: 'freeWeight',
      sides: 'both',
      grip: 'none',
      gripWidth: 'wide',
      armPlane: 'sagittal',
      supports: ['feet'],
      frames: [
        { name: 'stand', trunk: { lean: 5 }, arms: { shoulder: -30, elbow: 120 }, legs: { ankle: [0.02, -0.46] } },
        { name: 'half', trunk: { lean: 25 }, arms: { shoulder: -30, elbow: 120 }, legs: { ankle: [0.13, -0.4] } },
        { name: 'low', trunk: { lean: 40 }, arms: { shoulder: -30, elbow: 120 }, legs: { ankle: [0.16, -0.24] } },
      ],
      balance: { solve: 'trunk' },
      loads: [{ at: 'shoulders', direction: 'down' }],
      referenceLoad: 0.8,
    },
    rest: { equipment: ['barbell', 'squatRack'], load: { kind: 'external', from: 'barbell', least: 20, most: 300 } },
  },
  'leg-press': {
    mechanics: {
      guidance: 'fixedPath',
      sides: 'both',
      grip: 'none',
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['seat', 'backPad'],
      frames: [
        {
          name: 'long',
          trunk: { lean: -45 },
          arms: { shoulder: 20, elbow: 20 },
          legs: { ankle: [0.32, 0.32], foot: -45 },
        },
        {
          name: 'middle',
          trunk: { lean: -45 },
          arms: { shoulder: 20, elbow: 20 },
          legs: { ankle: [0.27, 0.27], foot: -45 },
        },
        {
          name: 'deep',
          trunk: { lean: -45 },
          arms: { shoulder: 20, elbow: 20 },
          legs: { ankle: [0.2, 0.2], foot: -45 },
        },
      ],
      loads: [{ at: 'feet', direction: { angle: 225 }, ratio: 0.71 }],
      referenceLoad: 1,
    },
    rest: {
      equipment: ['legPress'],
      load: { kind: 'external', from: 'legPress', least: 20, most: 400 },
      kind: 'machine',
    },
  },
  'knee-extension': {
    mechanics: {
      guidance: 'leverMachine',
      sides: 'both',
      grip: 'none',
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['seat', 'backPad'],
      frames: [
        { name: 'bent', trunk: { lean: -10 }, arms: { shoulder: 10, elbow: 20 }, legs: { hip: 85, knee: 95 } },
        { name: 'middle', trunk: { lean: -10 }, arms: { shoulder: 10, elbow: 20 }, legs: { hip: 85, knee: 55 } },
        { name: 'long', trunk: { lean: -10 }, arms: { shoulder: 10, elbow: 20 }, legs: { hip: 85, knee: 10 } },
      ],
      loads: [],
      moments: [{ action: 'kneeExtension', arm: 0.15, curve: [0.9, 1, 0.55] }],
      referenceLoad: 0.5,
    },
    rest: {
      equipment: ['kneeExtensionMachine'],
      load: { kind: 'external', from: 'kneeExtensionMachine', least: 5, most: 150 },
      kind: 'isolation',
    },
  },
  'assisted-pull-up': {
    mechanics: {
      guidance: 'ownBody',
      sides: 'both',
      grip: 'neutral',
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['handsHanging'],
      frames: [
        { name: 'hang', trunk: { lean: 0 }, arms: { shoulder: 172, elbow: 5 }, legs: { hip: 8, knee: 10 } },
        {
          name: 'half',
          trunk: { lean: -12 },
          arms: { hand: [0.085, 0.17], from: 'world' },
          legs: { hip: 8, knee: 10 },
        },
        { name: 'top', trunk: { lean: -14 }, arms: { hand: [0.085, 0.06], from: 'world' }, legs: { hip: 8, knee: 10 } },
      ],
      balance: { solve: 'trunk' },
      loads: [{ at: 'hips', direction: 'down' }],
      referenceLoad: -0.3,
    },
    rest: { equipment: ['bands'], load: { kind: 'assistance', from: 'bands', least: 5, most: 60 }, kind: 'core' },
  },
  'push-up': {
    mechanics: {
      guidance: 'ownBody',
      sides: 'both',
      grip: 'none',
      gripWidth: 'wide',
      armPlane: 'sagittal',
      supports: ['handsPushing', 'feet'],
      frames: [
        {
          name: 'up',
          trunk: { lean: 72 },
          arms: { hand: [0, -0.3], from: 'world', flat: 'forward' },
          legs: { hip: 0, knee: 0, foot: 72 },
        },
        {
          name: 'down',
          trunk: { lean: 82 },
          arms: { hand: [-0.06, -0.16], from: 'world', flat: 'forward' },
          legs: { hip: 0, knee: 0, foot: 76 },
        },
      ],
      balance: { solve: 'trunk' },
      loads: [],
      referenceLoad: 0,
    },
    rest: { equipment: [], load: { kind: 'none' }, kind: 'core' },
  },
  'handstand-hold': {
    mechanics: {
      guidance: 'ownBody',
      sides: 'both',
      grip: 'none',
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['handsPushing'],
      frames: ['upright', 'held'].map((name) => ({
        name,
        trunk: { lean: 180 },
        arms: { shoulder: 178, elbow: 2, flat: 'forward' as const },
        legs: { hip: 0, knee: 0, ankle: 40 },
      })),
      balance: { solve: 'trunk' },
      loads: [],
      referenceLoad: 0,
    },
    rest: { equipment: ['wall'], load: { kind: 'none' }, kind: 'core', unit: 'seconds', skill: 'intermediate' },
  },
  'dumbbell-curl': {
    mechanics: {
      guidance: 'freeWeight',
      sides: 'both',
      grip: 'underhand',
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['feet'],
      frames: [
        { name: 'down', trunk: { lean: 0 }, arms: { shoulder: 0, elbow: 8 }, legs: { thigh: 0, shank: 0 } },
        { name: 'level', trunk: { lean: -4 }, arms: { shoulder: 3, elbow: 85 }, legs: { thigh: 0, shank: 0 } },
        { name: 'high', trunk: { lean: 0 }, arms: { shoulder: 12, elbow: 130 }, legs: { thigh: 0, shank: 0 } },
      ],
      balance: { solve: 'trunk' },
      loads: [{ at: 'hands', direction: 'down', share: 'each' }],
      referenceLoad: 0.17,
    },
    rest: {
      equipment: ['dumbbells'],
      load: { kind: 'external', from: 'dumbbells', least: 2, most: 40 },
      kind: 'isolation',
    },
  },
  'one-arm-pushdown': {
    mechanics: {
      guidance: 'cable',
      sides: 'oneAtATime',
      grip: 'overhand',
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['feet'],
      frames: [
        { name: 'bent', trunk: { lean: 5 }, arms: { shoulder: 5, elbow: 100 }, legs: { thigh: 0, shank: 0 } },
        { name: 'straight', trunk: { lean: 5 }, arms: { shoulder: 0, elbow: 10 }, legs: { thigh: 0, shank: 0 } },
      ],
      balance: { solve: 'trunk' },
      loads: [{ at: 'hands', direction: 'up' }],
      referenceLoad: 0.15,
    },
    rest: {
      equipment: ['cableHigh'],
      load: { kind: 'external', from: 'cableHigh', least: 2.5, most: 40 },
      kind: 'isolation',
    },
  },
}
