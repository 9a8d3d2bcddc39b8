import { beforeAll, describe, expect, it } from 'vitest'
import { AuditEntry } from '#server/features/audit/entity'
import { Membership } from '#server/features/people/entity'
import { expectError } from '#tests/support/expect-error'
import { countQueries } from '#tests/support/count-queries'
import { trainingFactories, type TrainingFactories } from '#tests/support/factories/training'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app())
})

const LIST = '/api/athletes?day=2026-03-02'

async function squadOf(names: string[]) {
  const { make } = app()
  const coach = await make.coach()
  const athletes = []
  for (const name of names) {
    const athlete = await make.athlete({ club: coach.club, name })
    await make.consent(athlete, coach)
    athletes.push(athlete)
  }
  return { coach, athletes, agent: await app().as(coach) }
}

describe('GET /api/athletes', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().get(LIST), 'not_signed_in')
  })

  it('is for coaches and physios', async () => {
    for (const person of [await app().make.athlete(), await app().make.admin()]) {
      expectError(await (await app().as(person)).get(LIST), 'forbidden')
    }
  })

  it('wants a day and a cursor of its own', async () => {
    const { agent } = await squadOf([])
    expectError(await agent.get('/api/athletes'), 'invalid_request', ['day'])
    expectError(await agent.get(`${LIST}&cursor=WzFd`), 'invalid_request', ['cursor'])
  })

  it('lists whoever lets the actor in, and nobody whose consent ended or who trains elsewhere', async () => {
    const { coach, athletes, agent } = await squadOf(['Amber'])
    const { make, clock } = app()
    const ended = await make.athlete({ club: coach.club })
    await make.consent(ended, coach, { revokedAt: clock.now() })
    await make.athlete({ club: coach.club })
    await make.consent(await make.athlete(), coach)
    const { body } = await agent.get(LIST).expect(200)
    expect(body).toEqual({
      items: [
        {
          id: athletes[0]?.id,
          name: 'Amber',
          clubName: coach.club.name,
          minor: false,
          consentSince: clock.now().toISOString(),
          sore: [],
          todayTitle: null,
          affectedSlots: 0,
        },
      ],
      nextCursor: null,
    })
  })

  it('puts a red flag first, then the sorest joint, then the name', async () => {
    const { athletes, agent } = await squadOf(['Cleo', 'Bree', 'Anna', 'Dora', 'Edda'])
    const [cleo, bree, , dora, edda] = athletes
    await training.soreJoint(dora!, { rating: 3 })
    await training.redFlag(edda!, { rating: 1 })
    await training.soreJoint(bree!, { rating: 6 })
    await training.soreJoint(bree!, { rating: 2, side: 'left' })
    await training.soreJoint(cleo!, { rating: 9, redFlags: ['injury'], state: 'closed', closedAt: app().clock.now() })
    const { body } = await agent.get(LIST).expect(200)
    expect(body.items.map(({ name }: { name: string }) => name)).toEqual(['Edda', 'Bree', 'Dora', 'Anna', 'Cleo'])
    expect(body.items[1].sore.map(({ rating }: { rating: number }) => rating)).toEqual([6, 2])
    expect(body.items[0].sore[0].can).toEqual({ close: false, clear: false })
    const pages: string[] = []
    let cursor: string | null = ''
    while (cursor !== null) {
      const page: { items: Array<{ name: string }>; nextCursor: string | null } = (
        await agent.get(`${LIST}&limit=2${cursor === '' ? '' : `&cursor=${cursor}`}`).expect(200)
      ).body
      pages.push(...page.items.map(({ name }) => name))
      cursor = page.nextCursor
    }
    expect(pages).toEqual(['Edda', 'Bree', 'Dora', 'Anna', 'Cleo'])
  })

  it('counts the slots of the day that a sore joint puts over its cap', async () => {
    const { athletes, agent } = await squadOf(['Greta'])
    const [greta] = athletes
    const session = await training.session(greta!)
    await training.slot(greta!, { session })
    await training.slot(greta!, { session, slug: 'chin-up' })
    const before = await agent.get(LIST).expect(200)
    expect(before.body.items[0]).toMatchObject({ todayTitle: 'Pull day', affectedSlots: 0 })
    await training.soreJoint(greta!, { rating: 6 })
    const after = await agent.get(LIST).expect(200)
    expect(after.body.items[0].affectedSlots).toBe(2)
  })

  it('names a minor and gives a physio the right to clear', async () => {
    const { make, dataSource } = app()
    const physio = await make.physio()
    await dataSource.manager.save(Membership, { userId: physio.id, clubId: physio.club.id, role: 'coach' })
    const athlete = await make.athlete({ club: physio.club, profile: { birthDate: '2008-03-03' } })
    await make.consent(athlete, physio)
    await training.redFlag(athlete)
    const agent = await app().as(physio)
    const { body } = await agent.get(LIST).expect(200)
    expect(body.items).toHaveLength(1)
    expect(body.items[0]).toMatchObject({ minor: true, sore: [{ can: { close: false, clear: true } }] })
  })

  it('writes one line into the trail and asks no more queries for twelve athletes than for two', async () => {
    const few = await squadOf(['Ida', 'Jill'])
    const many = await squadOf(Array.from({ length: 12 }, (_, index) => `Member ${index}`))
    for (const athlete of [...few.athletes, ...many.athletes]) {
      await training.slot(athlete)
      await training.soreJoint(athlete)
    }
    const count = (agent: typeof few.agent) => countQueries(() => agent.get(LIST).expect(200))
    await count(few.agent)
    expect(await count(many.agent)).toBe(await count(few.agent))
    const read = { actorId: many.coach.id, action: 'read.athletes' }
    expect(await app().dataSource.manager.countBy(AuditEntry, read)).toBe(1)
  })
})
