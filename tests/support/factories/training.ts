import type { EntityManager } from 'typeorm'
import type { ExerciseDocument } from '#shared/contract/exercise'
import type { RuleSet } from '#shared/contract/rule-set'
import { readCatalogue, readRuleSets, seedRuleSets } from '#server/database/seed-catalogue'
import { Exercise } from '#server/features/exercises/entity'
import { publish } from '#server/features/exercises/publish'
import { Flag } from '#server/features/flags/entity'
import type { Club, User } from '#server/features/people/entity'
import { Place, PlaceEquipment } from '#server/features/places/entity'
import { Session, Slot } from '#server/features/sessions/entity'
import { SoreJoint } from '#server/features/sore-joints/entity'
import type { Equipment, LoadSteps } from '#shared/contract/place'
import { next } from '../factories'
import type { TestApp } from '../test-app'

/** The true exercises that tests of features train with: sore elbows on a pull day, and the work that spares them. */
export const TEST_SLUGS = ['pull-up-overhand', 'chin-up', 'lat-pulldown-overhand', 'lat-pulldown-neutral'] as const
export type TestSlug = (typeof TEST_SLUGS)[number]

type AthleteInClub = User & { club: Club }

/** Publishes the test exercises and gives factories for what athletes do with them. */
export async function trainingFactories({ dataSource, clock }: TestApp, slugs: readonly string[] = TEST_SLUGS) {
  const ruleSet = await seedRuleSets(dataSource, await readRuleSets(), clock.now())
  const documents = (await readCatalogue()).filter(({ slug }) => slugs.includes(slug))
  await dataSource.transaction(async (manager) => {
    for (const document of documents) await publish(manager, document, ruleSet, clock.now())
  })
  const exercises = await dataSource.manager.find(Exercise)
  const ids = new Map(exercises.map(({ slug, id }) => [slug, id]))
  return new TrainingFactories(dataSource.manager, clock, ruleSet, documents, ids)
}

export class TrainingFactories {
  constructor(
    private readonly manager: EntityManager,
    private readonly clock: TestApp['clock'],
    readonly ruleSet: RuleSet,
    readonly documents: ExerciseDocument[],
    private readonly ids: ReadonlyMap<string, string>,
  ) {}

  /** The calendar day of the test's clock. */
  get day(): string {
    return this.clock.now().toISOString().slice(0, 10)
  }

  exerciseId(slug: TestSlug): string {
    const id = this.ids.get(slug)
    if (id === undefined) throw new Error(`${slug} is not published in this test`)
    return id
  }

  document(slug: TestSlug): ExerciseDocument {
    const document = this.documents.find((each) => each.slug === slug)
    if (document === undefined) throw new Error(`${slug} is not published in this test`)
    return document
  }

  /** A place that has everything the test exercises need, unless told otherwise. */
  async place(
    club: Club,
    equipment: Partial<Record<Equipment, LoadSteps | null>> = {
      pullUpBar: null,
      dipBelt: { first: 1.25, step: 1.25, last: 60 },
      latPulldown: { first: 5, step: 5, last: 120 },
      assistedPullUpMachine: { first: 5, step: 5, last: 80 },
    },
  ): Promise<Place> {
    const place = await this.manager.save(Place, { clubId: club.id, name: `Place ${next()}` })
    const rows = (Object.entries(equipment) as Array<[Equipment, LoadSteps | null]>).map(([kind, steps]) => ({
      placeId: place.id,
      kind,
      firstLoad: steps?.first ?? null,
      loadStep: steps?.step ?? null,
      lastLoad: steps?.last ?? null,
    }))
    await this.manager.save(PlaceEquipment, rows)
    return place
  }

  async session(athlete: AthleteInClub, given: Partial<Session> = {}): Promise<Session> {
    return this.manager.save(Session, {
      athleteId: athlete.id,
      clubId: athlete.club.id,
      day: this.day,
      title: 'Pull day',
      minutes: 55,
      placeId: given.placeId === undefined ? (await this.place(athlete.club)).id : given.placeId,
      ...given,
    })
  }

  /** A slot of pull-ups for the lats, in a session of today unless one is given. */
  async slot(
    athlete: AthleteInClub,
    { session, slug = 'pull-up-overhand', ...given }: Partial<Slot> & { session?: Session; slug?: TestSlug } = {},
  ): Promise<Slot> {
    const home = session ?? (await this.session(athlete))
    return this.manager.save(Slot, {
      sessionId: home.id,
      position: next(),
      exerciseId: this.exerciseId(slug),
      sets: 4,
      repetitions: 6,
      unit: 'repetitions',
      rir: 2,
      load: null,
      pieces: 1,
      intent: 'strength',
      target: 'lats',
      ...given,
    })
  }

  /** A right elbow, 4 of 10, provoked by bending, standing unless told otherwise. */
  soreJoint(athlete: { id: string }, given: Partial<SoreJoint> = {}): Promise<SoreJoint> {
    return this.manager.save(SoreJoint, {
      athleteId: athlete.id,
      joint: 'elbow',
      side: 'right',
      rating: 4,
      provocations: ['bending'],
      redFlags: [],
      note: '',
      day: this.day,
      state: 'open',
      reportedAt: this.clock.now(),
      closedAt: null,
      clearedBy: null,
      clearedAt: null,
      clearanceNote: null,
      ...given,
    })
  }

  redFlag(athlete: { id: string }, given: Partial<SoreJoint> = {}): Promise<SoreJoint> {
    return this.soreJoint(athlete, { state: 'redFlag', redFlags: ['nerve'], ...given })
  }

  flag(raisedBy: { id: string }, slot: Slot, club: Club, given: Partial<Flag> = {}): Promise<Flag> {
    return this.manager.save(Flag, {
      clubId: club.id,
      raisedBy: raisedBy.id,
      slotId: slot.id,
      originalId: slot.exerciseId,
      exerciseId: this.exerciseId('lat-pulldown-neutral'),
      reason: 'loadOff',
      note: '',
      ruleSetVersion: this.ruleSet.version,
      raisedAt: this.clock.now(),
      state: 'open',
      ...given,
    })
  }
}
