import { exercise, preview, type Exercise, type Preview } from '#shared/contract/exercise'
import { ranking, swapTaken, type Ranking, type SwapRow, type SwapTaken } from '#shared/contract/swap'
import { SAMPLE_MECHANICS } from '#tests/support/sample-mechanics'
import { aDose, anExercise } from './samples'

/** Rankings and exercises as the API would send them; each passes the contract's own schema. */
export const anExerciseOf = (
  mechanics: keyof typeof SAMPLE_MECHANICS,
  name: string,
  change: Partial<Exercise> = {},
): Exercise =>
  exercise.parse({
    ...anExercise(name),
    versionId: anExercise(name).id,
    version: 1,
    family: 'straightArmPull',
    kind: 'compound',
    unit: 'repetitions',
    skill: 'beginner',
    equipment: ['cableHigh'],
    load: { kind: 'external', from: 'cableHigh', least: 5, most: 80 },
    setup: 'Stand an arm’s length from the pulley and lean a little.',
    cautions: ['Keep the ribs down.'],
    coordination: 24,
    muscles: [
      { muscle: 'latissimus', drive: 0.84 },
      { muscle: 'tricepsLongHead', drive: 0.4 },
    ],
    mechanics: SAMPLE_MECHANICS[mechanics],
    ...change,
  })

const FACTOR_NOTES: SwapRow['factors'] = {
  kept: { value: 0.88, note: 'lats 84 %, planned intensity reached with 12 instead of 6' },
  spare: { value: 0.97, note: '19 points below the elbow’s cap' },
  calm: { value: 0.98, note: 'coordination 24 of 100' },
  lean: { value: 0.99, note: 'little asked of the rest of the body' },
  carryOver: { value: 0.99, note: 'shoulder works as in the pull-up' },
}

export const aSwapRow = (
  name: string,
  change: Partial<SwapRow> = {},
  of: { id: string; slug: string } = anExercise(name),
): SwapRow => ({
  exercise: { id: of.id, slug: of.slug, name, versionId: anExercise(name).id, guidance: 'cable', supports: ['feet'] },
  rank: 1,
  score: 82,
  targetDrive: 0.84,
  limiter: 'shoulderExtension',
  joints: [
    { joint: 'elbow', side: 'right', stress: 0.31, cap: 0.5 },
    { joint: 'wrist', side: null, stress: 0.14, cap: null },
    { joint: 'lowerBack', side: null, stress: 0.21, cap: null },
  ],
  coordination: 24,
  dose: aDose({ sets: 3, repetitions: 12, load: 22.5 }),
  factors: FACTOR_NOTES,
  reason: 'The lats end the set at 84 % of what they can give, and nothing else gives out before them.',
  ...change,
})

export function aRanking(change: Partial<Ranking> = {}): Ranking {
  const original = change.original ?? anExercise('Pull-up, overhand')
  const {
    rank: _rank,
    score: _score,
    factors: _factors,
    reason: _reason,
    ...originalRow
  } = aSwapRow(
    original.name,
    {
      targetDrive: 0.91,
      joints: [
        { joint: 'elbow', side: 'right', stress: 0.71, cap: 0.5 },
        { joint: 'wrist', side: null, stress: 0.4, cap: null },
        { joint: 'lowerBack', side: null, stress: 0.1, cap: null },
      ],
    },
    original,
  )
  return ranking.parse({
    fingerprint: 'fingerprint-one',
    ruleSetVersion: 1,
    athlete: { id: anExercise('x').id, name: 'Ilse Tamm' },
    original,
    planned: aDose({ load: 5 }),
    intent: 'strength',
    target: 'lats',
    placeId: null,
    sore: [
      {
        soreJointId: anExercise('x').id,
        joint: 'elbow',
        side: 'right',
        rating: 4,
        provocations: ['bending'],
        cap: 0.5,
        otherCap: 0.75,
      },
    ],
    redFlags: [],
    originalRow,
    estimated: false,
    minor: false,
    items: [],
    leftOut: [
      {
        exercise: original,
        why: 'overCap',
        reason: 'Right elbow at 71 % even with body weight alone; the cap is 50 %.',
      },
    ],
    ...change,
  })
}

export const aTakenSwap = (change: Partial<SwapTaken> = {}): SwapTaken =>
  swapTaken.parse({
    id: anExercise('x').id,
    slotId: anExercise('x').id,
    exercise: anExercise('Straight-arm cable pulldown'),
    dose: aDose({ sets: 3, repetitions: 12, load: 22.5 }),
    rank: 1,
    ruleSetVersion: 1,
    takenAt: '2026-12-01T09:00:00.000Z',
    undoneAt: null,
    ...change,
  })

export const aPreview = (names: readonly string[], change: Partial<Preview> = {}): Preview =>
  preview.parse({
    frames: names.map((name, index) => ({
      name,
      actions: [{ action: 'shoulderExtension', moment: 30 + 10 * index, strength: 80, demand: 0.4 + 0.2 * index }],
      joints: [
        { joint: 'elbow', side: 'right', stress: 0.1 + 0.1 * index, cap: 0.5 },
        { joint: 'shoulder', side: 'right', stress: 0.4 + 0.2 * index, cap: null },
      ],
      compression: 0.8 + 0.1 * index,
      reactions: [{ support: 'feet', share: 1 }],
    })),
    oneRepMax: 32.5,
    limiter: 'shoulderExtension',
    muscles: [{ muscle: 'latissimus', drive: 0.84 }],
    coordination: 24,
    estimated: true,
    ...change,
  })
