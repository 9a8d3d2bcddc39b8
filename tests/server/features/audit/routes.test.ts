import { describe, expect, it } from 'vitest'
import { recordAudit } from '#server/features/audit/record'
import { expectError } from '#tests/support/expect-error'
import { testApp } from '#tests/support/test-app'

const app = testApp()

const record = (
  actor: { id: string },
  subject: { id: string } | null,
  action: `${string}.${string}` = 'read.soreJoints',
) => recordAudit(app().dataSource.manager, { actor: { userId: actor.id }, action, subject: subject?.id ?? null })

async function club() {
  const { make } = app()
  const admin = await make.admin()
  const athlete = await make.athlete({ club: admin.club })
  const coach = await make.coach(admin.club)
  return { admin, athlete, coach, agent: await app().as(admin) }
}

describe('GET /api/audit', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().get('/api/audit'), 'not_signed_in')
  })

  it('is for admins', async () => {
    const { coach, athlete } = await club()
    for (const person of [coach, athlete]) expectError(await (await app().as(person)).get('/api/audit'), 'forbidden')
  })

  it('shows who did what to whom, newest first', async () => {
    const { athlete, coach, agent } = await club()
    await record(coach, athlete)
    await record(athlete, null, 'raise.flag')
    const { body } = await agent.get('/api/audit').expect(200)
    expect(body.nextCursor).toBeNull()
    expect(body.items.map(({ id: _id, at: _at, ...rest }: Record<string, unknown>) => rest)).toEqual([
      { actor: { id: athlete.id, name: athlete.name }, action: 'raise.flag', subject: null, details: {} },
      {
        actor: { id: coach.id, name: coach.name },
        action: 'read.soreJoints',
        subject: { id: athlete.id, name: athlete.name },
        details: {},
      },
    ])
  })

  it('shows lines about the clubs that the admin runs and no others', async () => {
    const [here, there] = [await club(), await club()]
    // A coach of this club who also works there: what they read there is none of this admin's business.
    await record(here.coach, there.athlete)
    expect((await here.agent.get('/api/audit').expect(200)).body.items).toEqual([])
    expect((await there.agent.get('/api/audit').expect(200)).body.items).toHaveLength(1)
  })

  it('keeps a line when the person is erased, without naming them', async () => {
    const { athlete, coach, agent } = await club()
    await record(coach, athlete)
    await app().dataSource.query('delete from users where id = $1', [coach.id])
    const { body } = await agent.get('/api/audit').expect(200)
    expect(body.items).toMatchObject([{ actor: null, subject: { id: athlete.id } }])
  })

  it('pages through everything exactly once', async () => {
    const { athlete, coach, agent } = await club()
    for (let count = 0; count < 7; count += 1) await record(coach, athlete, `read.page${count}`)
    // The same instant twice: the id decides.
    await app().dataSource.query(
      `update audit_entries set at = (select min(at) from audit_entries where subject_id = $1) where action in ('read.page0', 'read.page1', 'read.page2') and subject_id = $1`,
      [athlete.id],
    )
    const seen: string[] = []
    let cursor = ''
    for (let page = 0; page < 10; page += 1) {
      const { body } = await agent
        .get('/api/audit')
        .query({ limit: 2, ...(cursor !== '' && { cursor }) })
        .expect(200)
      seen.push(...body.items.map(({ action }: { action: string }) => action))
      if (body.nextCursor === null) break
      cursor = body.nextCursor
    }
    expect(seen).toHaveLength(7)
    expect(new Set(seen).size).toBe(7)
  })

  it.each([
    [{ limit: 0 }, ['limit']],
    [{ limit: 201 }, ['limit']],
    [{ limit: 'many' }, ['limit']],
    [{ cursor: 'x'.repeat(201) }, ['cursor']],
    [{ cursor: 'not-a-cursor' }, ['cursor']],
    [{ cursor: Buffer.from('["2026-01-01", "x"]').toString('base64url') }, ['cursor']],
    [{ cursor: Buffer.from('["\'; drop table users", 1]').toString('base64url') }, ['cursor']],
    [{ cursor: ['a', 'b'] }, ['cursor']],
  ])('refuses %j', async (query, fields) => {
    const { agent } = await club()
    expectError(await agent.get('/api/audit').query(query), 'invalid_request', fields)
  })
})
