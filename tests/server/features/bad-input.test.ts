import fc from 'fast-check'
import { beforeAll, describe, expect, it } from 'vitest'
import { errorBody } from '#shared/contract/common'
import { trainingFactories, type TrainingFactories } from '#tests/support/factories/training'
import { soreReport } from '#tests/support/samples'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app())
})

/** Values that tend to slip through: wrong types, extremes, broken text, deep and empty things. */
const oddValue: fc.Arbitrary<unknown> = fc.oneof(
  fc.constantFrom(
    null,
    true,
    false,
    0,
    -1,
    1e308,
    -1e308,
    0.1,
    '',
    ' ',
    '\u0000',
    '\ud800',
    '💥',
    'NaN',
    [],
    {},
    [[]],
    { a: null },
  ),
  fc.string({ unit: 'binary', maxLength: 40 }),
  fc.double(),
  fc.integer(),
  fc.jsonValue({ maxDepth: 4 }),
  fc.constant('x'.repeat(5000)),
)

/** A valid body in which some fields are left out, replaced or added. */
const twisted = (valid: Record<string, unknown>): fc.Arbitrary<unknown> =>
  fc.oneof(
    oddValue,
    fc
      .record({
        changed: fc.dictionary(fc.constantFrom(...Object.keys(valid)), oddValue, { maxKeys: 3 }),
        dropped: fc.subarray(Object.keys(valid), { maxLength: Math.min(2, Object.keys(valid).length) }),
        added: fc.dictionary(fc.string({ maxLength: 8 }), oddValue, { maxKeys: 2 }),
      })
      .map(({ changed, dropped, added }) => {
        const body: Record<string, unknown> = { ...added, ...valid, ...changed }
        for (const key of dropped) delete body[key]
        return body
      }),
  )

const oddText = fc.oneof(
  fc.string({ unit: 'binary', maxLength: 30 }),
  fc.constantFrom('', '%00', '-1', '1e9', "'", '../..', '[]'),
)

type Agent = Awaited<ReturnType<ReturnType<typeof app>['as']>>
let agent: Agent
let slotId: string
let athleteId: string
beforeAll(async () => {
  const athlete = await app().make.athlete()
  athleteId = athlete.id
  slotId = (await training.slot(athlete)).id
  agent = await app().as(athlete)
})

async function expectNoServerError(answer: { status: number; body: unknown }): Promise<void> {
  expect(answer.status).toBeLessThan(500)
  if (answer.status >= 400) errorBody.parse(answer.body)
}

const RUNS = 60

