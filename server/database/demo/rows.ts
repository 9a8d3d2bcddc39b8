import type { EntityManager } from 'typeorm'
import type { Role } from '#shared/contract/me'
import { CLUBS, PLACES } from '../../../seeds/demo/clubs'
import { ATHLETES, DEMO_PASSWORDS, PHYSIO, ROOM_COACH, STAFF, YARD_COACH } from '../../../seeds/demo/people'
import { demoId } from '../../../seeds/demo/random'
import type { DemoSession } from '../../../seeds/demo/sessions'
import type { DemoSoreJoint } from '../../../seeds/demo/soreness'
import { hashPassword } from '../../features/auth/password-hash'
import type { CatalogueEdition } from '../../features/exercises/catalogue-edition'
import { strengthFactors } from './strength'

const DAY = 24 * 60 * 60 * 1000
/** Everybody joined before the first session of the demo. */
const JOINED_DAYS = 95

/** Inserts rows, given as objects, with one statement. `columns` are SQL definitions, for example `id uuid`. */
export async function insertRows(
  manager: EntityManager,
  table: string,
  columns: string[],
  rows: object[],
): Promise<void> {
  const names = columns.map((column) => column.split(' ')[0]).join(', ')
  await manager.query(
    `insert into ${table} (${names}) select ${names} from jsonb_to_recordset($1::jsonb) as given(${columns.join(', ')})`,
    [JSON.stringify(rows)],
  )
}

export async function insertPlaces(manager: EntityManager): Promise<void> {
  await insertRows(manager, 'clubs', ['id uuid', 'name text'], CLUBS)
  const places = PLACES.map(({ id, clubId, name }) => ({ id, club_id: clubId, name }))
  await insertRows(manager, 'places', ['id uuid', 'club_id uuid', 'name text'], places)
  const equipment = PLACES.flatMap((place) =>
    place.equipment.map(({ kind, steps }) => ({
      place_id: place.id,
      kind,
      first_load: steps?.first,
      load_step: steps?.step,
      last_load: steps?.last,
    })),
  )
  const number = 'double precision'
  await insertRows(
    manager,
    'place_equipment',
    ['place_id uuid', 'kind text', `first_load ${number}`, `load_step ${number}`, `last_load ${number}`],
    equipment,
  )
}

/** The hash of each role's password, made once per role: the passwords are no secret. */
async function passwordHashes(): Promise<Record<Role, string>> {
  const entries = Object.entries(DEMO_PASSWORDS).map(async ([role, password]) => [role, await hashPassword(password)])
  return Object.fromEntries(await Promise.all(entries)) as Record<Role, string>
}

/** A birthday that makes the athlete the given age on the demo's day, whatever day that is. */
export function birthDate(age: number, now: Date): string {
  const birthday = new Date(now.getTime() - 150 * DAY)
  birthday.setUTCFullYear(birthday.getUTCFullYear() - age)
  return birthday.toISOString().slice(0, 10)
}

export async function insertPeople(manager: EntityManager, now: Date): Promise<void> {
  const hashes = await passwordHashes()
  const joined = new Date(now.getTime() - JOINED_DAYS * DAY)
  const users = [
    ...ATHLETES.map((athlete) => ({ ...athlete, default_place_id: athlete.place.id })),
    ...STAFF.map((person) => ({ ...person, default_place_id: null })),
  ]
  await insertRows(
    manager,
    'users',
    ['id uuid', 'name text', 'email text', 'password_hash text', 'default_place_id uuid', 'created_at timestamptz'],
    users.map((user) => ({ ...user, password_hash: hashes[user.role], created_at: joined })),
  )
  const memberships = users.flatMap(({ id, name, role, clubs }) =>
    clubs.map((club) => ({ id: demoId('membership', name, club.name), user_id: id, club_id: club.id, role })),
  )
  await insertRows(manager, 'memberships', ['id uuid', 'user_id uuid', 'club_id uuid', 'role text'], memberships)
  const profiles = ATHLETES.map((athlete) => ({
    user_id: athlete.id,
    sex: athlete.sex,
    body_mass: athlete.bodyMass,
    stature: athlete.stature,
    birth_date: birthDate(athlete.age, now),
    skill: athlete.skill,
    strength_factors: strengthFactors(athlete),
  }))
  const number = 'double precision'
  await insertRows(
    manager,
    'athlete_profiles',
    [
      'user_id uuid',
      'sex text',
      `body_mass ${number}`,
      `stature ${number}`,
      'birth_date date',
      'skill text',
      'strength_factors jsonb',
    ],
    profiles,
  )
  const consents = ATHLETES.filter(({ consents: given }) => given).flatMap((athlete) =>
    [YARD_COACH, ROOM_COACH, PHYSIO]
      .filter((carer) => carer.clubs.some((club) => athlete.clubs.includes(club)))
      .map((carer) => ({
        id: demoId('consent', athlete.name, carer.name),
        athlete_id: athlete.id,
        carer_id: carer.id,
        granted_at: new Date(joined.getTime() + DAY),
      })),
  )
  await insertRows(
    manager,
    'consents',
    ['id uuid', 'athlete_id uuid', 'carer_id uuid', 'granted_at timestamptz'],
    consents,
  )
}

