import { beforeAll, describe, expect, it } from 'vitest'
import { AuditEntry } from '#server/features/audit/entity'
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
const rowsOf = (athlete: { id: string }) =>
  app().dataSource.manager.find(SoreJoint, { where: { athleteId: athlete.id }, order: { reportedAt: 'ASC' } })
const trail = (athlete: { id: string }, action: string) =>
  app().dataSource.manager.countBy(AuditEntry, { subjectId: athlete.id, action })

/** An athlete who let a coach and a physio of their club in. */
async function careTeam() {
  const { make } = app()
  const athlete = await make.athlete()
  const coach = await make.coach(athlete.club)
  const physio = await make.physio(athlete.club)
  await make.consent(athlete, coach)
  await make.consent(athlete, physio)
  return { athlete, coach, physio }
}

describe('POST …/sore-joints', () => {
  it('needs a sign-in', async () => {
    const athlete = await app().make.athlete()
    expectError(await app().anonymous().post(url(athlete)).send(soreReport()), 'not_signed_in')
    expect(await rowsOf(athlete)).toEqual([])
  })

  it('is for the athlete alone: the care team may not, and strangers do not find them', async () => {
    const { athlete, coach, physio } = await careTeam()
    for (const carer of [coach, physio]) {
      expectError(await (await app().as(carer)).post(url(athlete)).send(soreReport()), 'forbidden')
    }
    const stranger = await app().make.athlete()
    expectError(await (await app().as(stranger)).post(url(athlete)).send(soreReport()), 'not_found')
    expect(await rowsOf(athlete)).toEqual([])
  })

  it.each([
    ['a rating of 11', { rating: 11 }, ['rating']],
    ['half a point', { rating: 3.5 }, ['rating']],
    ['no provocation', { provocations: [] }, ['provocations']],
    ['an unknown joint', { joint: 'tail' }, ['joint']],
    ['an elbow without a side', { side: null }, ['side']],
    ['a lower back with a side', { joint: 'lowerBack', side: 'left' }, ['side']],
    ['an unanswered red-flag question', { redFlags: { injury: false } }, undefined],
    ['a day that does not exist', { day: '2026-02-30' }, ['day']],
    ['a day to come', { day: '2026-03-09' }, ['day']],
    ['a note that is too long', { note: 'x'.repeat(2001) }, ['note']],
  ])('refuses %s and writes nothing', async (_what, change, fields) => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    const missing = ['nerve', 'swollenOrFever', 'nightPain', 'severePain', 'chestOrBreath'].map(
      (flag) => `redFlags.${flag}`,
    )
    expectError(
      await agent.post(url(athlete)).send({ ...soreReport(), ...change }),
      'invalid_request',
      fields ?? missing,
    )
    expect(await rowsOf(athlete)).toEqual([])
  })

  it('stores the report as open and answers with it', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    const sent = soreReport({ note: '  inside of the elbow  ', provocations: ['bending', 'bending', 'gripping'] })
    const { body } = await agent.post(url(athlete)).send(sent).expect(201)
    const now = app().clock.now()
    expect(body).toEqual({
      id: expect.any(String),
      athleteId: athlete.id,
      joint: 'elbow',
      side: 'right',
      rating: 4,
      provocations: ['bending', 'gripping'],
      redFlags: [],
      note: 'inside of the elbow',
      day: sent.day,
      state: 'open',
      reportedAt: now.toISOString(),
      closedAt: null,
      clearedBy: null,
      clearedAt: null,
      can: { close: true, clear: false },
    })
    const rows = await rowsOf(athlete)
    expect(rows).toHaveLength(1)
    expect(rows[0]).toMatchObject({ id: body.id, rating: 4, state: 'open', redFlags: [], reportedAt: now })
    expect(await trail(athlete, 'report.soreJoint')).toBe(1)
  })

  it('closes the older report of the same joint and side, and only that one', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    const older = await training.soreJoint(athlete)
    const left = await training.soreJoint(athlete, { side: 'left' })
    await agent
      .post(url(athlete))
      .send(soreReport({ rating: 2 }))
      .expect(201)
    const { body } = await agent.get(url(athlete)).expect(200)
    expect(body.items.map(({ rating, side }: { rating: number; side: string }) => [side, rating]).toSorted()).toEqual([
      ['left', 4],
      ['right', 2],
    ])
    const states = new Map((await rowsOf(athlete)).map(({ id, state }) => [id, state]))
    expect([states.get(older.id), states.get(left.id)]).toEqual(['closed', 'open'])
  })

  it('lets exactly one of many simultaneous reports of a joint stand', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    const ratings = [1, 2, 3, 4, 5, 6]
    const answers = await Promise.all(ratings.map((rating) => agent.post(url(athlete)).send(soreReport({ rating }))))
    expect(answers.map(({ status }) => status)).toEqual(ratings.map(() => 201))
    const rows = await rowsOf(athlete)
    expect(rows).toHaveLength(ratings.length)
    expect(rows.filter(({ state }) => state === 'open')).toHaveLength(1)
  })
})