describe('whatever is sent', () => {
  const bodies: Record<string, () => { url: string; valid: Record<string, unknown> }> = {
    'a report': () => ({ url: `/api/athletes/${athleteId}/sore-joints`, valid: { ...soreReport() } }),
    'a clearance': () => ({
      url: `/api/athletes/${athleteId}/sore-joints/${slotId}/clearance`,
      valid: { note: 'examined' },
    }),
    'a swap': () => ({
      url: `/api/slots/${slotId}/swaps`,
      valid: { exerciseId: training.exerciseId('chin-up'), fingerprint: 'abcdefgh' },
    }),
    'a flag': () => ({
      url: '/api/flags',
      valid: { slotId, exerciseId: training.exerciseId('chin-up'), reason: 'other', note: '' },
    }),
    'a preview of an exercise': () => ({
      url: '/api/exercises/preview',
      valid: { exerciseId: training.exerciseId('chin-up'), athleteId, load: 0 },
    }),
    'a preview of a geometry': () => ({
      url: '/api/exercises/preview',
      valid: {
        mechanics: training.document('chin-up').mechanics,
        body: { sex: 'male', bodyMass: 70, stature: 1.7 },
        load: 0,
      },
    }),
  }

  it.each(Object.keys(bodies))('as %s, it is never the server that fails', async (what) => {
    const { url, valid } = bodies[what]!()
    await fc.assert(
      fc.asyncProperty(twisted(valid), async (body) => {
        await expectNoServerError(
          await agent.post(url).set('Content-Type', 'application/json').send(JSON.stringify(body)),
        )
      }),
      { numRuns: RUNS },
    )
  })

  it('inside a geometry, it is never the server that fails', async () => {
    const { mechanics } = training.document('pull-up-overhand')
    const body = { sex: 'female', bodyMass: 60, stature: 1.65 }
    const number = fc.oneof(
      fc.double({ min: -400, max: 400, noNaN: true }),
      fc.constantFrom(0, 90, -90, 180, 1e-9, 3, -3),
    )
    const frame = fc.record({
      name: fc.constant('frame'),
      trunk: fc.record({ lean: number }),
      arms: fc.oneof(fc.record({ hand: fc.tuple(number, number) }), fc.record({ shoulder: number, elbow: number })),
      legs: fc.oneof(fc.record({ ankle: fc.tuple(number, number) }), fc.record({ hip: number, knee: number })),
    })
    await fc.assert(
      fc.asyncProperty(
        fc.array(frame, { minLength: 2, maxLength: 4 }),
        number,
        number,
        async (frames, load, referenceLoad) => {
          const sent = { mechanics: { ...mechanics, frames, referenceLoad }, body, load }
          await expectNoServerError(await agent.post('/api/exercises/preview').send(sent))
        },
      ),
      { numRuns: RUNS },
    )
  })

  it('in a path or a query, it is never the server that fails', async () => {
    const exercise = training.exerciseId('chin-up')
    const urls = (text: string) => [
      `/api/athletes/${text}/today?day=2026-03-02`,
      `/api/athletes/${athleteId}/today?day=${text}`,
      `/api/athletes?day=${text}&limit=${text}&cursor=${text}`,
      `/api/athletes/${athleteId}/sore-joints?state=${text}&cursor=${text}`,
      `/api/athletes/${athleteId}/sore-joints?cursor=${text}`,
      `/api/slots/${slotId}/swaps?placeId=${text}`,
      `/api/slots/${slotId}/swaps?maxCoordination=${text}`,
      `/api/athletes/${athleteId}/exercises/${exercise}/swaps?target=lats&sets=${text}&rir=${text}`,
      `/api/exercises?search=${text}`,
      `/api/exercises?ids=${text}&cursor=${text}`,
      `/api/exercises/${text}`,
      `/api/flags?cursor=${text}`,
      `/api/flags?state=${text}&state=all`,
    ]
    await fc.assert(
      fc.asyncProperty(oddText, fc.nat(12), async (text, index) => {
        const url = urls(encodeURIComponent(text.replace(/[\ud800-\udfff]/gu, '')))[index]!
        await expectNoServerError(await agent.get(url))
      }),
      { numRuns: RUNS * 3 },
    )
  })

  it('in a cursor that looks right, it is never the server that fails', async () => {
    const uuid = slotId
    const lists = [
      `/api/athletes/${athleteId}/sore-joints?`,
      '/api/flags?',
      '/api/exercises?',
      '/api/athletes?day=2026-03-02&',
      '/api/audit?',
    ]
    const keys: unknown[][] = [
      ['0000-01-01T00:00:00Z', uuid],
      ['9999-12-31T23:59:59.999999999Z', uuid],
      ['\u0000', uuid],
      ['\ud800', uuid],
      [1e15, 3, 'name', uuid],
      [0, -5, 'name', uuid],
    ]
    const { make } = app()
    const physio = await make.physio()
    const everyone = [agent, await app().as(physio), await app().as(await make.admin(physio.club))]
    for (const key of keys) {
      const cursor = Buffer.from(JSON.stringify(key)).toString('base64url')
      for (const list of lists) {
        for (const who of everyone) await expectNoServerError(await who.get(`${list}cursor=${cursor}`))
      }
    }
    for (const day of ['0000-01-01', '9999-12-31', '0001-01-01']) {
      const answer = await agent.get(`/api/athletes/${athleteId}/today?day=${day}`)
      expect(answer.status).toBe(400)
    }
  })

  it('leaves no half-written row', async () => {
    const [row]: [{ sore: number; swaps: number }] = await app().dataSource.query(
      `select (select count(*)::int from sore_joints where athlete_id = $1 and state <> 'closed' and rating not between 0 and 10) as sore,
              (select count(*)::int from swaps) as swaps`,
      [athleteId],
    )
    expect(row).toEqual({ sore: 0, swaps: 0 })
  })
})
