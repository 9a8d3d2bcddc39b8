import type { Action } from '#shared/mechanics/vocabulary'
import type { Sex } from '#shared/mechanics/sex'
import type { ExerciseDocument } from '#shared/contract/exercise'
import type { Athlete } from '#shared/rules/index'

/** An athlete's profile as `profileJson` selects it. */
export interface ProfileJson {
  sex: Sex
  bodyMass: number
  stature: number
  birthDate: string
  skill: ExerciseDocument['skill']
  factors: Partial<Record<Action, number>>
}

/** SQL for the body profile of the athlete whose id is the SQL expression `athlete`; null while it is not filled in. */
export const profileJson = (athlete: string): string => `
  (select jsonb_build_object('sex', ap.sex, 'bodyMass', ap.body_mass, 'stature', ap.stature,
                             'birthDate', ap.birth_date::text, 'skill', ap.skill, 'factors', ap.strength_factors)
     from athlete_profiles ap where ap.user_id = ${athlete})`

const ADULT_AGE = 18

/** Under 18 on that day: the strength norms are not valid for them. */
export function isMinor(birthDate: string, now: Date): boolean {
  const adultFrom = `${Number(birthDate.slice(0, 4)) + ADULT_AGE}${birthDate.slice(4)}`
  return now.toISOString().slice(0, 10) < adultFrom
}

/** The profile as the rules want it. */
export function toAthlete(profile: ProfileJson, now: Date): Athlete {
  const { sex, bodyMass, stature, factors, skill, birthDate } = profile
  return { sex, bodyMass, stature, factors, skill, minor: isMinor(birthDate, now) }
}
