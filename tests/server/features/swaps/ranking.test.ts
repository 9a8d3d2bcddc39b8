import { beforeAll, describe, expect, it } from 'vitest'
import { LIMITS } from '#shared/contract/limits'
import type { Ranking } from '#shared/contract/swap'
import { AuditEntry } from '#server/features/audit/entity'
import { AthleteProfile } from '#server/features/people/entity'
import { findInputsForSlot } from '#server/features/swaps/ranking-inputs'
import { RankingMemory } from '#server/features/swaps/ranking-memory'
import { countQueries } from '#tests/support/count-queries'
import { expectError } from '#tests/support/expect-error'
import { trainingFactories, type TrainingFactories } from '#tests/support/factories/training'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app())
})

const forSlot = (slot: { id: string }, query = '') => `/api/slots/${slot.id}/swaps${query}`
const NOBODY = '0199a0de-0000-7000-8000-000000000000'

/** Strong enough for pull-ups, with a sore right elbow. */
async function soreAthlete() {
  const athlete = await app().make.athlete({
    profile: { strengthFactors: { shoulderAdduction: 1.8, elbowFlexion: 1.6 } },
  })
  const slot = await training.slot(athlete)
  const sore = await training.soreJoint(athlete)
  return { athlete, slot, sore, agent: await app().as(athlete) }
}

async function rankingOf(agent: Awaited<ReturnType<ReturnType<typeof app>['as']>>, url: string): Promise<Ranking> {
  return (await agent.get(url).expect(200)).body as Ranking
}

