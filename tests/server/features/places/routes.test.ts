import { describe, expect, it } from 'vitest'
import { Membership } from '#server/features/people/entity'
import { expectError } from '#tests/support/expect-error'
import { trainingFactories } from '#tests/support/factories/training'
import { testApp } from '#tests/support/test-app'

const app = testApp()

describe('GET /api/places', () => {
  it('needs a sign-in', async () => {
    expectError(await app().anonymous().get('/api/places'), 'not_signed_in')
  })

  it('lists the places of one’s own clubs by name, with equipment and load steps, and no others', async () => {
    const { make, dataSource } = app()
    const training = await trainingFactories(app(), [])
    const athlete = await make.athlete()
    const second = await make.club()
    await dataSource.manager.save(Membership, { userId: athlete.id, clubId: second.id, role: 'athlete' })
    const steps = { first: 1.25, step: 1.25, last: 60 }
    const here = await training.place(athlete.club, { pullUpBar: null, dipBelt: steps })
    const there = await training.place(second, {})
    await training.place(await make.club())
    const { body } = await (await app().as(athlete)).get('/api/places').expect(200)
    expect(body).toEqual({
      items: [
        {
          id: here.id,
          clubId: athlete.club.id,
          name: here.name,
          equipment: [
            { kind: 'dipBelt', steps },
            { kind: 'pullUpBar', steps: null },
          ],
        },
        { id: there.id, clubId: second.id, name: there.name, equipment: [] },
      ].toSorted((a, b) => (a.name < b.name ? -1 : 1)),
      nextCursor: null,
    })
  })

  it('is empty for somebody without a club', async () => {
    const { body } = await (await app().as(await app().make.user())).get('/api/places').expect(200)
    expect(body).toEqual({ items: [], nextCursor: null })
  })
})
