import { beforeAll, describe, expect, it } from 'vitest'
import { AuditEntry } from '#server/features/audit/entity'
import { Swap } from '#server/features/swaps/entity'
import { ExerciseVersion } from '#server/features/exercises/entity'
import { affectedBy, type Candidate } from '#shared/rules/index'
import { expectError } from '#tests/support/expect-error'
import { trainingFactories, type TestSlug, type TrainingFactories } from '#tests/support/factories/training'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app())
})

const today = (athlete: { id: string }, day = '2026-03-02') => `/api/athletes/${athlete.id}/today?day=${day}`
const nameOf = (slug: TestSlug) => ({ id: training.exerciseId(slug), slug, name: training.document(slug).name })

async function candidate(slug: TestSlug): Promise<Candidate> {
  const edition = await app().dependencies.catalogue.latest(['male'])
  const found = edition.find('male', training.exerciseId(slug))
  if (found === null) throw new Error(`${slug} is not in the catalogue`)
  return found
}

/** A swap that stands in the slot, as if it had been taken from a table. */
async function takenSwap(slotId: string, slug: TestSlug) {
  const { manager } = app().dataSource
  const version = await manager.findOneByOrFail(ExerciseVersion, {
    exerciseId: training.exerciseId(slug),
    isCurrent: true,
  })
  return manager.save(Swap, {
    slotId,
    exerciseVersionId: version.id,
    sets: 4,
    repetitions: 8,
    unit: 'repetitions',
    rir: 2,
    load: 30,
    pieces: 1,
    rank: 1,
    fingerprint: 'fingerprint',
    ruleSetVersion: training.ruleSet.version,
    ranking: {} as Swap['ranking'],
    takenBy: null,
    takenAt: app().clock.now(),
    undoneBy: null,
    undoneAt: null,
  })
}