describe('GET /api/slots/:slotId/swaps', () => {
  it('needs a sign-in', async () => {
    const { slot } = await soreAthlete()
    expectError(await app().anonymous().get(forSlot(slot)), 'not_signed_in')
  })

  it('is not found for whoever was not let in', async () => {
    const { athlete, slot } = await soreAthlete()
    const { make } = app()
    const admin = await make.admin(athlete.club)
    for (const person of [await make.athlete({ club: athlete.club }), await make.coach(athlete.club), admin]) {
      expectError(await (await app().as(person)).get(forSlot(slot)), 'not_found')
    }
  })

  it('names what is wrong with the request', async () => {
    const { slot, agent } = await soreAthlete()
    expectError(await agent.get(forSlot({ id: '1' })), 'invalid_request', ['slotId'])
    expectError(await agent.get(forSlot({ id: NOBODY })), 'not_found')
    expectError(await agent.get(forSlot(slot, '?guidance=magnetic')), 'invalid_request', ['guidance'])
    expectError(await agent.get(forSlot(slot, '?maxCoordination=101')), 'invalid_request', ['maxCoordination'])
    const elsewhere = await training.place(await app().make.club())
    expectError(await agent.get(forSlot(slot, `?placeId=${elsewhere.id}`)), 'invalid_request', ['placeId'])
  })

  it('wants a body profile first', async () => {
    const athlete = await app().make.athlete({ profile: null })
    const slot = await training.slot(athlete)
    expectError(await (await app().as(athlete)).get(forSlot(slot)), 'profile_incomplete')
  })

  it('ranks what spares the joint and says why the rest is left out', async () => {
    const { athlete, slot, sore, agent } = await soreAthlete()
    const ranking = await rankingOf(agent, forSlot(slot))
    expect(ranking).toMatchObject({
      athlete: { id: athlete.id, name: athlete.name },
      original: { id: slot.exerciseId, slug: 'pull-up-overhand' },
      planned: { sets: 4, repetitions: 6, rir: 2, load: null },
      target: 'lats',
      ruleSetVersion: training.ruleSet.version,
      sore: [{ soreJointId: sore.id, joint: 'elbow', side: 'right', rating: 4 }],
      redFlags: [],
      minor: false,
    })
    expect(ranking.items.length).toBeGreaterThan(0)
    expect(ranking.items.map(({ rank }) => rank)).toEqual(ranking.items.map((_, index) => index + 1))
    for (const { joints } of ranking.items) {
      for (const { stress, cap } of joints) if (cap !== null) expect(stress).toBeLessThanOrEqual(cap + 1e-9)
    }
    const all = [...ranking.items, ...ranking.leftOut].map(({ exercise }) => exercise.id)
    expect(new Set(all).size).toBe(all.length)
  })

  it('answers the same inputs with the same bytes, from memory or anew', async () => {
    const { athlete, slot, agent } = await soreAthlete()
    const first = await agent.get(forSlot(slot)).expect(200)
    const again = await agent.get(forSlot(slot)).expect(200)
    expect(again.text).toBe(first.text)
    expect(first.headers['content-type']).toMatch(/^application\/json/)
    expect(await madeAnew(slot.id, athlete.id)).toBe(first.text)
  })

  it('changes its fingerprint with every input', async () => {
    const { athlete, slot, sore, agent } = await soreAthlete()
    const { manager } = app().dataSource
    const seen = [(await rankingOf(agent, forSlot(slot))).fingerprint]
    const isNew = async (url = forSlot(slot)) => {
      const { fingerprint } = await rankingOf(agent, url)
      expect(seen).not.toContain(fingerprint)
      seen.push(fingerprint)
    }
    await isNew(forSlot(slot, '?guidance=cable'))
    await isNew(forSlot(slot, '?maxCoordination=30'))
    await isNew(forSlot(slot, `?placeId=${(await training.place(athlete.club)).id}`))
    await manager.update(AthleteProfile, { userId: athlete.id }, { bodyMass: 76 })
    await isNew()
    await manager.query('update sore_joints set rating = 5 where id = $1', [sore.id])
    await isNew()
    await manager.query('update slots set repetitions = 7 where id = $1', [slot.id])
    await isNew()
    await manager.query('update catalogue_state set revision = revision + 1')
    await isNew()
  })

  it('applies the filters of guidance, coordination and place', async () => {
    const { athlete, slot, agent } = await soreAthlete()
    const everything = await rankingOf(agent, forSlot(slot))
    const names = ({ items, leftOut }: Ranking) =>
      [...items, ...leftOut].map(({ exercise }) => exercise.slug).toSorted()
    const machine = everything.items[0]!
    const guided = await rankingOf(agent, forSlot(slot, `?guidance=${machine.exercise.guidance}`))
    expect(guided.items.every(({ exercise }) => exercise.guidance === machine.exercise.guidance)).toBe(true)
    expect(names(guided).length).toBeLessThan(names(everything).length)
    const calm = await rankingOf(agent, forSlot(slot, `?maxCoordination=${Math.ceil(machine.coordination)}`))
    expect(calm.items.length).toBeGreaterThan(0)
    expect(calm.items.every(({ coordination }) => coordination <= Math.ceil(machine.coordination))).toBe(true)
    const bare = await training.place(athlete.club, { pullUpBar: null })
    const here = await rankingOf(agent, forSlot(slot, `?placeId=${bare.id}`))
    expect(here.placeId).toBe(bare.id)
    expect(here.items.map(({ exercise }) => exercise.slug)).not.toContain('lat-pulldown-neutral')
    const reason = here.leftOut.find(({ exercise }) => exercise.slug === 'lat-pulldown-neutral')
    expect(reason?.why).toBe('noEquipment')
  })

  it('offers nothing for a joint under a red flag, whatever the filters', async () => {
    const { athlete, slot, agent } = await soreAthlete()
    await app().dataSource.manager.query(
      `update sore_joints set state = 'closed', closed_at = now() where athlete_id = $1`,
      [athlete.id],
    )
    const flagged = await training.redFlag(athlete, { rating: 3 })
    for (const query of ['', '?guidance=cable', '?maxCoordination=100']) {
      const ranking = await rankingOf(agent, forSlot(slot, query))
      expect(ranking.items).toEqual([])
      expect(ranking.redFlags).toMatchObject([
        { soreJointId: flagged.id, joint: 'elbow', side: 'right', flags: ['nerve'] },
      ])
      expect(ranking.leftOut.every(({ why }) => why === 'redFlag')).toBe(true)
    }
  })

  it('is open to coach and physio who were let in, each read one line in the trail', async () => {
    const { athlete, slot, agent } = await soreAthlete()
    const { make, dataSource } = app()
    const own = await agent.get(forSlot(slot)).expect(200)
    for (const carer of [await make.coach(athlete.club), await make.physio(athlete.club)]) {
      await make.consent(athlete, carer)
      const { text } = await (await app().as(carer)).get(forSlot(slot)).expect(200)
      expect(text).toBe(own.text)
    }
    const read = { subjectId: athlete.id, action: 'read.ranking' }
    expect(await dataSource.manager.countBy(AuditEntry, read)).toBe(2)
  })

  it('costs the athlete one query beside the sign-in', async () => {
    const { slot, agent } = await soreAthlete()
    await agent.get(forSlot(slot)).expect(200)
    expect(await countQueries(() => agent.get(forSlot(slot)).expect(200))).toBe(2)
  })

  it('sees an exercise that was published since', async () => {
    const { slot, agent } = await soreAthlete()
    const before = await rankingOf(agent, forSlot(slot))
    await trainingFactories(app(), ['ring-pull-up'])
    const after = await rankingOf(agent, forSlot(slot))
    const slugs = ({ items, leftOut }: Ranking) => [...items, ...leftOut].map(({ exercise }) => exercise.slug)
    expect(slugs(before)).not.toContain('ring-pull-up')
    expect(slugs(after)).toContain('ring-pull-up')
    expect(after.fingerprint).not.toBe(before.fingerprint)
  })
})

