import { beforeAll, describe, expect, it } from 'vitest'
import { exercise as exerciseSchema, preview as previewSchema } from '#shared/contract/exercise'
import { AuditEntry } from '#server/features/audit/entity'
import { expectError } from '#tests/support/expect-error'
import { TEST_SLUGS, trainingFactories, type TrainingFactories } from '#tests/support/factories/training'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app())
})

const signedIn = async () => app().as(await app().make.athlete())
const slugsOf = (body: { items: Array<{ slug: string }> }) => body.items.map(({ slug }) => slug)
const byName = () => training.documents.toSorted((a, b) => (a.name < b.name ? -1 : 1)).map(({ slug }) => slug)

describe('GET /api/exercises', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().get('/api/exercises'), 'not_signed_in')
  })

  it('names what is wrong with the query', async () => {
    const agent = await signedIn()
    expectError(await agent.get('/api/exercises?limit=1000'), 'invalid_request', ['limit'])
    expectError(await agent.get('/api/exercises?cursor=abc'), 'invalid_request', ['cursor'])
    expectError(await agent.get(`/api/exercises?search=${'x'.repeat(81)}`), 'invalid_request', ['search'])
    expectError(await agent.get('/api/exercises?ids=1,2'), 'invalid_request', ['ids.0', 'ids.1'])
  })

  it('lists what is published by name, page by page', async () => {
    const agent = await signedIn()
    const { body } = await agent.get('/api/exercises').expect(200)
    expect(slugsOf(body)).toEqual(byName())
    expect(body.nextCursor).toBeNull()
    const first = await agent.get('/api/exercises?limit=3').expect(200)
    const second = await agent.get(`/api/exercises?limit=3&cursor=${first.body.nextCursor}`).expect(200)
    expect([...slugsOf(first.body), ...slugsOf(second.body)]).toEqual(byName().slice(0, 6))
  })

  it('finds by a part of the name, in which % and _ are only letters', async () => {
    const agent = await signedIn()
    const found = await agent.get('/api/exercises?search=PULLDOWN').expect(200)
    expect(slugsOf(found.body).toSorted()).toEqual(['lat-pulldown-neutral', 'lat-pulldown-overhand'])
    for (const letter of ['%25', '_', '%5C']) {
      expect((await agent.get(`/api/exercises?search=${letter}`).expect(200)).body.items).toEqual([])
    }
  })

  it('picks by id and leaves out what it does not know', async () => {
    const agent = await signedIn()
    const ids = [training.exerciseId('chin-up'), '0199a0de-0000-7000-8000-000000000000'].join(',')
    expect(slugsOf((await agent.get(`/api/exercises?ids=${ids}`).expect(200)).body)).toEqual(['chin-up'])
  })
})

describe('GET /api/exercises/:slug', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().get('/api/exercises/chin-up'), 'not_signed_in')
  })

  it('refuses what is no slug and does not find what is not published', async () => {
    const agent = await signedIn()
    expectError(await agent.get('/api/exercises/Chin%20up'), 'invalid_request', ['slug'])
    expectError(await agent.get('/api/exercises/chin-up-on-the-moon'), 'not_found')
  })

  it('shows the document with what mechanics derive from it', async () => {
    const { body } = await (await signedIn()).get('/api/exercises/pull-up-overhand').expect(200)
    const document = training.document('pull-up-overhand')
    expect(exerciseSchema.parse(body)).toMatchObject({
      id: training.exerciseId('pull-up-overhand'),
      version: 1,
      slug: document.slug,
      name: document.name,
      equipment: document.equipment,
      setup: document.setup,
      mechanics: document.mechanics,
    })
    expect(body.muscles.length).toBeGreaterThan(0)
    const drives = body.muscles.map(({ drive }: { drive: number }) => drive)
    expect(drives).toEqual(drives.toSorted((a: number, b: number) => b - a))
    expect(body.muscles.map(({ muscle }: { muscle: string }) => muscle)).toContain('latissimus')
  })
})

