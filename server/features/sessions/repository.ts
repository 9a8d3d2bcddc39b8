import type { EntityManager } from 'typeorm'
import type { Dose, Intent } from '#shared/contract/session'
import type { SoreJointInput } from '#shared/rules/index'
import type { TargetGroup } from '#shared/rules/muscle-names'
import { profileJson, type ProfileJson } from '../athletes/engine-athlete'
import { EDITION_SQL, type Edition } from '../exercises/catalogue'
import { standingSoreJson } from '../sore-joints/repository'

interface NamedExercise {
  id: string
  slug: string
  name: string
}

export interface SlotJson {
  id: string
  position: number
  exercise: NamedExercise
  planned: Dose
  intent: Intent
  target: TargetGroup
  swap: { id: string; exercise: NamedExercise; dose: Dose; takenAt: string } | null
}

export interface SessionJson {
  id: string
  title: string
  minutes: number
  placeId: string | null
  placeName: string | null
  slots: SlotJson[]
}

/** A day of an athlete with everything its answer is made from. */
export interface DayRow extends Edition {
  athleteId: string
  profile: ProfileJson | null
  sore: SoreJointInput[]
  session: SessionJson | null
  nextDay: string | null
}

const doseJson = (of: string) => `
  jsonb_build_object('sets', ${of}.sets, 'repetitions', ${of}.repetitions, 'unit', ${of}.unit, 'rir', ${of}.rir,
                     'load', ${of}.load, 'pieces', ${of}.pieces)`

const exerciseJson = (exercise: string, version: string) =>
  `jsonb_build_object('id', ${exercise}.id, 'slug', ${exercise}.slug, 'name', ${version}.name)`

const SWAP_JSON = `
  (select jsonb_build_object('id', sw.id, 'exercise', ${exerciseJson('se', 'sv')}, 'dose', ${doseJson('sw')},
                             'takenAt', to_char(sw.taken_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'))
     from swaps sw
     join exercise_versions sv on sv.id = sw.exercise_version_id
     join exercises se on se.id = sv.exercise_id
    where sw.slot_id = sl.id and sw.undone_at is null)`

const SLOTS_JSON = `
  coalesce((
    select jsonb_agg(jsonb_build_object(
             'id', sl.id, 'position', sl.position, 'exercise', ${exerciseJson('e', 'v')}, 'planned', ${doseJson('sl')},
             'intent', sl.intent, 'target', sl.target, 'swap', ${SWAP_JSON}
           ) order by sl.position)
      from slots sl
      join exercises e on e.id = sl.exercise_id
      join exercise_versions v on v.exercise_id = e.id and v.is_current
     where sl.session_id = s.id
  ), '[]'::jsonb)`

/** The given athletes' day, in one query. Whoever calls it has checked that the actor may see them. */
export const findDays = (manager: EntityManager, athleteIds: readonly string[], day: string): Promise<DayRow[]> =>
  manager.query(
    `select u.id as "athleteId", ${profileJson('u.id')} as profile, ${standingSoreJson('u.id')} as sore, ${EDITION_SQL},
            (select jsonb_build_object('id', s.id, 'title', s.title, 'minutes', s.minutes, 'placeId', s.place_id,
                                       'placeName', pl.name, 'slots', ${SLOTS_JSON})
               from sessions s left join places pl on pl.id = s.place_id
              where s.athlete_id = u.id and s.day = $2::date) as session,
            (select min(later.day)::text from sessions later where later.athlete_id = u.id and later.day > $2::date) as "nextDay"
       from users u
      where u.id = any($1::uuid[])`,
    [athleteIds, day],
  )
