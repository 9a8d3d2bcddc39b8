import { beforeAll, describe, expect, it } from 'vitest'
import type { Ranking } from '#shared/contract/swap'
import { AuditEntry } from '#server/features/audit/entity'
import { Swap } from '#server/features/swaps/entity'
import { expectError } from '#tests/support/expect-error'
import { trainingFactories, type TrainingFactories } from '#tests/support/factories/training'
import { soreReport } from '#tests/support/samples'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app())
})

const forSlot = (slot: { id: string }, query = '') => `/api/slots/${slot.id}/swaps${query}`
const undoUrl = (id: string) => `/api/swaps/${id}/undo`
const swapsOf = (slot: { id: string }) => app().dataSource.manager.findBy(Swap, { slotId: slot.id })

/** An athlete who reads the table for a sore elbow, and the first row of it. */
async function reader() {
  const { make } = app()
  const athlete = await make.athlete({ profile: { strengthFactors: { shoulderAdduction: 1.8, elbowFlexion: 1.6 } } })
  const slot = await training.slot(athlete)
  await training.soreJoint(athlete)
  const agent = await app().as(athlete)
  const ranking = (await agent.get(forSlot(slot)).expect(200)).body as Ranking
  const first = ranking.items[0]!
  return {
    athlete,
    slot,
    agent,
    ranking,
    first,
    sent: { exerciseId: first.exercise.id, fingerprint: ranking.fingerprint },
  }
}

describe('POST /api/slots/:slotId/swaps', () => {
  it('needs a sign-in', async () => {
    const { slot, sent } = await reader()
    expectError(await app().anonymous().post(forSlot(slot)).send(sent), 'not_signed_in')
    expect(await swapsOf(slot)).toEqual([])
  })

  it('is refused to the physio, and strangers find no slot', async () => {
    const { athlete, slot, sent } = await reader()
    const { make } = app()
    const physio = await make.physio(athlete.club)
    await make.consent(athlete, physio)
    expectError(await (await app().as(physio)).post(forSlot(slot)).send(sent), 'forbidden')
    for (const person of [await make.athlete({ club: athlete.club }), await make.coach(athlete.club)]) {
      expectError(await (await app().as(person)).post(forSlot(slot)).send(sent), 'not_found')
    }
    expect(await swapsOf(slot)).toEqual([])
  })

  it('names what is wrong with the request', async () => {
    const { slot, sent, agent, ranking } = await reader()
    expectError(await agent.post(forSlot(slot)).send({ ...sent, exerciseId: 'x' }), 'invalid_request', ['exerciseId'])
    expectError(await agent.post(forSlot(slot)).send({ exerciseId: sent.exerciseId }), 'invalid_request', [
      'fingerprint',
    ])
    expectError(await agent.post(forSlot(slot, '?guidance=x')).send(sent), 'invalid_request', ['guidance'])
    const unlisted = { exerciseId: slot.id, fingerprint: ranking.fingerprint }
    expectError(await agent.post(forSlot(slot)).send(unlisted), 'not_a_swap', ['exerciseId'])
    expect(await swapsOf(slot)).toEqual([])
  })

  it('stores dose, rank, rules and the whole table, and shows on the day', async () => {
    const { athlete, slot, sent, agent, ranking, first } = await reader()
    const { body } = await agent.post(forSlot(slot)).send(sent).expect(201)
    const now = app().clock.now()
    const exercise = { id: first.exercise.id, slug: first.exercise.slug, name: first.exercise.name }
    expect(body).toEqual({
      id: expect.any(String),
      slotId: slot.id,
      exercise,
      dose: first.dose,
      rank: 1,
      ruleSetVersion: ranking.ruleSetVersion,
      takenAt: now.toISOString(),
      undoneAt: null,
    })
    const [row] = await swapsOf(slot)
    expect(row).toMatchObject({
      id: body.id,
      exerciseVersionId: first.exercise.versionId,
      ...first.dose,
      rank: 1,
      fingerprint: ranking.fingerprint,
      ruleSetVersion: ranking.ruleSetVersion,
      takenBy: athlete.id,
      takenAt: now,
      undoneAt: null,
    })
    expect(row?.ranking).toEqual(ranking)
    const day = await agent.get(`/api/athletes/${athlete.id}/today?day=2026-03-02`).expect(200)
    expect(day.body.session.slots[0].swap).toMatchObject({
      id: body.id,
      exercise,
      dose: first.dose,
      can: { undo: true },
    })
    const trail = await app().dataSource.manager.findBy(AuditEntry, { subjectId: athlete.id, action: 'take.swap' })
    expect(trail.map(({ details }) => details)).toEqual([{ swapId: body.id, slotId: slot.id, exerciseId: exercise.id }])
  })

  it('may be done by the coach who was let in, from a filtered table too', async () => {
    const { athlete, slot, first } = await reader()
    const coach = await app().make.coach(athlete.club)
    await app().make.consent(athlete, coach)
    const agent = await app().as(coach)
    const query = `?guidance=${first.exercise.guidance}&maxCoordination=100`
    const { body: ranking } = await agent.get(forSlot(slot, query)).expect(200)
    const sent = { exerciseId: first.exercise.id, fingerprint: ranking.fingerprint }
    expectError(await agent.post(forSlot(slot)).send(sent), 'ranking_changed')
    await agent.post(forSlot(slot, query)).send(sent).expect(201)
    expect((await swapsOf(slot))[0]?.takenBy).toBe(coach.id)
  })

  it('is refused when the table changed since it was read', async () => {
    const { athlete, slot, sent, agent } = await reader()
    await training.soreJoint(athlete, { joint: 'wrist', side: 'left', rating: 3, provocations: ['gripping'] })
    expectError(await agent.post(forSlot(slot)).send(sent), 'ranking_changed')
    expect(await swapsOf(slot)).toEqual([])
  })

  it('is refused while a red flag stands for the joint', async () => {
    const { athlete, slot, sent, agent } = await reader()
    await agent
      .post(`/api/athletes/${athlete.id}/sore-joints`)
      .send(soreReport({ rating: 9 }))
      .expect(201)
    expectError(await agent.post(forSlot(slot)).send(sent), 'red_flag')
    expect(await swapsOf(slot)).toEqual([])
  })

  it('leaves a line of what a coach learns from a refusal, and the athlete’s own leaves none', async () => {
    const { athlete, slot, sent, agent } = await reader()
    const coach = await app().make.coach(athlete.club)
    await app().make.consent(athlete, coach)
    await agent
      .post(`/api/athletes/${athlete.id}/sore-joints`)
      .send(soreReport({ rating: 9 }))
      .expect(201)
    expectError(await agent.post(forSlot(slot)).send(sent), 'red_flag')
    expectError(await (await app().as(coach)).post(forSlot(slot)).send(sent), 'red_flag')
    const trail = await app().dataSource.manager.findBy(AuditEntry, { subjectId: athlete.id, action: 'read.ranking' })
    expect(trail.map(({ actorId }) => actorId)).toEqual([coach.id])
  })

  it('happens once when many ask at once', async () => {
    const { slot, sent, agent } = await reader()
    const answers = await Promise.all(Array.from({ length: 6 }, () => agent.post(forSlot(slot)).send(sent)))
    const statuses = answers.map(({ status, body }) => (status === 201 ? 'taken' : body.error.code)).toSorted()
    expect(statuses).toEqual([...Array.from({ length: 5 }, () => 'swap_already_taken'), 'taken'])
    expect(await swapsOf(slot)).toHaveLength(1)
  })

  it('never stands on a table that a simultaneous report made wrong', async () => {
    for (let round = 0; round < 4; round += 1) {
      const { athlete, slot, sent, agent } = await reader()
      const [taken, reported] = await Promise.all([
        agent.post(forSlot(slot)).send(sent),
        agent.post(`/api/athletes/${athlete.id}/sore-joints`).send(soreReport({ rating: 9 })),
      ])
      expect(reported.status).toBe(201)
      const [swap] = await swapsOf(slot)
      // Whoever came first won: the swap was taken from a table without the red flag, or it was refused.
      if (taken.status === 201) expect(swap?.ranking.redFlags).toEqual([])
      else {
        expectError(taken, 'red_flag')
        expect(swap).toBeUndefined()
      }
    }
  })

  it('keeps a second standing swap out by the database itself', async () => {
    const { slot, sent, agent } = await reader()
    await agent.post(forSlot(slot)).send(sent).expect(201)
    const [swap] = await swapsOf(slot)
    const { id: _id, ...copy } = swap!
    await expect(app().dataSource.manager.insert(Swap, copy as never)).rejects.toThrow(/swaps_one_standing/)
  })
})

