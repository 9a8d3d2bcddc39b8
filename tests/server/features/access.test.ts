import { beforeAll, describe, expect, it } from 'vitest'
import { expectError } from '#tests/support/expect-error'
import { trainingFactories, type TrainingFactories } from '#tests/support/factories/training'
import { soreReport } from '#tests/support/samples'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let training: TrainingFactories
beforeAll(async () => {
  training = await trainingFactories(app())
})

type Agent = Awaited<ReturnType<ReturnType<typeof app>['as']>>

/** An athlete with something to hide in every feature, and each way to get at it. */
async function athleteWithSecrets() {
  const athlete = await app().make.athlete()
  const slot = await training.slot(athlete)
  const sore = await training.soreJoint(athlete)
  const own = await app().as(athlete)
  const ranking = await own.get(`/api/slots/${slot.id}/swaps`).expect(200)
  const sent = {
    exerciseId: ranking.body.items[0].exercise.id as string,
    fingerprint: ranking.body.fingerprint as string,
  }
  const swap = await own.post(`/api/slots/${slot.id}/swaps`).send(sent).expect(201)
  const base = `/api/athletes/${athlete.id}`
  const exerciseId = training.exerciseId('chin-up')
  const ways: Record<string, (agent: Agent) => ReturnType<Agent['get']>> = {
    'the day': (agent) => agent.get(`${base}/today?day=${training.day}`),
    'sore joints': (agent) => agent.get(`${base}/sore-joints?state=all`),
    'a report': (agent) => agent.post(`${base}/sore-joints`).send(soreReport()),
    'a closure': (agent) => agent.post(`${base}/sore-joints/${sore.id}/closure`),
    'a clearance': (agent) => agent.post(`${base}/sore-joints/${sore.id}/clearance`).send({ note: 'fine' }),
    'a ranking for a slot': (agent) => agent.get(`/api/slots/${slot.id}/swaps`),
    'a ranking for an exercise': (agent) => agent.get(`${base}/exercises/${exerciseId}/swaps?target=lats`),
    'a preview': (agent) => agent.post('/api/exercises/preview').send({ exerciseId, athleteId: athlete.id, load: 0 }),
    'a swap': (agent) => agent.post(`/api/slots/${slot.id}/swaps`).send(sent),
    'an undo': (agent) => agent.post(`/api/swaps/${swap.body.id}/undo`),
    'a flag': (agent) => agent.post('/api/flags').send({ slotId: slot.id, exerciseId, reason: 'other' }),
  }
  return { athlete, ways }
}

const tables = ['sore_joints', 'swaps', 'flags', 'audit_entries']
async function rowCounts(): Promise<number[]> {
  const counts = tables.map(async (table) => {
    const [row]: [{ count: string }] = await app().dataSource.query(`select count(*) from ${table}`)
    return Number(row.count)
  })
  return Promise.all(counts)
}

describe('an athlete is not found, in any feature, by', () => {
  const strangers: Record<
    string,
    (athlete: { id: string; club: Parameters<ReturnType<typeof app>['make']['coach']>[0] }) => Promise<{ id: string }>
  > = {
    'another athlete of the club': ({ club }) => app().make.athlete({ ...(club === undefined ? {} : { club }) }),
    'a coach of the club who was never let in': ({ club }) => app().make.coach(club),
    'a physio of the club who was never let in': ({ club }) => app().make.physio(club),
    'an admin of the club': ({ club }) => app().make.admin(club),
    'a coach of another club, though let in': async (athlete) => {
      const coach = await app().make.coach()
      await app().make.consent(athlete, coach)
      return coach
    },
    'a coach who was shut out': async (athlete) => {
      const coach = await app().make.coach(athlete.club)
      await app().make.consent(athlete, coach, { revokedAt: app().clock.now() })
      return coach
    },
    'a physio who was shut out': async (athlete) => {
      const physio = await app().make.physio(athlete.club)
      await app().make.consent(athlete, physio, { revokedAt: app().clock.now() })
      return physio
    },
    'an admin whom the athlete let in by mistake': async (athlete) => {
      const admin = await app().make.admin(athlete.club)
      await app().make.consent(athlete, admin)
      return admin
    },
  }

  it.each(Object.keys(strangers))('%s', async (who) => {
    const { athlete, ways } = await athleteWithSecrets()
    const person = await strangers[who]!(athlete)
    const agent = await app().as(person)
    const before = await rowCounts()
    for (const [what, way] of Object.entries(ways)) {
      const answer = await way(agent)
      expect([what, answer.status]).toEqual([what, 404])
      expectError(answer, 'not_found')
      expect(JSON.stringify(answer.body)).not.toContain(athlete.name)
    }
    expect(await rowCounts()).toEqual(before)
  })

  it('nobody who is signed out', async () => {
    const { ways } = await athleteWithSecrets()
    const before = await rowCounts()
    for (const way of Object.values(ways)) expectError(await way(app().anonymous() as Agent), 'not_signed_in')
    expect(await rowCounts()).toEqual(before)
  })
})

describe('revoking consent', () => {
  it('shuts a coach out at the next request', async () => {
    const { athlete, ways } = await athleteWithSecrets()
    const coach = await app().make.coach(athlete.club)
    const consent = await app().make.consent(athlete, coach)
    const agent = await app().as(coach)
    expect((await ways['the day']!(agent)).status).toBe(200)
    const own = await app().as(athlete)
    await own.put(`/api/me/care-team/${consent.carerId}`).send({ letIn: false }).expect(200)
    expectError(await ways['the day']!(agent), 'not_found')
    expect((await agent.get(`/api/athletes?day=${training.day}`).expect(200)).body.items).toEqual([])
  })
})
