import { z } from 'zod'
import { day, email, id } from './common'
import { SEXES } from '../mechanics/sex'
import { endpoint } from './endpoint'
import { LIMITS } from './limits'

export const ROLES = ['athlete', 'coach', 'physio', 'admin'] as const
export const role = z.enum(ROLES)
export type Role = z.infer<typeof role>

export const sex = z.enum(SEXES)

export const membership = z.object({ clubId: id, clubName: z.string(), role })

/** What the engine needs to know of an athlete's body. Masses in kg, stature in m. */
export const bodyProfile = z.object({
  sex,
  bodyMass: z.number().min(LIMITS.bodyMass.min).max(LIMITS.bodyMass.max),
  stature: z.number().min(LIMITS.stature.min).max(LIMITS.stature.max),
  birthDate: day,
})
export type BodyProfile = z.infer<typeof bodyProfile>

export const me = z.object({
  id,
  name: z.string(),
  email,
  memberships: z.array(membership),
  units: z.enum(['metric', 'imperial']),
  /** Null until the athlete has filled it in; never sent for people who are not athletes. */
  body: bodyProfile.nullable(),
  defaultPlaceId: id.nullable(),
  demo: z.boolean(),
})
export type Me = z.infer<typeof me>

export const getMe = endpoint({
  method: 'GET',
  path: '/api/me',
  summary: 'The signed-in person, with memberships and own body profile.',
  access: 'signedIn',
  response: me,
})

export const updateMe = endpoint({
  method: 'PATCH',
  path: '/api/me',
  summary: 'Change own name, units, body profile or usual place.',
  access: 'signedIn',
  body: z
    .object({
      name: z.string().trim().min(LIMITS.name.min).max(LIMITS.name.max),
      units: z.enum(['metric', 'imperial']),
      body: bodyProfile,
      defaultPlaceId: id,
    })
    .partial()
    .refine((change) => Object.keys(change).length > 0, 'Say what to change.'),
  response: me,
})
