import { describe, expect, it } from 'vitest'
import { SEXES } from '#shared/mechanics/sex'
import { Catalogue } from '#server/features/exercises/catalogue'
import { publish } from '#server/features/exercises/publish'
import { countQueries } from '#tests/support/count-queries'
import { expectError } from '#tests/support/expect-error'
import { trainingFactories } from '#tests/support/factories/training'
import { testApp } from '#tests/support/test-app'

describe('the catalogue in memory', () => {
  const app = testApp()

  it('asks the database once per edition, however many ask at the same time', async () => {
    await trainingFactories(app())
    const { dataSource } = app()
    const catalogue = new Catalogue(dataSource)
    const edition = await catalogue.latest(['male'])
    const wanted = { revision: edition.revision, ruleSetVersion: 1 }
    expect(await countQueries(() => catalogue.edition(wanted, ['male']))).toBe(0)
    const alone = await countQueries(() => new Catalogue(dataSource).edition(wanted, ['male']))
    const crowd = new Catalogue(dataSource)
    const together = await countQueries(() =>
      Promise.all(Array.from({ length: 20 }, () => crowd.edition(wanted, ['male']))),
    )
    expect(together).toBe(alone)
  })

  it('gives every candidate the coefficients of the sex that is asked for', async () => {
    const training = await trainingFactories(app())
    const edition = await new Catalogue(app().dataSource).latest(SEXES)
    const id = training.exerciseId('pull-up-overhand')
    const male = edition.find('male', id)
    const female = edition.find('female', id)
    expect(male?.document.slug).toBe('pull-up-overhand')
    expect(male?.solution).not.toEqual(female?.solution)
    expect(
      edition
        .candidates('unspecified')
        .map(({ document }) => document.slug)
        .toSorted(),
    ).toEqual(training.documents.map(({ slug }) => slug).toSorted())
  })

  it('reads what was published since, and only that', async () => {
    const training = await trainingFactories(app())
    const { dataSource, clock } = app()
    const catalogue = new Catalogue(dataSource)
    const before = await catalogue.latest(['male'])
    const document = { ...training.document('chin-up'), name: 'Chin-up, renamed' }
    await dataSource.transaction((manager) => publish(manager, document, training.ruleSet, clock.now()))
    const after = await catalogue.latest(['male'])
    const id = training.exerciseId('chin-up')
    expect(before.find('male', id)?.document.name).not.toBe('Chin-up, renamed')
    expect(after.find('male', id)?.document.name).toBe('Chin-up, renamed')
    const other = training.exerciseId('pull-up-overhand')
    expect(after.find('male', other)?.versionId).toBe(before.find('male', other)?.versionId)
  })
})

describe('without an active rule set', () => {
  const app = testApp()

  it('is unavailable rather than wrong', async () => {
    const agent = await app().as(await app().make.athlete())
    expectError(await agent.get('/api/exercises'), 'unavailable')
  })
})
