import { describe, expect, it } from 'vitest'
import { AuditEntry } from '#server/features/audit/entity'
import { requireAthlete } from '#server/features/people/access'
import { Consent, Membership } from '#server/features/people/entity'
import { expectError } from '#tests/support/expect-error'
import { testApp } from '#tests/support/test-app'

const app = testApp()

/** An athlete with a coach and a physio in the same club, and a coach elsewhere. */
async function squad() {
  const { make } = app()
  const athlete = await make.athlete()
  return {
    athlete,
    coach: await make.coach(athlete.club, { name: 'A Coach' }),
    physio: await make.physio(athlete.club, { name: 'B Physio' }),
    stranger: await make.coach(),
    agent: await app().as(athlete),
  }
}
const consent = (userId: string) => `/api/me/care-team/${userId}`

/** Whether this person gets past the one gate to the athlete's data. */
const mayRead = (athleteId: string, carer: { id: string }) =>
  requireAthlete(app().dataSource.manager, { userId: carer.id, name: '', memberships: [] }, athleteId).then(
    () => true,
    () => false,
  )

describe('GET /api/me/care-team', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().get('/api/me/care-team'), 'not_signed_in')
  })

  it('is for athletes', async () => {
    expectError(await (await app().as(await app().make.coach())).get('/api/me/care-team'), 'forbidden')
  })

  it('lists coaches and physios of the athlete’s own clubs, each once, with the consent that stands', async () => {
    const { athlete, coach, physio, agent } = await squad()
    const { make, dataSource, clock } = app()
    await dataSource.manager.save(Membership, { userId: coach.id, clubId: athlete.club.id, role: 'physio' })
    await make.admin(athlete.club)
    await make.athlete({ club: athlete.club })
    await make.consent(athlete, physio)
    await make.consent(await make.athlete({ club: athlete.club }), coach)
    const { body } = await agent.get('/api/me/care-team').expect(200)
    const clubName = athlete.club.name
    expect(body).toEqual({
      items: [
        { userId: coach.id, name: 'A Coach', role: 'physio', clubName, consentSince: null },
        { userId: physio.id, name: 'B Physio', role: 'physio', clubName, consentSince: clock.now().toISOString() },
      ],
      nextCursor: null,
    })
  })
})

describe('PUT /api/me/care-team/:userId', () => {
  it('needs a sign-in', async () => {
    const { coach } = await squad()
    expectError(await app().anonymous().put(consent(coach.id)).send({ letIn: true }), 'not_signed_in')
  })

  it('is for athletes', async () => {
    const { coach, physio } = await squad()
    expectError(await (await app().as(coach)).put(consent(physio.id)).send({ letIn: true }), 'forbidden')
  })

  it('lets a coach in and shuts them out at once, and both are in the trail', async () => {
    const { athlete, coach, agent } = await squad()
    expect(await mayRead(athlete.id, coach)).toBe(false)
    const granted = await agent.put(consent(coach.id)).send({ letIn: true }).expect(200)
    expect(granted.body).toMatchObject({ userId: coach.id, consentSince: app().clock.now().toISOString() })
    expect(await mayRead(athlete.id, coach)).toBe(true)
    const revoked = await agent.put(consent(coach.id)).send({ letIn: false }).expect(200)
    expect(revoked.body.consentSince).toBeNull()
    expect(await mayRead(athlete.id, coach)).toBe(false)
    const trail = await app().dataSource.manager.find(AuditEntry, {
      where: { subjectId: athlete.id },
      order: { at: 'ASC' },
    })
    expect(trail.map(({ action, details }) => ({ action, details }))).toEqual([
      { action: 'grant.consent', details: { carerId: coach.id } },
      { action: 'revoke.consent', details: { carerId: coach.id } },
    ])
  })

  it('changes nothing when said twice, also at the same moment', async () => {
    const { athlete, physio, agent } = await squad()
    const say = (letIn: boolean) => agent.put(consent(physio.id)).send({ letIn })
    const answers = await Promise.all([say(true), say(true)])
    expect(answers.map(({ status }) => status)).toEqual([200, 200])
    await say(false).expect(200)
    await say(false).expect(200)
    const { manager } = app().dataSource
    expect(await manager.countBy(Consent, { athleteId: athlete.id })).toBe(1)
    expect(await manager.countBy(AuditEntry, { subjectId: athlete.id })).toBe(2)
  })

  it('keeps ended consents as history', async () => {
    const { athlete, physio, agent } = await squad()
    for (const letIn of [true, false, true]) await agent.put(consent(physio.id)).send({ letIn }).expect(200)
    const rows = await app().dataSource.manager.findBy(Consent, { athleteId: athlete.id })
    expect(rows.map(({ revokedAt }) => revokedAt === null).toSorted()).toEqual([false, true])
  })

  it('finds nobody outside the athlete’s clubs, no fellow athlete and not oneself', async () => {
    const { athlete, stranger, agent } = await squad()
    const fellow = await app().make.athlete({ club: athlete.club })
    for (const person of [stranger, fellow, athlete]) {
      expectError(await agent.put(consent(person.id)).send({ letIn: true }), 'not_found')
    }
    expect(await app().dataSource.manager.countBy(Consent, { athleteId: athlete.id })).toBe(0)
  })

  it.each([
    ['not-an-id', { letIn: true }, ['userId']],
    ['0', { letIn: true }, ['userId']],
    ['%00', { letIn: true }, ['userId']],
    [null, {}, ['letIn']],
    [null, { letIn: 'yes' }, ['letIn']],
  ])('refuses %s with %j', async (userId, body, fields) => {
    const { coach, agent } = await squad()
    expectError(await agent.put(consent(userId ?? coach.id)).send(body), 'invalid_request', fields)
  })
})

describe('the gate to an athlete’s data', () => {
  it('closes when the coach or the athlete leaves the club, though the consent was not revoked', async () => {
    const { athlete, coach } = await squad()
    await app().make.consent(athlete, coach)
    expect(await mayRead(athlete.id, coach)).toBe(true)
    await app().dataSource.manager.delete(Membership, { userId: coach.id })
    expect(await mayRead(athlete.id, coach)).toBe(false)
  })

  it('stays closed to an admin, to fellow athletes and to a coach of another club', async () => {
    const { athlete, stranger } = await squad()
    const { make } = app()
    const admin = await make.admin(athlete.club)
    for (const person of [admin, stranger, await make.athlete({ club: athlete.club })]) {
      await make.consent(athlete, person)
      expect(await mayRead(athlete.id, person)).toBe(false)
    }
  })

  it('is open to the athlete, who is found only while they are an athlete', async () => {
    const { athlete, coach } = await squad()
    expect(await mayRead(athlete.id, athlete)).toBe(true)
    expect(await mayRead(coach.id, coach)).toBe(false)
  })
})
