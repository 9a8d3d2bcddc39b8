import { beforeAll, describe, expect, it } from 'vitest'
import { RED_FLAGS } from '#shared/contract/sore-joint'
import { SoreJoint } from '#server/features/sore-joints/entity'
import { expectError } from '#tests/support/expect-error'
import { trainingFactories, type TrainingFactories } from '#tests/support/factories/training'
import { soreReport } from '#tests/support/samples'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app(), [])
})

const url = (athlete: { id: string }, rest = '') => `/api/athletes/${athlete.id}/sore-joints${rest}`
const answers = soreReport().redFlags
const one = (id: string) => app().dataSource.manager.findOneByOrFail(SoreJoint, { id })

async function careTeam() {
  const { make } = app()
  const athlete = await make.athlete({ name: 'Test Athlete Nine' })
  const coach = await make.coach(athlete.club)
  const physio = await make.physio(athlete.club)
  await make.consent(athlete, coach)
  await make.consent(athlete, physio)
  return { athlete, coach, physio, agent: await app().as(athlete) }
}

describe('a red flag', () => {
  it.each(RED_FLAGS)('follows from a yes to %s alone', async (flag) => {
    const { athlete, agent } = await careTeam()
    const sent = soreReport({ redFlags: { ...answers, [flag]: true } })
    const { body } = await agent.post(url(athlete)).send(sent).expect(201)
    expect(body).toMatchObject({ state: 'redFlag', redFlags: [flag], rating: 4, can: { close: false, clear: false } })
    expect(await one(body.id)).toMatchObject({ state: 'redFlag', redFlags: [flag] })
  })

  it('follows from a rating of 8 and not from one of 7', async () => {
    const { athlete, agent } = await careTeam()
    const seven = await agent
      .post(url(athlete))
      .send(soreReport({ rating: 7 }))
      .expect(201)
    expect(seven.body).toMatchObject({ state: 'open', redFlags: [] })
    const eight = await agent
      .post(url(athlete))
      .send(soreReport({ rating: 8 }))
      .expect(201)
    expect(eight.body).toMatchObject({ state: 'redFlag', redFlags: ['severePain'] })
  })

  it('is told to everybody who was let in, in words that give nothing away', async () => {
    const { athlete, coach, physio, agent } = await careTeam()
    const { make, mailBox, dependencies } = app()
    const shutOut = await make.coach(athlete.club)
    await make.consent(athlete, shutOut, { revokedAt: app().clock.now() })
    await make.physio(athlete.club)
    mailBox.letters.length = 0
    await agent
      .post(url(athlete))
      .send(soreReport({ rating: 9, note: 'a loud pop' }))
      .expect(201)
    await dependencies.background.settled()
    expect(mailBox.letters.map(({ to }) => to).toSorted()).toEqual([coach.email, physio.email].toSorted())
    for (const { subject, text, html } of mailBox.letters) {
      expect(text).toContain('An athlete you look after has reported something that needs your attention.')
      expect(`${subject} ${text} ${html}`).not.toMatch(/elbow|right|pain|\b9\b|pop|red flag|Nine/i)
    }
  })

  it('is not told for an ordinary report', async () => {
    const { athlete, agent } = await careTeam()
    const { mailBox, dependencies } = app()
    mailBox.letters.length = 0
    await agent.post(url(athlete)).send(soreReport()).expect(201)
    await dependencies.background.settled()
    expect(mailBox.letters).toEqual([])
  })

  it('leaves no health data in the log', async () => {
    const { athlete, agent } = await careTeam()
    await agent
      .post(url(athlete))
      .send(soreReport({ rating: 9, note: 'a word to look for' }))
      .expect(201)
    await app().dependencies.background.settled()
    expect(JSON.stringify(app().logs)).not.toMatch(/a word to look for|severePain|"rating"|elbow/)
  })

  it('stays when the athlete reports the same joint anew, with the newer rating', async () => {
    const { athlete, agent } = await careTeam()
    const first = await agent
      .post(url(athlete))
      .send(soreReport({ rating: 8 }))
      .expect(201)
    const { body } = await agent
      .post(url(athlete))
      .send(soreReport({ rating: 1 }))
      .expect(201)
    expect(body).toMatchObject({ state: 'redFlag', rating: 1, redFlags: ['severePain'] })
    expect((await one(first.body.id)).state).toBe('closed')
    const listed = await agent.get(url(athlete)).expect(200)
    expect(listed.body.items).toHaveLength(1)
  })

  it('stays however a mild report and a severe one cross', async () => {
    for (let round = 0; round < 5; round += 1) {
      const { athlete, agent } = await careTeam()
      await Promise.all([8, 1, 2].map((rating) => agent.post(url(athlete)).send(soreReport({ rating })).expect(201)))
      const standing = (await agent.get(url(athlete)).expect(200)).body.items
      const severeWasLast = standing[0].rating === 8
      const rows = await app().dataSource.manager.findBy(SoreJoint, { athleteId: athlete.id })
      expect(standing).toHaveLength(1)
      expect(standing[0].state).toBe('redFlag')
      expect(severeWasLast || rows.length === 3).toBe(true)
    }
  })

  it('cannot be closed by the athlete', async () => {
    const { athlete, agent } = await careTeam()
    const { id } = await training.redFlag(athlete)
    expectError(await agent.post(url(athlete, `/${id}/closure`)), 'red_flag')
    expect((await one(id)).state).toBe('redFlag')
  })
})