describe('GET /api/athletes/:athleteId/today', () => {
  it('needs a sign-in', async () => {
    expectError(
      await app()
        .anonymous()
        .get(today(await app().make.athlete())),
      'not_signed_in',
    )
  })

  it('is not found for strangers', async () => {
    const { make } = app()
    const athlete = await make.athlete()
    for (const person of [
      await make.athlete({ club: athlete.club }),
      await make.coach(athlete.club),
      await make.admin(athlete.club),
    ]) {
      expectError(await (await app().as(person)).get(today(athlete)), 'not_found')
    }
    // Somebody who is no athlete has no training of their own.
    const coach = await make.coach()
    expectError(await (await app().as(coach)).get(today(coach)), 'not_found')
  })

  it('wants a real day and a real id', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    expectError(await agent.get(today(athlete, '2026-13-01')), 'invalid_request', ['day'])
    expectError(await agent.get(`/api/athletes/${athlete.id}/today`), 'invalid_request', ['day'])
    expectError(await agent.get(today({ id: 'me' })), 'invalid_request', ['athleteId'])
  })

  it('is a rest day, with the next planned one, when nothing is planned', async () => {
    const athlete = await app().make.athlete()
    await training.session(athlete, { day: '2026-03-01' })
    await training.session(athlete, { day: '2026-03-09' })
    await training.session(athlete, { day: '2026-03-05' })
    const { body } = await (await app().as(athlete)).get(today(athlete)).expect(200)
    expect(body).toEqual({
      athlete: { id: athlete.id, name: athlete.name },
      day: '2026-03-02',
      session: null,
      nextDay: '2026-03-05',
    })
  })

  it('gives the slots in order as planned, unaffected while nothing is sore', async () => {
    const athlete = await app().make.athlete()
    const place = await training.place(athlete.club)
    const session = await training.session(athlete, { placeId: place.id })
    const second = await training.slot(athlete, { session, position: 2, slug: 'chin-up', load: 7.5, intent: 'size' })
    const first = await training.slot(athlete, { session, position: 1 })
    const { body } = await (await app().as(athlete)).get(today(athlete)).expect(200)
    const planned = { sets: 4, repetitions: 6, unit: 'repetitions', rir: 2, load: null, pieces: 1 }
    const common = { target: 'lats', swap: null, affected: [], can: { swap: true } }
    expect(body.session).toEqual({
      id: session.id,
      athleteId: athlete.id,
      day: '2026-03-02',
      title: 'Pull day',
      minutes: 55,
      placeId: place.id,
      placeName: place.name,
      slots: [
        { id: first.id, position: 1, exercise: nameOf('pull-up-overhand'), planned, intent: 'strength', ...common },
        {
          id: second.id,
          position: 2,
          exercise: nameOf('chin-up'),
          planned: { ...planned, load: 7.5 },
          intent: 'size',
          ...common,
        },
      ],
    })
  })

  it('says which slots a sore elbow puts over its cap, with the numbers of the engine', async () => {
    const athlete = await app().make.athlete()
    const slot = await training.slot(athlete)
    const sore = await training.soreJoint(athlete, { rating: 5 })
    const { body } = await (await app().as(athlete)).get(today(athlete)).expect(200)
    const [answer] = body.session.slots
    const engine = affectedBy(
      await candidate('pull-up-overhand'),
      {
        sets: slot.sets,
        repetitions: slot.repetitions,
        unit: slot.unit,
        rir: slot.rir,
        load: slot.load,
        pieces: slot.pieces,
      },
      { sex: 'male', bodyMass: 75, stature: 1.78, factors: {}, skill: 'beginner', minor: false },
      [{ soreJointId: sore.id, joint: 'elbow', side: 'right', rating: 5, provocations: ['bending'], redFlags: [] }],
      training.ruleSet,
    )
    expect(engine.length).toBeGreaterThan(0)
    expect(answer.affected).toEqual(JSON.parse(JSON.stringify(engine)))
    expect(answer.affected[0]).toMatchObject({
      joint: 'elbow',
      side: 'right',
      verdict: 'overCap',
      soreJointId: sore.id,
    })
  })

  it('marks what a red flag forbids, and warns somebody without a body profile too', async () => {
    const athlete = await app().make.athlete({ profile: null })
    await training.slot(athlete)
    const flagged = await training.redFlag(athlete)
    const { body } = await (await app().as(athlete)).get(today(athlete)).expect(200)
    expect(body.session.slots[0].affected[0]).toMatchObject({ verdict: 'redFlag', soreJointId: flagged.id })
  })

  it('judges the swap that stands instead of the planned exercise', async () => {
    const athlete = await app().make.athlete()
    const slot = await training.slot(athlete)
    const swap = await takenSwap(slot.id, 'lat-pulldown-neutral')
    const { body } = await (await app().as(athlete)).get(today(athlete)).expect(200)
    expect(body.session.slots[0]).toMatchObject({
      exercise: nameOf('pull-up-overhand'),
      can: { swap: false },
      swap: {
        id: swap.id,
        exercise: nameOf('lat-pulldown-neutral'),
        dose: { sets: 4, repetitions: 8, unit: 'repetitions', rir: 2, load: 30, pieces: 1 },
        takenAt: app().clock.now().toISOString(),
        can: { undo: true },
      },
    })
  })

  it('lets the coach change it and the physio only look, and writes both into the trail', async () => {
    const { make, dataSource } = app()
    const athlete = await make.athlete()
    await training.slot(athlete)
    for (const [carer, may] of [
      [await make.coach(athlete.club), true],
      [await make.physio(athlete.club), false],
    ] as const) {
      await make.consent(athlete, carer)
      const { body } = await (await app().as(carer)).get(today(athlete)).expect(200)
      expect(body.session.slots[0].can.swap).toBe(may)
    }
    expect(await dataSource.manager.countBy(AuditEntry, { subjectId: athlete.id, action: 'read.today' })).toBe(2)
  })
})