describe('GET …/sore-joints', () => {
  it('needs a sign-in', async () => {
    expectError(
      await app()
        .anonymous()
        .get(url(await app().make.athlete())),
      'not_signed_in',
    )
  })

  it('refuses an unknown state, a limit out of bounds and a foreign cursor', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    expectError(await agent.get(url(athlete, '?state=gone')), 'invalid_request', ['state'])
    expectError(await agent.get(url(athlete, '?limit=0')), 'invalid_request', ['limit'])
    for (const cursor of ['nonsense', Buffer.from('["x","y"]').toString('base64url'), 'bnVsbA']) {
      expectError(await agent.get(url(athlete, `?cursor=${cursor}`)), 'invalid_request', ['cursor'])
    }
  })

  it('pages from the newest to the oldest without losing or repeating a report', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    const reportedAt = app().clock.now()
    const made = []
    for (let index = 0; index < 5; index += 1) {
      made.push(await training.soreJoint(athlete, { state: 'closed', closedAt: reportedAt, reportedAt }))
    }
    const seen: string[] = []
    let cursor: string | null = ''
    while (cursor !== null) {
      const next: string = cursor === '' ? '' : `&cursor=${cursor}`
      const { body } = await agent.get(url(athlete, `?state=all&limit=2${next}`)).expect(200)
      seen.push(...body.items.map(({ id }: { id: string }) => id))
      cursor = body.nextCursor
    }
    expect(seen.toSorted()).toEqual(made.map(({ id }) => id).toSorted())
  })

  it('shows standing reports unless asked for others', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    const open = await training.soreJoint(athlete)
    const flagged = await training.redFlag(athlete, { joint: 'knee', side: 'left' })
    const closed = await training.soreJoint(athlete, { state: 'closed', closedAt: app().clock.now() })
    const ids = async (query: string) => {
      const { body } = await agent.get(url(athlete, query)).expect(200)
      return body.items.map(({ id }: { id: string }) => id).toSorted()
    }
    expect(await ids('')).toEqual([open.id, flagged.id].toSorted())
    expect(await ids('?state=closed')).toEqual([closed.id])
    expect(await ids('?state=redFlag')).toEqual([flagged.id])
    expect(await ids('?state=all')).toEqual([open.id, flagged.id, closed.id].toSorted())
  })

  it('is open to the care team, and every such read is one line of the trail', async () => {
    const { athlete, coach, physio } = await careTeam()
    await training.redFlag(athlete)
    await training.soreJoint(athlete, { side: 'left' })
    for (const [carer, clear] of [
      [coach, false],
      [physio, true],
    ] as const) {
      const { body } = await (await app().as(carer)).get(url(athlete)).expect(200)
      const can = body.items.map((item: { state: string; can: unknown }) => [item.state, item.can])
      expect(can).toContainEqual(['redFlag', { close: false, clear }])
      expect(can).toContainEqual(['open', { close: false, clear: false }])
    }
    expect(await trail(athlete, 'read.soreJoints')).toBe(2)
    await (await app().as(athlete)).get(url(athlete)).expect(200)
    expect(await trail(athlete, 'read.soreJoints')).toBe(2)
  })
})

describe('POST …/closure', () => {
  it('needs a sign-in', async () => {
    const athlete = await app().make.athlete()
    const { id } = await training.soreJoint(athlete)
    expectError(
      await app()
        .anonymous()
        .post(url(athlete, `/${id}/closure`)),
      'not_signed_in',
    )
  })

  it('is for the athlete alone, and finds only their own reports', async () => {
    const { athlete, coach, physio } = await careTeam()
    const { id } = await training.soreJoint(athlete)
    for (const carer of [coach, physio]) {
      expectError(await (await app().as(carer)).post(url(athlete, `/${id}/closure`)), 'forbidden')
    }
    const other = await app().make.athlete({ club: athlete.club })
    expectError(await (await app().as(other)).post(url(athlete, `/${id}/closure`)), 'not_found')
    expectError(await (await app().as(other)).post(url(other, `/${id}/closure`)), 'not_found')
    expectError(await (await app().as(athlete)).post(url(athlete, '/7/closure')), 'invalid_request', ['soreJointId'])
    expect((await rowsOf(athlete))[0]?.state).toBe('open')
  })

  it('closes a report once', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    const { id } = await training.soreJoint(athlete)
    const { body } = await agent.post(url(athlete, `/${id}/closure`)).expect(200)
    expect(body).toMatchObject({ id, state: 'closed', closedAt: app().clock.now().toISOString() })
    expect((await rowsOf(athlete))[0]).toMatchObject({ state: 'closed', closedAt: app().clock.now() })
    expectError(await agent.post(url(athlete, `/${id}/closure`)), 'already_closed')
    expect(await trail(athlete, 'close.soreJoint')).toBe(1)
  })
})
