import { z } from 'zod'
import { ACTIONS, GUIDANCES } from '../mechanics/vocabulary'
import { id, instant, side } from './common'
import { endpoint } from './endpoint'
import { jointStress } from './exercise'
import { LIMITS } from './limits'
import { joint, redFlag } from './sore-joint'
import { dose, exerciseName, intent, targetGroup } from './session'

/** One factor of the score (0–1) with the words that explain its number. */
const factor = z.object({ value: z.number(), note: z.string() })

export const swapRow = z.object({
  exercise: exerciseName.extend({ versionId: id, guidance: z.enum(GUIDANCES), supports: z.array(z.string()) }),
  rank: z.number().int(),
  score: z.number(),
  /** How near its own limit the wanted muscle is when the set ends, 0–1. */
  targetDrive: z.number(),
  limiter: z.enum(ACTIONS),
  /** Elbow, wrist and lower back always, then every other sore or restricted joint. */
  joints: z.array(jointStress),
  coordination: z.number(),
  dose,
  factors: z.object({ kept: factor, spare: factor, calm: factor, lean: factor, carryOver: factor }),
  reason: z.string(),
})
export type SwapRow = z.infer<typeof swapRow>

export const LEFT_OUT_REASONS = [
  'redFlag',
  'noEquipment',
  'overCap',
  'banned',
  'beyondStrength',
  'beyondSkill',
  'targetNotTrained',
] as const
export const leftOutRow = z.object({ exercise: exerciseName, why: z.enum(LEFT_OUT_REASONS), reason: z.string() })
export type LeftOutRow = z.infer<typeof leftOutRow>

export const ranking = z.object({
  /** Fingerprint of every input; sent back when a swap is taken, so that nobody takes from a stale table. */
  fingerprint: z.string(),
  ruleSetVersion: z.number().int(),
  athlete: z.object({ id, name: z.string() }),
  original: exerciseName,
  planned: dose,
  intent,
  target: targetGroup,
  placeId: id.nullable(),
  /** The sore joints that bind this ranking, with the cap their rating sets. */
  sore: z.array(
    z.object({
      soreJointId: id,
      joint,
      side: side.nullable(),
      rating: z.number().int(),
      provocations: z.array(z.string()),
      /** Largest share of strength allowed to what provokes it. */
      cap: z.number(),
      /** The same for the joint's other work; null when everything it does may provoke it. */
      otherCap: z.number().nullable(),
    }),
  ),
  /** Standing red flags. Exercises that load these joints are never offered. */
  redFlags: z.array(
    z.object({ soreJointId: id, joint, side: side.nullable(), flags: z.array(redFlag), urgent: z.boolean() }),
  ),
  /** The original exercise as planned, for comparison; null when it is beyond current strength. */
  originalRow: swapRow.omit({ rank: true, score: true, factors: true, reason: true }).nullable(),
  /** True while strength is the average adult's, not fitted to this athlete. */
  estimated: z.boolean(),
  /** True for athletes under 18: the strength norms are not valid for them. */
  minor: z.boolean(),
  /** The best rows, at most `LIMITS.rankingRows.items`. */
  items: z.array(swapRow),
  /**
   * By name. Where there are more than `LIMITS.rankingRows.leftOut`, those that do
   * not train the target are dropped first.
   */
  leftOut: z.array(leftOutRow),
})
export type Ranking = z.infer<typeof ranking>

const rankQuery = z.object({
  placeId: id.optional(),
  guidance: z.enum(GUIDANCES).optional(),
  /** 0–100 */
  maxCoordination: z.coerce.number().min(0).max(100).optional(),
})
const slotParams = z.object({ slotId: id })

export const rankForSlot = endpoint({
  method: 'GET',
  path: '/api/slots/:slotId/swaps',
  summary: 'Ranked swaps for what stands in a slot, and everything left out with its reason.',
  access: 'signedIn',
  params: slotParams,
  query: rankQuery,
  response: ranking,
})

export const rankForExercise = endpoint({
  method: 'GET',
  path: '/api/athletes/:athleteId/exercises/:exerciseId/swaps',
  summary: 'Ranked swaps for any exercise, with a dose and target given in the query.',
  access: 'signedIn',
  params: z.object({ athleteId: id, exerciseId: id }),
  query: rankQuery.extend({
    target: targetGroup,
    intent: intent.default('size'),
    sets: z.coerce.number().int().min(LIMITS.sets.min).max(LIMITS.sets.max).default(3),
    repetitions: z.coerce.number().int().min(1).max(LIMITS.repetitions.max).default(8),
    rir: z.coerce.number().min(LIMITS.rir.min).max(LIMITS.rir.max).default(2),
  }),
  response: ranking,
})

export const swapTaken = z.object({
  id,
  slotId: id,
  exercise: exerciseName,
  dose,
  rank: z.number().int(),
  ruleSetVersion: z.number().int(),
  takenAt: instant,
  undoneAt: instant.nullable(),
})
export type SwapTaken = z.infer<typeof swapTaken>

export const takeSwap = endpoint({
  method: 'POST',
  path: '/api/slots/:slotId/swaps',
  summary: 'Put a ranked exercise in the slot’s place. Refused when the ranking changed since it was read.',
  access: 'signedIn',
  params: slotParams,
  query: rankQuery,
  body: z.object({ exerciseId: id, fingerprint: z.string().min(8).max(128) }),
  response: swapTaken,
  status: 201,
})

export const undoSwap = endpoint({
  method: 'POST',
  path: '/api/swaps/:swapId/undo',
  summary: 'Put the planned exercise back.',
  access: 'signedIn',
  params: z.object({ swapId: id }),
  response: swapTaken,
})
