import { z } from 'zod'
import { TARGET_GROUP_NAMES } from '../rules/muscle-names'
import { day, id } from './common'
import { endpoint } from './endpoint'
import { jointStress } from './exercise'
import { LIMITS } from './limits'

/** What a slot is for; it decides how a swap is dosed. */
export const INTENTS = ['strength', 'size', 'skill', 'endurance'] as const
export const intent = z.enum(INTENTS)
export type Intent = z.infer<typeof intent>
export const targetGroup = z.enum(TARGET_GROUP_NAMES)

/** Sets of repetitions (or seconds of a hold) at a load; load null means body weight alone. */
export const dose = z.object({
  sets: z.number().int().min(LIMITS.sets.min).max(LIMITS.sets.max),
  repetitions: z.number().int().min(1).max(LIMITS.holdSeconds.max),
  unit: z.enum(['repetitions', 'seconds']),
  rir: z.number().min(LIMITS.rir.min).max(LIMITS.rir.max),
  /** kg; negative is assistance; null is body weight alone. For pairs of dumbbells, the load of one. */
  load: z.number().nullable(),
  /** Pieces the load is made of, 2 for a pair of dumbbells. */
  pieces: z.number().int().min(1).max(2),
})
export type Dose = z.infer<typeof dose>

export const exerciseName = z.object({ id, slug: z.string(), name: z.string() })

export const slot = z.object({
  id,
  position: z.number().int(),
  exercise: exerciseName,
  planned: dose,
  intent,
  target: targetGroup,
  /** The swap standing in this slot, if one was taken. */
  swap: z
    .object({ id, exercise: exerciseName, dose, takenAt: z.string(), can: z.object({ undo: z.boolean() }) })
    .nullable(),
  /** What a sore joint means for what stands in this slot now; the worst joint first. Empty when it is unaffected. */
  affected: z.array(jointStress.extend({ verdict: z.enum(['overCap', 'redFlag']), soreJointId: id })),
  can: z.object({ swap: z.boolean() }),
})
export type Slot = z.infer<typeof slot>

export const session = z.object({
  id,
  athleteId: id,
  day,
  title: z.string(),
  minutes: z.number().int(),
  placeId: id.nullable(),
  placeName: z.string().nullable(),
  slots: z.array(slot),
})
export type Session = z.infer<typeof session>

export const today = z.object({
  athlete: z.object({ id, name: z.string() }),
  day,
  /** Null on a rest day. */
  session: session.nullable(),
  /** The next planned day after this one, for an empty Today. */
  nextDay: day.nullable(),
})
export type Today = z.infer<typeof today>

export const getToday = endpoint({
  method: 'GET',
  path: '/api/athletes/:athleteId/today',
  summary:
    'The session planned for a day (the athlete’s calendar day), with what standing sore joints mean for each slot.',
  access: 'signedIn',
  params: z.object({ athleteId: id }),
  query: z.object({ day }),
  response: today,
})
