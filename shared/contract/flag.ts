import { z } from 'zod'
import { id, instant, list, note, pageQuery } from './common'
import { endpoint } from './endpoint'
import { exerciseName } from './session'

export const FLAG_REASONS = ['hurts', 'wrongMuscle', 'loadOff', 'notPossibleHere', 'other'] as const

export const flag = z.object({
  id,
  raisedBy: z.object({ id, name: z.string() }),
  original: exerciseName,
  exercise: exerciseName,
  reason: z.enum(FLAG_REASONS),
  note: z.string(),
  ruleSetVersion: z.number().int(),
  raisedAt: instant,
  state: z.enum(['open', 'settled']),
})
export type Flag = z.infer<typeof flag>

export const raiseFlag = endpoint({
  method: 'POST',
  path: '/api/flags',
  summary: 'Object to a swap; an admin reviews it.',
  access: 'signedIn',
  body: z.object({
    slotId: id,
    exerciseId: id,
    reason: z.enum(FLAG_REASONS),
    note: note.default(''),
  }),
  response: flag,
  status: 201,
})

export const listFlags = endpoint({
  method: 'GET',
  path: '/api/flags',
  summary: 'Flags raised in the clubs the signed-in admin runs, newest first; for others, their own.',
  access: 'signedIn',
  query: pageQuery.extend({ state: z.enum(['open', 'settled', 'all']).default('open') }),
  response: list(flag),
})
