import { z } from 'zod'
import { JOINTS, MIDLINE_JOINTS } from '../mechanics/vocabulary'
import { day, id, instant, list, note, pageQuery, side } from './common'
import { endpoint } from './endpoint'
import { LIMITS } from './limits'

export const joint = z.enum(JOINTS)

/** What makes the joint speak up. */
export const PROVOCATIONS = [
  'bending',
  'straightening',
  'gripping',
  'leaning',
  'endRange',
  'twisting',
  'unknown',
] as const
export const provocation = z.enum(PROVOCATIONS)
export type Provocation = z.infer<typeof provocation>

/** The red-flag questions; any "yes" ends the matter until a physio clears it. */
export const RED_FLAGS = ['injury', 'nerve', 'swollenOrFever', 'nightPain', 'severePain', 'chestOrBreath'] as const
export const redFlag = z.enum(RED_FLAGS)
export type RedFlag = z.infer<typeof redFlag>

/** Every question must be answered; a missing answer is not a "no". `severePain` also follows from a rating of 8 or more. */
export const redFlagAnswers = z.object({
  injury: z.boolean(),
  nerve: z.boolean(),
  swollenOrFever: z.boolean(),
  nightPain: z.boolean(),
  severePain: z.boolean(),
  chestOrBreath: z.boolean(),
})

export const soreJointReport = z
  .object({
    joint,
    /** Null for the neck and the lower back, required for every other joint. */
    side: side.nullable(),
    rating: z.number().int().min(LIMITS.rating.min).max(LIMITS.rating.max),
    provocations: z.array(provocation).min(1, 'Choose at least one, or “I don’t know”.').max(PROVOCATIONS.length),
    redFlags: redFlagAnswers,
    note: note.optional(),
    day,
  })
  .superRefine((report, context) => {
    const midline = MIDLINE_JOINTS.includes(report.joint)
    if (midline && report.side !== null)
      context.addIssue({ code: 'custom', path: ['side'], message: 'This joint has no side.' })
    if (!midline && report.side === null)
      context.addIssue({ code: 'custom', path: ['side'], message: 'Say which side.' })
  })
export type SoreJointReport = z.infer<typeof soreJointReport>

/** open → closed by the athlete; redFlag stays until a physio clears it, and becomes open again then. */
export const SORE_JOINT_STATES = ['open', 'redFlag', 'closed'] as const

export const soreJoint = z.object({
  id,
  athleteId: id,
  joint,
  side: side.nullable(),
  rating: z.number().int(),
  provocations: z.array(provocation),
  redFlags: z.array(redFlag),
  note: z.string(),
  day,
  state: z.enum(SORE_JOINT_STATES),
  reportedAt: instant,
  closedAt: instant.nullable(),
  clearedBy: z.string().nullable(),
  clearedAt: instant.nullable(),
  can: z.object({ close: z.boolean(), clear: z.boolean() }),
})
export type SoreJoint = z.infer<typeof soreJoint>

const athleteParams = z.object({ athleteId: id })
const oneParams = z.object({ athleteId: id, soreJointId: id })

export const reportSoreJoint = endpoint({
  method: 'POST',
  path: '/api/athletes/:athleteId/sore-joints',
  summary: 'Report a sore joint. A newer report of the same joint and side closes the older one; a red flag stays.',
  access: 'signedIn',
  params: athleteParams,
  body: soreJointReport,
  response: soreJoint,
  status: 201,
})

export const listSoreJoints = endpoint({
  method: 'GET',
  path: '/api/athletes/:athleteId/sore-joints',
  summary: 'Sore-joint reports of an athlete, newest first.',
  access: 'signedIn',
  params: athleteParams,
  query: pageQuery.extend({ state: z.enum([...SORE_JOINT_STATES, 'standing', 'all']).default('standing') }),
  response: list(soreJoint),
})

export const closeSoreJoint = endpoint({
  method: 'POST',
  path: '/api/athletes/:athleteId/sore-joints/:soreJointId/closure',
  summary: 'The joint no longer troubles. Not possible while a red flag stands.',
  access: 'signedIn',
  params: oneParams,
  response: soreJoint,
})

export const clearRedFlag = endpoint({
  method: 'POST',
  path: '/api/athletes/:athleteId/sore-joints/:soreJointId/clearance',
  summary: 'A physio of the care team clears a red flag, with a note. Nobody else can.',
  access: 'signedIn',
  params: oneParams,
  body: z.object({ note: note.min(1, 'Write what you examined and why training may go on.') }),
  response: soreJoint,
})