describe('POST /api/exercises/preview', () => {
  const body = { sex: 'female', bodyMass: 62, stature: 1.68 }
  const send = async (sent: object, agent?: Awaited<ReturnType<typeof signedIn>>) =>
    (agent ?? (await signedIn())).post('/api/exercises/preview').send(sent)

  it('needs a sign-in', async () => {
    const answer = await app().anonymous().post('/api/exercises/preview').send({})
    expectError(answer, 'not_signed_in')
  })

  it('wants one exercise and one body, each given one way', async () => {
    const agent = await signedIn()
    const { mechanics } = training.document('chin-up')
    const exerciseId = training.exerciseId('chin-up')
    expectError(await send({ load: 0, body }, agent), 'invalid_request', ['exerciseId'])
    expectError(await send({ load: 0, body, exerciseId, mechanics }, agent), 'invalid_request', ['exerciseId'])
    expectError(await send({ load: 0, exerciseId }, agent), 'invalid_request', ['athleteId'])
    expectError(await send({ load: 900, exerciseId, body }, agent), 'invalid_request', ['load'])
    expectError(await send({ load: 0, exerciseId, body: { ...body, stature: 168 } }, agent), 'invalid_request', [
      'body.stature',
    ])
    expectError(await send({ load: 0, body, exerciseId: '0199a0de-0000-7000-8000-000000000000' }, agent), 'not_found')
  })

  it('names the field of a geometry that cannot be held', async () => {
    const { mechanics } = training.document('chin-up')
    const [frame, ...rest] = mechanics.frames
    const unreachable = { ...mechanics, frames: [{ ...frame, arms: { hand: [-2, 2] } }, ...rest] }
    const answer = await send({ load: 0, body, mechanics: unreachable })
    expect(answer.body.error.code).toBe('mechanics_invalid')
    expect(answer.status).toBe(422)
    expect(answer.body.error.fields[0].path).toMatch(/^frames\.0/)
    expectError(await send({ load: 0, body, mechanics: { ...mechanics, frames: [frame] } }), 'invalid_request', [
      'mechanics.frames',
    ])
  })

  it('gives the same numbers for a published exercise and for its own mechanics', async () => {
    const agent = await signedIn()
    const published = await send({ load: 5, body, exerciseId: training.exerciseId('pull-up-overhand') }, agent)
    expect(published.status).toBe(200)
    const adHoc = await send({ load: 5, body, mechanics: training.document('pull-up-overhand').mechanics }, agent)
    expect(adHoc.body.frames).toEqual(published.body.frames)
    expect(adHoc.body.oneRepMax).toBe(published.body.oneRepMax)
    const { frames, estimated } = previewSchema.parse(published.body)
    expect(frames).toHaveLength(training.document('pull-up-overhand').mechanics.frames.length)
    expect(estimated).toBe(true)
    for (const { moment, strength, demand } of frames.flatMap(({ actions }) => actions)) {
      expect(demand).toBeCloseTo(moment / strength, 9)
    }
  })

  it('uses an athlete’s own body and caps, for the care team too, and strangers do not find them', async () => {
    const { make, dataSource } = app()
    const athlete = await make.athlete()
    await training.soreJoint(athlete)
    const sent = { load: 0, exerciseId: training.exerciseId('chin-up'), athleteId: athlete.id }
    const coach = await make.coach(athlete.club)
    expectError(await send(sent, await app().as(coach)), 'not_found')
    const own = await send(sent, await app().as(athlete))
    expect(own.status).toBe(200)
    const elbow = own.body.frames[0].joints.find(
      ({ joint, side }: { joint: string; side: string | null }) => joint === 'elbow' && side === 'right',
    )
    expect(elbow.cap).toBeLessThan(1)
    await make.consent(athlete, coach)
    expect((await send(sent, await app().as(coach))).body).toEqual(own.body)
    const read = { actorId: coach.id, subjectId: athlete.id, action: 'read.preview' }
    expect(await dataSource.manager.countBy(AuditEntry, read)).toBe(1)
  })

  it('asks for the body profile of an athlete who has none', async () => {
    const athlete = await app().make.athlete({ profile: null })
    const sent = { load: 0, exerciseId: training.exerciseId('chin-up'), athleteId: athlete.id }
    expectError(await send(sent, await app().as(athlete)), 'profile_incomplete')
  })

  it('finds every test exercise', () => {
    expect(training.documents.map(({ slug }) => slug).toSorted()).toEqual([...TEST_SLUGS].toSorted())
  })
})
