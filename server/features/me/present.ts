import type { z } from 'zod'
import type { careTeamMember } from '#shared/contract/athlete'
import type { Me } from '#shared/contract/me'
import type { User } from '../people/entity'
import type { CareTeamRow } from './repository'

/** Needs the user with memberships, their clubs, and the athlete profile. */
export function presentMe(user: User, { demo }: { demo: boolean }): Me {
  const profile = user.athleteProfile
  const isAthlete = user.memberships.some(({ role }) => role === 'athlete')
  return {
    id: user.id,
    name: user.name,
    email: user.email,
    memberships: user.memberships
      .map(({ clubId, club, role }) => ({ clubId, clubName: club.name, role }))
      .toSorted((a, b) => a.clubName.localeCompare(b.clubName, 'en') || a.role.localeCompare(b.role, 'en')),
    units: user.units,
    body:
      profile === null || !isAthlete
        ? null
        : { sex: profile.sex, bodyMass: profile.bodyMass, stature: profile.stature, birthDate: profile.birthDate },
    defaultPlaceId: user.defaultPlaceId,
    demo,
  }
}

export const presentCarer = (row: CareTeamRow): z.infer<typeof careTeamMember> => ({
  userId: row.userId,
  name: row.name,
  role: row.role,
  clubName: row.clubName,
  consentSince: row.consentSince?.toISOString() ?? null,
})
