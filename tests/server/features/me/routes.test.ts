import { describe, expect, it } from 'vitest'
import { AuditEntry } from '#server/features/audit/entity'
import { AthleteProfile, Membership, User } from '#server/features/people/entity'
import { Place } from '#server/features/places/entity'
import { expectError } from '#tests/support/expect-error'
import { testApp } from '#tests/support/test-app'

const app = testApp()
const body = { sex: 'female', bodyMass: 61.5, stature: 1.68, birthDate: '1999-12-31' } as const

const auditOf = (subjectId: string) =>
  app().dataSource.manager.find(AuditEntry, { where: { subjectId }, order: { at: 'ASC', id: 'ASC' } })

describe('GET /api/me', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().get('/api/me'), 'not_signed_in')
  })

  it('shows an athlete their memberships and body', async () => {
    const athlete = await app().make.athlete({ profile: body })
    const response = await (await app().as(athlete)).get('/api/me').expect(200)
    expect(response.body).toEqual({
      id: athlete.id,
      name: athlete.name,
      email: athlete.email,
      memberships: [{ clubId: athlete.club.id, clubName: athlete.club.name, role: 'athlete' }],
      units: 'metric',
      body,
      defaultPlaceId: null,
      demo: false,
    })
    expect(response.headers['cache-control']).toBe('no-store')
  })

  it('has no body for an athlete who has not filled it in, nor for one who is no athlete any more', async () => {
    const { make, dataSource } = app()
    const fresh = await make.athlete({ profile: null })
    expect((await (await app().as(fresh)).get('/api/me')).body.body).toBeNull()
    const former = await make.athlete()
    await dataSource.manager.update(Membership, { userId: former.id }, { role: 'coach' })
    expect((await (await app().as(former)).get('/api/me')).body.body).toBeNull()
  })
})

describe('PATCH /api/me', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().patch('/api/me').send({ units: 'imperial' }), 'not_signed_in')
  })

  it('changes name and units, trims the name, and leaves a line in the trail', async () => {
    const coach = await app().make.coach()
    const response = await (
      await app().as(coach)
    )
      .patch('/api/me')
      .send({ name: '  Nia  ', units: 'imperial' })
      .expect(200)
    expect(response.body).toMatchObject({ name: 'Nia', units: 'imperial' })
    const user = await app().dataSource.manager.findOneByOrFail(User, { id: coach.id })
    expect(user).toMatchObject({ name: 'Nia', units: 'imperial' })
    expect((await auditOf(coach.id)).map(({ action, details }) => ({ action, details }))).toEqual([
      { action: 'change.person', details: { fields: 'name, units' } },
    ])
  })

  it('lets an athlete fill in and change their body, keeps skill and strength, and trails it without values', async () => {
    const athlete = await app().make.athlete({ profile: null })
    const agent = await app().as(athlete)
    await agent.patch('/api/me').send({ body }).expect(200)
    const { manager } = app().dataSource
    await manager.update(
      AthleteProfile,
      { userId: athlete.id },
      { skill: 'advanced', strengthFactors: { elbowFlexion: 1.2 } },
    )
    const response = await agent
      .patch('/api/me')
      .send({ body: { ...body, bodyMass: 62 } })
      .expect(200)
    expect(response.body.body).toEqual({ ...body, bodyMass: 62 })
    expect(await manager.findOneByOrFail(AthleteProfile, { userId: athlete.id })).toMatchObject({
      bodyMass: 62,
      skill: 'advanced',
      strengthFactors: { elbowFlexion: 1.2 },
    })
    const trail = await auditOf(athlete.id)
    expect(trail.map(({ action, details }) => ({ action, details }))).toEqual([
      { action: 'change.bodyProfile', details: {} },
      { action: 'change.bodyProfile', details: {} },
    ])
  })

  it('refuses a body to people who are not athletes, and then changes nothing else either', async () => {
    const coach = await app().make.coach()
    expectError(await (await app().as(coach)).patch('/api/me').send({ name: 'New', body }), 'forbidden')
    expect((await app().dataSource.manager.findOneByOrFail(User, { id: coach.id })).name).toBe(coach.name)
    expect(await app().dataSource.manager.countBy(AthleteProfile, { userId: coach.id })).toBe(0)
  })

  it('takes a place of one’s own club and no other, and writes nothing when refusing', async () => {
    const { make, dataSource } = app()
    const athlete = await make.athlete()
    const elsewhere = await make.club()
    const [own, foreign] = [
      await dataSource.manager.save(Place, { clubId: athlete.club.id, name: 'Yard' }),
      await dataSource.manager.save(Place, { clubId: elsewhere.id, name: 'Hall' }),
    ]
    const agent = await app().as(athlete)
    const response = await agent.patch('/api/me').send({ defaultPlaceId: own.id }).expect(200)
    expect(response.body.defaultPlaceId).toBe(own.id)
    expectError(await agent.patch('/api/me').send({ name: 'New', defaultPlaceId: foreign.id }), 'invalid_request', [
      'defaultPlaceId',
    ])
    expect(await dataSource.manager.findOneByOrFail(User, { id: athlete.id })).toMatchObject({
      name: athlete.name,
      defaultPlaceId: own.id,
    })
  })

  it.each([
    [{}, ['']],
    [{ name: '' }, ['name']],
    [{ name: '   ' }, ['name']],
    [{ name: 'x'.repeat(121) }, ['name']],
    [{ units: 'stones' }, ['units']],
    [{ body: { ...body, bodyMass: 24.9 } }, ['body.bodyMass']],
    [{ body: { ...body, stature: 178 } }, ['body.stature']],
    [{ body: { ...body, birthDate: '1999-02-30' } }, ['body.birthDate']],
    [{ body: { ...body, birthDate: '2999-01-01' } }, ['body.birthDate']],
    [{ body: { ...body, birthDate: '0099-01-01' } }, ['body.birthDate']],
    [{ body: { sex: 'female' } }, ['body.bodyMass', 'body.stature', 'body.birthDate']],
    [{ defaultPlaceId: 'yard' }, ['defaultPlaceId']],
    [{ defaultPlaceId: null }, ['defaultPlaceId']],
    [{ name: 'a\u0000b' }, ['name']],
    [{ name: 'half \ud800 pair' }, ['name']],
    [[], ['']],
    ['text', ['']],
    [null, ['']],
  ])('refuses %j', async (change, fields) => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    const response = await agent.patch('/api/me').set('Content-Type', 'application/json').send(JSON.stringify(change))
    expectError(response, 'invalid_request', fields)
    expect((await app().dataSource.manager.findOneByOrFail(User, { id: athlete.id })).name).toBe(athlete.name)
    expect(await auditOf(athlete.id)).toEqual([])
  })

  it('changes nobody’s role, address or password, whatever is sent', async () => {
    const athlete = await app().make.athlete()
    const agent = await app().as(athlete)
    await agent
      .patch('/api/me')
      .send({ name: 'N', email: 'x@example.test', passwordHash: 'x', memberships: [] })
      .expect(200)
    const user = await app().dataSource.manager.findOneByOrFail(User, { id: athlete.id })
    expect(user).toMatchObject({ name: 'N', email: athlete.email, passwordHash: athlete.passwordHash })
  })
})
