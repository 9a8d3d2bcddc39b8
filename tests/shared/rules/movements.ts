import { readFileSync } from 'node:fs'
import { parse } from 'yaml'
import { exerciseDocument, type ExerciseDocument } from '#shared/contract/exercise'
import { ruleSet as ruleSetSchema } from '#shared/contract/rule-set'
import { solveExercise, type ExerciseMechanics, type Sex } from '#shared/mechanics/index'
import { coordinationDemand, type Athlete, type Candidate } from '#shared/rules/index'

/** Rule set 1, parsed by the contract from its seed. */
export const ruleSet = ruleSetSchema.parse(
  parse(readFileSync(new URL('../../../seeds/rules/rule-set-1.yaml', import.meta.url), 'utf8')),
)

export const man: Athlete = { sex: 'male', bodyMass: 73, stature: 1.741, factors: {}, skill: 'advanced', minor: false }
export const woman: Athlete = { ...man, sex: 'female', bodyMass: 61.9, stature: 1.735 }

const seated = { hip: 90, knee: 90 }
const standing = { ankle: [0.1, -0.44] as [number, number] }

/** Small true movements, each with just enough geometry for what the tests ask of it. */
const MECHANICS: Record<string, { mechanics: ExerciseMechanics; rest: Partial<ExerciseDocument> }> = {
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
}

/** A published candidate of one of the small movements, with anything changed that a test wants changed. */
export function candidateOf(
  slug: keyof typeof MECHANICS | string,
  change: Partial<ExerciseDocument> & { mechanics?: ExerciseMechanics } = {},
  sex: Sex = 'male',
): Candidate {
  const entry = MECHANICS[slug]
  if (!entry) throw new Error(`No movement ${slug}`)
  const document = exerciseDocument.parse({
    slug,
    name: slug,
    family: 'verticalPull',
    kind: 'compound',
    setup: 'Set up.',
    mechanics: entry.mechanics,
    ...entry.rest,
    ...change,
  })
  const solution = solveExercise(document.mechanics, sex)
  const coordination = coordinationDemand(document, solution, ruleSet)
  return { id: document.slug, versionId: `${document.slug}-1`, document, solution, coordination }
}

export const SLUGS = Object.keys(MECHANICS)
export const MOVEMENTS = MECHANICS
