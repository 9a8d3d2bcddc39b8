import type { AthleteRow } from '#shared/contract/athlete'
import type { AuditEntry } from '#shared/contract/audit'
import type { Flag } from '#shared/contract/flag'
import type { Me } from '#shared/contract/me'
import type { Place } from '#shared/contract/place'
import type { Dose, Session, Slot, Today } from '#shared/contract/session'
import type { SoreJoint } from '#shared/contract/sore-joint'

/** Invented people and days as the API would tell of them, with what a test does not care about filled in. */
let count = 0
const nextId = () => `00000000-0000-4000-8000-${String((count += 1)).padStart(12, '0')}`

export const aPerson = (change: Partial<Me> = {}): Me => ({
  id: nextId(),
  name: 'Ilse Tamm',
  email: 'ilse@quarry-lane.example',
  memberships: [{ clubId: nextId(), clubName: 'Quarry Lane Strength', role: 'athlete' }],
  units: 'metric',
  body: { sex: 'female', bodyMass: 61.5, stature: 1.68, birthDate: '1996-03-14' },
  defaultPlaceId: null,
  demo: false,
  ...change,
})

export const aPlace = (change: Partial<Place> = {}): Place => ({
  id: nextId(),
  clubId: nextId(),
  name: 'Quarry Lane yard',
  equipment: [],
  ...change,
})

export const aDose = (change: Partial<Dose> = {}): Dose => ({
  sets: 4,
  repetitions: 6,
  unit: 'repetitions',
  rir: 2,
  load: null,
  pieces: 1,
  ...change,
})

export const anExercise = (name: string) => ({ id: nextId(), slug: name.toLowerCase().replace(/[^a-z]+/g, '-'), name })

export const aSlot = (change: Partial<Slot> = {}): Slot => ({
  id: nextId(),
  position: 1,
  exercise: anExercise('Pull-up, overhand'),
  planned: aDose({ load: 5 }),
  intent: 'strength',
  target: 'lats',
  swap: null,
  affected: [],
  can: { swap: true },
  ...change,
})

export const aSession = (change: Partial<Session> = {}): Session => ({
  id: nextId(),
  athleteId: nextId(),
  day: '2026-12-01',
  title: 'Pull day',
  minutes: 55,
  placeId: nextId(),
  placeName: 'Quarry Lane yard',
  slots: [aSlot()],
  ...change,
})

export const aToday = (session: Session | null, change: Partial<Today> = {}): Today => ({
  athlete: { id: session?.athleteId ?? nextId(), name: 'Ilse Tamm' },
  day: '2026-12-01',
  session,
  nextDay: '2026-12-03',
  ...change,
})

export const aSoreJoint = (change: Partial<SoreJoint> = {}): SoreJoint => ({
  id: nextId(),
  athleteId: nextId(),
  joint: 'elbow',
  side: 'right',
  rating: 4,
  provocations: ['bending'],
  redFlags: [],
  note: '',
  day: '2026-11-29',
  state: 'open',
  reportedAt: '2026-11-29T07:12:00.000Z',
  closedAt: null,
  clearedBy: null,
  clearedAt: null,
  can: { close: true, clear: false },
  ...change,
})

export const aRedFlag = (change: Partial<SoreJoint> = {}): SoreJoint =>
  aSoreJoint({ state: 'redFlag', redFlags: ['nightPain'], can: { close: false, clear: false }, ...change })

export const anAthleteRow = (change: Partial<AthleteRow> = {}): AthleteRow => ({
  id: nextId(),
  name: 'Ilse Tamm',
  clubName: 'Quarry Lane Strength',
  minor: false,
  consentSince: '2026-09-07T09:00:00.000Z',
  sore: [],
  todayTitle: 'Pull day',
  affectedSlots: 0,
  ...change,
})

export const aFlag = (change: Partial<Flag> = {}): Flag => ({
  id: nextId(),
  raisedBy: { id: nextId(), name: 'Ilse Tamm' },
  original: anExercise('Pull-up, overhand'),
  exercise: anExercise('Lat pulldown, neutral grip'),
  reason: 'hurts',
  note: 'The elbow spoke up in the second set.',
  ruleSetVersion: 1,
  raisedAt: '2026-11-30T17:40:00.000Z',
  state: 'open',
  ...change,
})

export const anAuditEntry = (change: Partial<AuditEntry> = {}): AuditEntry => ({
  id: nextId(),
  at: '2026-12-01T07:05:00.000Z',
  actor: { id: nextId(), name: 'Bram Oakes' },
  action: 'read.soreJoints',
  subject: { id: nextId(), name: 'Ilse Tamm' },
  details: {},
  ...change,
})

export const aList = <Item>(...items: Item[]) => ({ items, nextCursor: null as string | null })
