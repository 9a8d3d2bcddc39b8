import type { DemoAccount } from '#shared/contract/auth'
import type { ExerciseDocument } from '#shared/contract/exercise'
import type { Role } from '#shared/contract/me'
import type { Action } from '#shared/mechanics/vocabulary'
import type { Sex } from '#shared/mechanics/sex'
import { QUARRY_LANE, ROOM, SALTMARSH, YARD, type DemoClub, type DemoPlace } from './clubs'
import { demoId } from './random'

/** One password per role; they are no secret, and the accounts exist in demo mode only. */
export const DEMO_PASSWORDS: Record<Role, string> = {
  athlete: 'spare the joint',
  coach: 'train the muscle',
  physio: 'steady on the stairs',
  admin: 'keeper of the flags',
}

export interface DemoPerson {
  id: string
  name: string
  email: string
  role: Role
  clubs: DemoClub[]
}

export interface DemoAthlete extends DemoPerson {
  sex: Sex
  /** kg */
  bodyMass: number
  /** m */
  stature: number
  /** Whole years before the demo's day; the birthday itself comes from the name. */
  age: number
  skill: ExerciseDocument['skill']
  /** Own strength against the average adult, all actions alike before the small differences of a real body. */
  strength: number
  /** Strength of hips, knees and ankles against the rest: those who live on the bar have lighter legs. */
  legs: number
  /** Where the sport made them stronger than they are elsewhere. */
  trained: Partial<Record<Action, number>>
  /** Loads (kg) that the demo is told with, by exercise; all others are worked out from the strength. */
  loads: Readonly<Record<string, number>>
  place: DemoPlace
  /** Which week they follow, and on which weekday (0–6) it begins against the demo's day. */
  programme: 'bars' | 'barsBeginner' | 'barbell' | 'barbellBeginner'
  phase: number
  consents: boolean
}

const BOTH = [QUARRY_LANE, SALTMARSH]

function person(name: string, role: Role, clubs: DemoClub[]): DemoPerson {
  const email = `${name.toLowerCase().replace(/[^a-z]+/g, '.')}@pintle.example`
  return { id: demoId('person', name), name, email, role, clubs }
}

export const ADMIN = person('Maren Oldacre', 'admin', BOTH)
export const YARD_COACH = person('Tobin Ashgrove', 'coach', [QUARRY_LANE])
export const ROOM_COACH = person('Petra Lindqvale', 'coach', [SALTMARSH])
export const PHYSIO = person('Anouk Verrin', 'physio', BOTH)
export const STAFF = [ADMIN, YARD_COACH, ROOM_COACH, PHYSIO]

type Usual = 'place' | 'consents' | 'legs' | 'trained' | 'loads'
type Details = Omit<DemoAthlete, keyof DemoPerson | Usual> & Partial<Pick<DemoAthlete, Usual>>

/** Years of the same work show where it was done. */
const TRAINED: Record<DemoAthlete['programme'], DemoAthlete['trained']> = {
  bars: { shoulderAdduction: 1.2, trunkExtension: 1.3 },
  barsBeginner: {},
  barbell: { trunkExtension: 1.5 },
  barbellBeginner: {},
}

function athlete(name: string, clubs: DemoClub[], details: Details): DemoAthlete {
  const place = clubs.includes(QUARRY_LANE) ? YARD : ROOM
  const trained = TRAINED[details.programme]
  return { ...person(name, 'athlete', clubs), place, consents: true, legs: 1, trained, loads: {}, ...details }
}

/** Trains in the yard and has a key to the room with the cables: the demo is told from her day. */
export const ILSE = athlete('Ilse Tamm', BOTH, {
  sex: 'female',
  bodyMass: 62,
  stature: 1.68,
  age: 31,
  skill: 'advanced',
  strength: 1.8,
  legs: 0.75,
  loads: { 'pull-up-overhand': 5 },
  programme: 'bars',
  phase: 0,
})

