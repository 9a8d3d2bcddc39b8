import type { ExerciseMechanics, Frame } from '#shared/mechanics/definition'

/**
 * Plain postures of single ideas, for checks of mechanics that must not depend on the catalogue. Each repeats one posture or two
 * near ones; what they mean is in their names.
 */
type Case = Omit<ExerciseMechanics, 'frames'> & { frames?: Frame[] }

const base = {
  guidance: 'freeWeight',
  sides: 'both',
  grip: 'overhand',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['feet'],
  loads: [{ at: 'hands', direction: 'down' }],
  referenceLoad: 0.2,
} satisfies Partial<Case>

/** One posture held: the two frames a definition needs are the same. */
export const held = (frame: Omit<Frame, 'name'>): Frame[] => [
  { name: 'first', ...frame },
  { name: 'second', ...frame },
]

const upright = { trunk: { lean: 0 }, legs: { hip: 0, knee: 0 } } satisfies Partial<Frame>

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
    { name: 'deep', trunk: { lean: -45 }, arms: { shoulder: 10, elbow: 20 }, legs: { ankle: [0.17, 0.25], foot: -135 } },
    { name: 'long', trunk: { lean: -45 }, arms: { shoulder: 10, elbow: 20 }, legs: { ankle: [0.22, 0.37], foot: -135 } },
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

export const MECHANICS_CASES: Readonly<Record<string, ExerciseMechanics>> = {
  pullUp: hang(),
  chinUp: hang({ armPlane: 'sagittal', grip: 'underhand' }),
  curl: curl(),
  hammerCurl: curl('neutral'),
  bentWrist: standing({ shoulder: 20, elbow: 80, wrist: 25 }, { grip: 'underhand' }),
  lateralRaise: standing(
    { shoulder: 80, elbow: 10 },
    { armPlane: 'frontal', grip: 'neutral', loads: [{ at: 'hands', direction: 'down', share: 'each' }] },
  ),
  palmDownRaise: standing({ shoulder: 70, elbow: 8, elbowSide: 'across' }, { armPlane: 'frontal', grip: 'neutral' }),
  uprightRow: standing({ hand: [0.02, -0.1], from: 'world', elbowSide: 'reversed' }, { armPlane: 'frontal' }),
  overheadPress: standing({ hand: [0.05, 0.2, 0.02], from: 'world', wrist: 10 }, { armPlane: 'frontal' }),
  offPlanePress: standing({ hand: [-0.2, 0.06, 0.05] }, { armPlane: 'frontal' }),
  wideCableRow: wideCableRow(),
  dip: dip(),
  squat: squat(),
  oneLegSquat: oneLegSquat(),
  calfRaise: calfRaise(),
  benchPress: benchPress(),
  pushUp: pushUp(),
  widePushUp: pushUp(0.1),
  kneePushUp: kneePushUp(),
  handstand: handstand(),
  oneArmRow: oneArmRow(),
  pulldown: pulldown(),
  hipThrust: hipThrust(),
  proneLegCurl: proneLegCurl(),
  kneeExtension: kneeExtension(),
  backExtension: backExtension(),
  pullover: pullover(),
  plank: plank(),
  legPress: legPress(),
  wallSit: wallSit(),
  splitSquat: splitSquat(),
}
