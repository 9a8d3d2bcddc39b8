import { beforeAll, describe, expect, it } from 'vitest'
import { ranking as rankingSchema, type Ranking } from '#shared/contract/swap'
import { seedCatalogue } from '#server/database/seed-catalogue'
import { seedDemo, type DemoSummary } from '#server/database/seed-demo'
import { Swap } from '#server/features/swaps/entity'
import { soreReport } from '#tests/support/samples'
import { testApp } from '#tests/support/test-app'
import { ROOM } from '../../../seeds/demo/clubs'
import { ATHLETES, DEMO_PASSWORDS, ILSE, OSWIN, ROOM_COACH, YARD_COACH } from '../../../seeds/demo/people'

const app = testApp({ PINTLE_DEMO: true })
let summary: DemoSummary
beforeAll(async () => {
  const { dataSource, dependencies, clock } = app()
  await seedCatalogue(dataSource, clock.now())
  summary = await seedDemo(dependencies, clock.now())
}, 120_000)

const today = () => app().clock.now().toISOString().slice(0, 10)
const count = async (table: string) => {
  const [row]: [{ count: number }] = await app().dataSource.query(`select count(*)::int as count from ${table}`)
  return row.count
}
const dayOf = async (person: { id: string }) =>
  (await (await app().as(person)).get(`/api/athletes/${person.id}/today?day=${today()}`).expect(200)).body