describe('POST /api/swaps/:swapId/undo', () => {
  async function taken() {
    const all = await reader()
    const { body } = await all.agent.post(forSlot(all.slot)).send(all.sent).expect(201)
    return { ...all, swapId: body.id as string }
  }

  it('needs a sign-in', async () => {
    const { slot, swapId } = await taken()
    expectError(await app().anonymous().post(undoUrl(swapId)), 'not_signed_in')
    expect((await swapsOf(slot))[0]?.undoneAt).toBeNull()
  })

  it('is refused to the physio, and strangers find no swap', async () => {
    const { athlete, slot, swapId, agent } = await taken()
    const { make } = app()
    const physio = await make.physio(athlete.club)
    await make.consent(athlete, physio)
    expectError(await (await app().as(physio)).post(undoUrl(swapId)), 'forbidden')
    for (const person of [await make.athlete({ club: athlete.club }), await make.coach(athlete.club)]) {
      expectError(await (await app().as(person)).post(undoUrl(swapId)), 'not_found')
    }
    expectError(await agent.post(undoUrl('7')), 'invalid_request', ['swapId'])
    expectError(await agent.post(undoUrl(slot.id)), 'not_found')
    expect((await swapsOf(slot))[0]?.undoneAt).toBeNull()
  })

  it('puts the planned exercise back, and the slot can be swapped again', async () => {
    const { athlete, slot, sent, agent, swapId } = await taken()
    const { body } = await agent.post(undoUrl(swapId)).expect(200)
    expect(body).toMatchObject({ id: swapId, undoneAt: app().clock.now().toISOString() })
    expect((await swapsOf(slot))[0]).toMatchObject({ undoneBy: athlete.id, undoneAt: app().clock.now() })
    expect(await app().dataSource.manager.countBy(AuditEntry, { subjectId: athlete.id, action: 'undo.swap' })).toBe(1)
    await agent.post(forSlot(slot)).send(sent).expect(201)
    expect(await swapsOf(slot)).toHaveLength(2)
  })

  it('happens once, whether asked again or at the same time', async () => {
    const { agent, swapId } = await taken()
    const answers = await Promise.all(Array.from({ length: 4 }, () => agent.post(undoUrl(swapId))))
    expect(answers.map(({ status }) => status).toSorted()).toEqual([200, 409, 409, 409])
    expectError(await agent.post(undoUrl(swapId)), 'conflict')
  })
})
