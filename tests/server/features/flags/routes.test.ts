import { beforeAll, describe, expect, it } from 'vitest'
import { AuditEntry } from '#server/features/audit/entity'
import { Flag } from '#server/features/flags/entity'
import { expectError } from '#tests/support/expect-error'
import { trainingFactories, type TrainingFactories } from '#tests/support/factories/training'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app())
})

const flagsOf = (person: { id: string }) => app().dataSource.manager.findBy(Flag, { raisedBy: person.id })

async function slotOfAthlete() {
  const athlete = await app().make.athlete()
  const slot = await training.slot(athlete)
  const sent = { slotId: slot.id, exerciseId: training.exerciseId('lat-pulldown-neutral'), reason: 'wrongMuscle' }
  return { athlete, slot, sent, agent: await app().as(athlete) }
}

describe('POST /api/flags', () => {
  it('needs a sign-in', async () => {
    const { athlete, sent } = await slotOfAthlete()
    expectError(await app().anonymous().post('/api/flags').send(sent), 'not_signed_in')
    expect(await flagsOf(athlete)).toEqual([])
  })

  it('finds no slot of somebody who did not let the actor in', async () => {
    const { athlete, sent } = await slotOfAthlete()
    const { make } = app()
    for (const person of [
      await make.athlete({ club: athlete.club }),
      await make.coach(athlete.club),
      await make.admin(athlete.club),
    ]) {
      expectError(await (await app().as(person)).post('/api/flags').send(sent), 'not_found')
      expect(await flagsOf(person)).toEqual([])
    }
  })

  it('names what is wrong with the request', async () => {
    const { athlete, sent, agent } = await slotOfAthlete()
    const refused = async (change: object, code: 'invalid_request' | 'not_found', fields: string[] = []) =>
      expectError(await agent.post('/api/flags').send({ ...sent, ...change }), code, fields)
    await refused({ reason: 'boring' }, 'invalid_request', ['reason'])
    await refused({ note: 'x'.repeat(2001) }, 'invalid_request', ['note'])
    await refused({ slotId: 'first' }, 'invalid_request', ['slotId'])
    await refused({ exerciseId: athlete.id }, 'not_found')
    expect(await flagsOf(athlete)).toEqual([])
  })

  it('stores an open flag under the rules that stand and answers with it', async () => {
    const { athlete, slot, sent, agent } = await slotOfAthlete()
    const { body } = await agent
      .post('/api/flags')
      .send({ ...sent, note: 'Felt it in the arms.' })
      .expect(201)
    const name = (slug: 'pull-up-overhand' | 'lat-pulldown-neutral') => ({
      id: training.exerciseId(slug),
      slug,
      name: training.document(slug).name,
    })
    expect(body).toEqual({
      id: expect.any(String),
      raisedBy: { id: athlete.id, name: athlete.name },
      original: name('pull-up-overhand'),
      exercise: name('lat-pulldown-neutral'),
      reason: 'wrongMuscle',
      note: 'Felt it in the arms.',
      ruleSetVersion: training.ruleSet.version,
      raisedAt: app().clock.now().toISOString(),
      state: 'open',
    })
    const rows = await flagsOf(athlete)
    expect(rows).toHaveLength(1)
    expect(rows[0]).toMatchObject({
      id: body.id,
      slotId: slot.id,
      clubId: athlete.club.id,
      note: 'Felt it in the arms.',
    })
    const trail = await app().dataSource.manager.findBy(AuditEntry, { subjectId: athlete.id, action: 'raise.flag' })
    expect(trail.map(({ details }) => details)).toEqual([{ flagId: body.id }])
  })

  it('may come from the coach who was let in', async () => {
    const { athlete, sent } = await slotOfAthlete()
    const coach = await app().make.coach(athlete.club)
    await app().make.consent(athlete, coach)
    const { body } = await (await app().as(coach)).post('/api/flags').send(sent).expect(201)
    expect(body.raisedBy.id).toBe(coach.id)
  })
})

describe('GET /api/flags', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().get('/api/flags'), 'not_signed_in')
  })

  it('refuses an unknown state and a foreign cursor', async () => {
    const agent = await app().as(await app().make.athlete())
    expectError(await agent.get('/api/flags?state=lost'), 'invalid_request', ['state'])
    expectError(await agent.get('/api/flags?cursor=lost'), 'invalid_request', ['cursor'])
  })

  it('shows an admin those of their clubs, everybody else their own, and settled ones when asked', async () => {
    const { make, clock } = app()
    const { athlete, slot, agent } = await slotOfAthlete()
    const admin = await make.admin(athlete.club)
    const elsewhere = await make.admin()
    const coach = await make.coach(athlete.club)
    await make.consent(athlete, coach)
    const open = await training.flag(athlete, slot, athlete.club)
    const settled = await training.flag(athlete, slot, athlete.club, {
      state: 'settled',
      raisedAt: new Date(clock.now().getTime() - 1000),
    })
    const ids = async (who: Awaited<ReturnType<ReturnType<typeof app>['as']>>, query = '') =>
      (await who.get(`/api/flags${query}`).expect(200)).body.items.map(({ id }: { id: string }) => id)
    const asAdmin = await app().as(admin)
    expect(await ids(asAdmin)).toEqual([open.id])
    expect(await ids(asAdmin, '?state=all')).toEqual([open.id, settled.id])
    expect(await ids(asAdmin, '?state=settled')).toEqual([settled.id])
    expect(await ids(agent)).toEqual([open.id])
    expect(await ids(await app().as(elsewhere))).toEqual([])
    expect(await ids(await app().as(coach))).toEqual([])
    const read = { actorId: admin.id, action: 'read.flags' }
    expect(await app().dataSource.manager.countBy(AuditEntry, read)).toBe(3)
  })

  it('pages through all of them once', async () => {
    const { athlete, slot, agent } = await slotOfAthlete()
    const made = []
    for (let index = 0; index < 5; index += 1) made.push((await training.flag(athlete, slot, athlete.club)).id)
    const seen: string[] = []
    let cursor: string | null = ''
    while (cursor !== null) {
      const { body }: { body: { items: Array<{ id: string }>; nextCursor: string | null } } = await agent.get(
        `/api/flags?limit=2${cursor === '' ? '' : `&cursor=${cursor}`}`,
      )
      seen.push(...body.items.map(({ id }) => id))
      cursor = body.nextCursor
    }
    expect(seen.toSorted()).toEqual(made.toSorted())
  })
})