describe('the demo in the database', () => {
  it('has twelve weeks of sessions, soreness, swaps and flags', async () => {
    expect(summary.fresh).toBe(true)
    expect(await count('sessions')).toBe(summary.sessions)
    expect(await count('swaps')).toBe(summary.swaps)
    expect(summary.swaps).toBeGreaterThan(20)
    expect(await count('sore_joints')).toBeGreaterThan(50)
    expect(await count('flags')).toBeGreaterThan(3)
  })

  it('lets everybody sign in with the password of their role', async () => {
    for (const { email, role } of [ILSE, ROOM_COACH]) {
      const { body } = await app()
        .anonymous()
        .post('/api/auth/sign-in')
        .send({ email, password: DEMO_PASSWORDS[role] })
        .expect(200)
      expect(body.email).toBe(email)
    }
  })

  it('shows Ilse her pull day with nothing sore, planned within her strength', async () => {
    const { session, nextDay } = await dayOf(ILSE)
    expect(session.slots.map(({ exercise }: { exercise: { slug: string } }) => exercise.slug).slice(0, 2)).toEqual([
      'front-lever-tuck',
      'pull-up-overhand',
    ])
    expect(session.slots[1].planned).toEqual({
      sets: 4,
      repetitions: 6,
      unit: 'repetitions',
      rir: 2,
      load: 5,
      pieces: 1,
    })
    expect(session.slots.every(({ affected }: { affected: unknown[] }) => affected.length === 0)).toBe(true)
    expect(nextDay > today()).toBe(true)
    const agent = await app().as(ILSE)
    for (const { id } of session.slots) {
      const { body } = await agent.get(`/api/slots/${id}/swaps`).expect(200)
      expect(body.originalRow).not.toBeNull()
    }
  })

  it('tells the story: a sore elbow puts the pull-up over its cap, and there is work for the lats that spares it', async () => {
    const agent = await app().as(ILSE)
    const report = soreReport({ day: today() })
    const { body: sore } = await agent.post(`/api/athletes/${ILSE.id}/sore-joints`).send(report).expect(201)
    const { session } = await dayOf(ILSE)
    const [, pullUp] = session.slots
    expect(pullUp.affected[0]).toMatchObject({
      joint: 'elbow',
      side: 'right',
      verdict: 'overCap',
      soreJointId: sore.id,
    })
    const { body } = await agent.get(`/api/slots/${pullUp.id}/swaps?placeId=${ROOM.id}`).expect(200)
    const { items } = body as Ranking
    const rank = (slug: string) =>
      items.find(({ exercise }) => exercise.slug === slug)?.rank ?? Number.POSITIVE_INFINITY
    // Common practice, no source: straight arms and a pad before the pulldown, the pulldown before the pull-up.
    for (const spared of ['padded-pullover-machine', 'straight-arm-pulldown']) {
      expect(rank(spared)).toBeLessThan(rank('lat-pulldown-overhand'))
    }
    expect(rank('lat-pulldown-overhand')).toBeLessThan(rank('pull-up-overhand'))
    const taken = { exerciseId: items[0]!.exercise.id, fingerprint: body.fingerprint }
    await agent.post(`/api/slots/${pullUp.id}/swaps?placeId=${ROOM.id}`).send(taken).expect(201)
    await agent.post(`/api/athletes/${ILSE.id}/sore-joints/${sore.id}/closure`).expect(200)
  })

  it('keeps with every swap the table it was taken from, as the contract has it', async () => {
    const swaps = await app().dataSource.manager.find(Swap)
    for (const { ranking, rank, exerciseVersionId, repetitions, load } of swaps) {
      const item = rankingSchema.parse(ranking).items.find((row) => row.rank === rank)
      expect(item).toMatchObject({ exercise: { versionId: exerciseVersionId }, dose: { repetitions, load } })
    }
  })

  it('gives each coach the athletes who let them in, the red flag on top', async () => {
    const names = async (coach: { id: string }) =>
      (await (await app().as(coach)).get(`/api/athletes?day=${today()}`).expect(200)).body.items.map(
        ({ name }: { name: string }) => name,
      )
    const room = await names(ROOM_COACH)
    expect(room[0]).toBe('Halvard Quist')
    expect(room).not.toContain('Thea Rusk')
    expect(await names(YARD_COACH)).not.toContain('Halvard Quist')
  })

  it('adds nothing when it is seeded again on the same day', async () => {
    const { dependencies, clock } = app()
    const before = [await count('sessions'), await count('slots'), await count('sore_joints'), await count('swaps')]
    expect(await seedDemo(dependencies, clock.now())).toMatchObject({ fresh: false, sessions: 0 })
    expect([await count('sessions'), await count('slots'), await count('sore_joints'), await count('swaps')]).toEqual(
      before,
    )
  })

  it('has a planned session for the told athletes on whatever day it is started again', async () => {
    const { dependencies, clock } = app()
    for (const days of [1, 1, 4, 30]) {
      clock.advance({ days })
      await seedDemo(dependencies, clock.now())
      expect((await dayOf(ILSE)).session.title).toBe('Pull day')
      expect((await dayOf(OSWIN)).session.title).toBe('Squat day')
    }
    const perDay: unknown[] = await app().dataSource.query(
      'select athlete_id, day from sessions group by athlete_id, day having count(*) > 1',
    )
    expect(perDay).toEqual([])
    expect(await count('users')).toBeGreaterThanOrEqual(ATHLETES.length)
  })

  it('does not throw away what a visitor did on a day that was planned otherwise', async () => {
    const { dependencies, dataSource, clock } = app()
    clock.advance({ days: 1 })
    const [standing]: Array<{ id: string }> = await dataSource.query(
      'select id from sessions where athlete_id = $1 and day = $2',
      [ILSE.id, today()],
    )
    const day = standing ?? (await moveSessionTo(today()))
    await dataSource.query(
      `insert into flags (club_id, raised_by, slot_id, original_id, exercise_id, reason, note, rule_set_version, raised_at, state)
       select s.club_id, s.athlete_id, sl.id, sl.exercise_id, sl.exercise_id, 'other', '', 1, now(), 'open'
         from slots sl join sessions s on s.id = sl.session_id where s.id = $1 limit 1`,
      [day.id],
    )
    await seedDemo(dependencies, clock.now())
    expect((await dayOf(ILSE)).session.id).toBe(day.id)
  })
})

/** Ilse's next planned session, moved to a day. */
async function moveSessionTo(day: string): Promise<{ id: string }> {
  const [[moved]]: [Array<{ id: string }>, number] = await app().dataSource.query(
    `update sessions set day = $2 where id = (select id from sessions where athlete_id = $1 and day > $2 order by day limit 1)
     returning id`,
    [ILSE.id, day],
  )
  return moved!
}
