import { describe, expect, it } from 'vitest'
import { ExerciseVersion } from '#server/features/exercises/entity'
import { publish } from '#server/features/exercises/publish'
import { trainingFactories } from '#tests/support/factories/training'
import { testApp } from '#tests/support/test-app'

const app = testApp()

const versionsOf = (exerciseId: string) =>
  app().dataSource.manager.find(ExerciseVersion, { where: { exerciseId }, order: { version: 'ASC' } })
const revision = async () => {
  const [row]: [{ revision: number }] = await app().dataSource.query('select revision from catalogue_state')
  return row.revision
}

describe('publishing an exercise', () => {
  it('does nothing when nothing changed, and keeps the id and the older version when something did', async () => {
    const training = await trainingFactories(app(), ['chin-up'])
    const { dataSource, clock } = app()
    const document = training.document('chin-up')
    const exerciseId = training.exerciseId('chin-up')
    const again = (change: object) =>
      dataSource.transaction((manager) => publish(manager, { ...document, ...change }, training.ruleSet, clock.now()))
    const before = await revision()
    expect(await again({})).toBe(false)
    expect(await revision()).toBe(before)
    expect(await again({ setup: 'Hang first.' })).toBe(true)
    expect(await revision()).toBe(before + 1)
    const versions = await versionsOf(exerciseId)
    expect(versions.map(({ version, isCurrent }) => [version, isCurrent])).toEqual([
      [1, false],
      [2, true],
    ])
    expect(versions[0]?.document.setup).toBe(document.setup)
    expect(versions[1]?.document.setup).toBe('Hang first.')
  })

  it('solves the geometry for every segment table, and what cannot be solved leaves no trace', async () => {
    const training = await trainingFactories(app(), ['pull-up-overhand'])
    const { dataSource, clock } = app()
    const [version] = await versionsOf(training.exerciseId('pull-up-overhand'))
    const frames = training.document('pull-up-overhand').mechanics.frames.length
    for (const solution of Object.values(version!.solutions)) expect(solution.frames).toHaveLength(frames)
    const document = training.document('pull-up-overhand')
    const [frame, ...rest] = document.mechanics.frames
    const mechanics = {
      ...document.mechanics,
      frames: [{ ...frame!, arms: { hand: [-2, 2] as [number, number] } }, ...rest],
    }
    const broken = { ...document, slug: 'broken-pull-up', mechanics }
    const before = await revision()
    const attempt = dataSource.transaction((manager) => publish(manager, broken, training.ruleSet, clock.now()))
    await expect(attempt).rejects.toMatchObject({ name: 'MechanicsError' })
    expect(await dataSource.query(`select 1 from exercises where slug = 'broken-pull-up'`)).toEqual([])
    expect(await revision()).toBe(before)
  })
})