describe('GET /api/athletes/:athleteId/exercises/:exerciseId/swaps', () => {
  const forExercise = (athlete: { id: string }, query = '?target=lats', slug: 'chin-up' | null = 'chin-up') =>
    `/api/athletes/${athlete.id}/exercises/${slug === null ? NOBODY : training.exerciseId(slug)}/swaps${query}`

  it('needs a sign-in', async () => {
    expectError(
      await app()
        .anonymous()
        .get(forExercise(await app().make.athlete())),
      'not_signed_in',
    )
  })

  it('is not found for strangers and for exercises that are not published', async () => {
    const { athlete, agent } = await soreAthlete()
    expectError(await (await app().as(await app().make.coach(athlete.club))).get(forExercise(athlete)), 'not_found')
    expectError(await agent.get(forExercise(athlete, '?target=lats', null)), 'not_found')
  })

  it('names what is wrong with the dose', async () => {
    const { athlete, agent } = await soreAthlete()
    expectError(await agent.get(forExercise(athlete, '')), 'invalid_request', ['target'])
    expectError(await agent.get(forExercise(athlete, '?target=wings')), 'invalid_request', ['target'])
    expectError(await agent.get(forExercise(athlete, '?target=lats&sets=0')), 'invalid_request', ['sets'])
    const tooMany = LIMITS.repetitions.max + 1
    expectError(await agent.get(forExercise(athlete, `?target=lats&repetitions=${tooMany}`)), 'invalid_request', [
      'repetitions',
    ])
    expectError(await agent.get(forExercise(athlete, '?target=lats&rir=-1')), 'invalid_request', ['rir'])
  })

  it('ranks for the dose that is asked for', async () => {
    const { athlete, agent } = await soreAthlete()
    const ranking = await rankingOf(agent, forExercise(athlete, '?target=lats&intent=size&sets=3&repetitions=10&rir=1'))
    expect(ranking).toMatchObject({
      original: { slug: 'chin-up' },
      planned: { sets: 3, repetitions: 10, unit: 'repetitions', rir: 1, load: null, pieces: 1 },
      intent: 'size',
      placeId: null,
    })
    expect(ranking.items.length).toBeGreaterThan(0)
  })
})

/** The table as a server makes it that remembers nothing. */
async function madeAnew(slotId: string, userId: string): Promise<string> {
  const { dataSource, dependencies, clock } = app()
  const actor = { userId, name: '', memberships: [] }
  const inputs = await findInputsForSlot(dataSource.manager, actor, slotId, undefined)
  return (await new RankingMemory(dependencies.catalogue).json(inputs, {}, clock.now())).toString('utf8')
}
