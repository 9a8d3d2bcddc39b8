import { z } from 'zod'
import { day, id, instant, list, pageQuery } from './common'
import { endpoint } from './endpoint'
import { soreJoint } from './sore-joint'

/** A row of the coach's Squad or the physio's Clients: only athletes whose consent stands. */
export const athleteRow = z.object({
  id,
  name: z.string(),
  clubName: z.string(),
  minor: z.boolean(),
  consentSince: instant,
  /** Open and red-flagged reports, worst first. */
  sore: z.array(soreJoint),
  todayTitle: z.string().nullable(),
  /** Slots of today's session that a sore joint puts over its cap. */
  affectedSlots: z.number().int(),
})
export type AthleteRow = z.infer<typeof athleteRow>

export const listAthletes = endpoint({
  method: 'GET',
  path: '/api/athletes',
  summary: 'Athletes who let the signed-in coach or physio in, those with a red flag or the sorest joint first.',
  access: 'signedIn',
  query: pageQuery.extend({ day }),
  response: list(athleteRow),
})

export const careTeamMember = z.object({
  userId: id,
  name: z.string(),
  role: z.enum(['coach', 'physio']),
  clubName: z.string(),
  /** Null when this person is not let in. */
  consentSince: instant.nullable(),
})

export const listCareTeam = endpoint({
  method: 'GET',
  path: '/api/me/care-team',
  summary: 'Coaches and physios of the athlete’s clubs and whether each is let in.',
  access: 'signedIn',
  response: list(careTeamMember),
})

export const setConsent = endpoint({
  method: 'PUT',
  path: '/api/me/care-team/:userId',
  summary: 'Let a coach or physio in, or shut them out at once.',
  access: 'signedIn',
  params: z.object({ userId: id }),
  body: z.object({ letIn: z.boolean() }),
  response: careTeamMember,
})