export async function insertSessions(
  manager: EntityManager,
  sessions: DemoSession[],
  edition: CatalogueEdition,
): Promise<void> {
  const exerciseIds = new Map(edition.candidates('unspecified').map(({ id, document }) => [document.slug, id]))
  await insertRows(
    manager,
    'sessions',
    ['id uuid', 'athlete_id uuid', 'club_id uuid', 'day date', 'title text', 'minutes integer', 'place_id uuid'],
    sessions.map(({ id, athlete, day, title, minutes }) => ({
      id,
      athlete_id: athlete.id,
      club_id: athlete.place.clubId,
      day,
      title,
      minutes,
      place_id: athlete.place.id,
    })),
  )
  const slots = sessions.flatMap((session) =>
    session.slots.map(({ id, position, slug, planned, intent, target }) => ({
      id,
      session_id: session.id,
      position,
      exercise_id: exerciseIds.get(slug),
      ...planned,
      intent,
      target,
    })),
  )
  const number = 'double precision'
  await insertRows(
    manager,
    'slots',
    [
      'id uuid',
      'session_id uuid',
      'position integer',
      'exercise_id uuid',
      'sets integer',
      'repetitions integer',
      'unit text',
      `rir ${number}`,
      `load ${number}`,
      'pieces integer',
      'intent text',
      'target text',
    ],
    slots,
  )
}

export async function insertSoreJoints(manager: EntityManager, soreJoints: DemoSoreJoint[]): Promise<void> {
  await insertRows(
    manager,
    'sore_joints',
    [
      'id uuid',
      'athlete_id uuid',
      'joint text',
      'side text',
      'rating integer',
      'provocations text[]',
      'red_flags text[]',
      'note text',
      'day date',
      'state text',
      'reported_at timestamptz',
      'closed_at timestamptz',
      'cleared_by uuid',
      'cleared_at timestamptz',
      'clearance_note text',
    ],
    soreJoints.map((report) => ({
      id: report.id,
      athlete_id: report.athlete.id,
      joint: report.joint,
      side: report.side,
      rating: report.rating,
      provocations: report.provocations,
      red_flags: report.redFlags,
      note: report.note,
      day: report.day,
      state: report.state,
      reported_at: report.reportedAt,
      closed_at: report.closedAt,
      cleared_by: report.clearedBy,
      cleared_at: report.clearedAt,
      clearance_note: report.clearanceNote,
    })),
  )
}

/** The last planned day of every demo athlete, by id. */
export async function lastSessionDays(manager: EntityManager): Promise<Map<string, string>> {
  const rows: Array<{ athleteId: string; day: string }> = await manager.query(
    `select athlete_id as "athleteId", max(day)::text as day from sessions where athlete_id = any($1::uuid[]) group by athlete_id`,
    [ATHLETES.map(({ id }) => id)],
  )
  return new Map(rows.map(({ athleteId, day }) => [athleteId, day]))
}

/**
 * Makes room for the planned session of a day. Resolves to false when that session stands already, or when somebody
 * took a swap or raised a flag in the one that does: what a visitor did is not thrown away.
 */
export async function replaceUntouchedDay(manager: EntityManager, planned: DemoSession): Promise<boolean> {
  const rows: Array<{ id: string; touched: boolean }> = await manager.query(
    `select s.id,
            exists (select 1 from slots sl where sl.session_id = s.id
                       and (exists (select 1 from swaps sw where sw.slot_id = sl.id)
                            or exists (select 1 from flags f where f.slot_id = sl.id))) as touched
       from sessions s where s.athlete_id = $1 and s.day = $2::date`,
    [planned.athlete.id, planned.day],
  )
  const standing = rows[0]
  if (standing === undefined) return true
  if (standing.id === planned.id || standing.touched) return false
  await manager.query('delete from sessions where id = $1', [standing.id])
  return true
}