/** The second story: a leg day in the room of machines. */
export const OSWIN = athlete('Oswin Tarrant', [SALTMARSH], {
  sex: 'male',
  bodyMass: 84,
  stature: 1.79,
  age: 38,
  skill: 'advanced',
  strength: 1.7,
  programme: 'barbell',
  phase: 0,
})

export const ATHLETES: DemoAthlete[] = [
  ILSE,
  OSWIN,
  athlete('Corin Blaise', [QUARRY_LANE], {
    sex: 'male',
    bodyMass: 77,
    stature: 1.8,
    age: 27,
    skill: 'intermediate',
    strength: 1.45,
    programme: 'bars',
    phase: 2,
  }),
  athlete('Dessa Hollin', [QUARRY_LANE], {
    sex: 'female',
    bodyMass: 58,
    stature: 1.62,
    age: 24,
    skill: 'beginner',
    strength: 1.15,
    programme: 'barsBeginner',
    phase: 0,
  }),
  athlete('Rufus Penhale', [QUARRY_LANE], {
    sex: 'male',
    bodyMass: 71,
    stature: 1.74,
    age: 34,
    skill: 'advanced',
    strength: 1.7,
    programme: 'bars',
    phase: 5,
  }),
  athlete('Jory Tregear', [QUARRY_LANE], {
    sex: 'male',
    bodyMass: 61,
    stature: 1.73,
    age: 16,
    skill: 'beginner',
    strength: 1.05,
    programme: 'barsBeginner',
    phase: 3,
  }),
  athlete('Nila Sandoe', [QUARRY_LANE], {
    sex: 'female',
    bodyMass: 67,
    stature: 1.71,
    age: 42,
    skill: 'intermediate',
    strength: 1.55,
    programme: 'bars',
    phase: 4,
  }),
  athlete('Ewan Garrick', BOTH, {
    sex: 'male',
    bodyMass: 86,
    stature: 1.86,
    age: 29,
    skill: 'intermediate',
    strength: 1.5,
    programme: 'bars',
    phase: 6,
  }),
  athlete('Mirte Oskar', [QUARRY_LANE], {
    sex: 'female',
    bodyMass: 54,
    stature: 1.59,
    age: 22,
    skill: 'advanced',
    strength: 1.75,
    legs: 0.8,
    programme: 'bars',
    phase: 3,
  }),
  athlete('Halvard Quist', [SALTMARSH], {
    sex: 'male',
    bodyMass: 97,
    stature: 1.9,
    age: 45,
    skill: 'intermediate',
    strength: 1.4,
    programme: 'barbell',
    phase: 2,
  }),
  athlete('Bettine Crowe', [SALTMARSH], {
    sex: 'female',
    bodyMass: 73,
    stature: 1.69,
    age: 51,
    skill: 'beginner',
    strength: 1.1,
    programme: 'barbellBeginner',
    phase: 0,
  }),
  athlete('Saskia Morrow', [SALTMARSH], {
    sex: 'female',
    bodyMass: 61,
    stature: 1.66,
    age: 28,
    skill: 'intermediate',
    strength: 1.5,
    programme: 'barbell',
    phase: 5,
  }),
  athlete('Lewin Abara', [SALTMARSH], {
    sex: 'male',
    bodyMass: 75,
    stature: 1.78,
    age: 20,
    skill: 'beginner',
    strength: 1.1,
    programme: 'barbellBeginner',
    phase: 3,
  }),
  athlete('Thea Rusk', [SALTMARSH], {
    sex: 'unspecified',
    bodyMass: 69,
    stature: 1.73,
    age: 36,
    skill: 'intermediate',
    strength: 1.4,
    programme: 'barbell',
    phase: 6,
    consents: false,
  }),
]

/** What the start command prints and the sign-in page shows: every role in both clubs. All athletes share a password. */
export const DEMO_ACCOUNTS: DemoAccount[] = [ILSE, OSWIN, YARD_COACH, ROOM_COACH, PHYSIO, ADMIN].flatMap(
  ({ name, email, role, clubs }) =>
    clubs.map((club) => ({ name, email, role, password: DEMO_PASSWORDS[role], clubName: club.name })),
)