describe('POST …/clearance', () => {
  const note = 'Examined: full strength and range.'

  it('needs a sign-in', async () => {
    const { athlete } = await careTeam()
    const { id } = await training.redFlag(athlete)
    expectError(
      await app()
        .anonymous()
        .post(url(athlete, `/${id}/clearance`))
        .send({ note }),
      'not_signed_in',
    )
  })

  it('is refused to the athlete and the coach, and strangers find nothing', async () => {
    const { athlete, coach } = await careTeam()
    const { make } = app()
    const { id } = await training.redFlag(athlete)
    for (const person of [athlete, coach]) {
      expectError(await (await app().as(person)).post(url(athlete, `/${id}/clearance`)).send({ note }), 'forbidden')
    }
    const revoked = await make.physio(athlete.club)
    await make.consent(athlete, revoked, { revokedAt: app().clock.now() })
    const elsewhere = await make.physio()
    await make.consent(athlete, elsewhere)
    for (const person of [revoked, elsewhere, await make.physio(athlete.club), await make.admin(athlete.club)]) {
      expectError(await (await app().as(person)).post(url(athlete, `/${id}/clearance`)).send({ note }), 'not_found')
    }
    expect((await one(id)).state).toBe('redFlag')
  })

  it('wants a note', async () => {
    const { athlete, physio } = await careTeam()
    const { id } = await training.redFlag(athlete)
    const agent = await app().as(physio)
    expectError(await agent.post(url(athlete, `/${id}/clearance`)).send({ note: '  ' }), 'invalid_request', ['note'])
    expectError(await agent.post(url(athlete, `/${id}/clearance`)).send({}), 'invalid_request', ['note'])
  })

  it('opens the report with the rating it has, and names who cleared it', async () => {
    const { athlete, physio, agent } = await careTeam()
    const { id } = await training.redFlag(athlete, { rating: 6 })
    const { body } = await (
      await app().as(physio)
    )
      .post(url(athlete, `/${id}/clearance`))
      .send({ note })
      .expect(200)
    const now = app().clock.now()
    expect(body).toMatchObject({
      id,
      state: 'open',
      rating: 6,
      clearedBy: physio.name,
      clearedAt: now.toISOString(),
      can: { close: false, clear: false },
    })
    expect(await one(id)).toMatchObject({ state: 'open', clearedBy: physio.id, clearedAt: now, clearanceNote: note })
    const again = await (await app().as(physio)).post(url(athlete, `/${id}/clearance`)).send({ note })
    expectError(again, 'conflict')
    await agent.post(url(athlete, `/${id}/closure`)).expect(200)
  })

  it('ends the flag for reports that follow', async () => {
    const { athlete, physio, agent } = await careTeam()
    const { id } = await training.redFlag(athlete)
    await (
      await app().as(physio)
    )
      .post(url(athlete, `/${id}/clearance`))
      .send({ note })
      .expect(200)
    const { body } = await agent
      .post(url(athlete))
      .send(soreReport({ rating: 2 }))
      .expect(201)
    expect(body).toMatchObject({ state: 'open', redFlags: [] })
  })
})
