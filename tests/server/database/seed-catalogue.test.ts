import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { readCatalogue, readRuleSets, seedCatalogue } from '#server/database/seed-catalogue'
import { testApp } from '#tests/support/test-app'

const app = testApp()
let folder: string
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'pintle-seeds-'))
  await mkdir(path.join(folder, 'catalogue'))
})
afterAll(() => rm(folder, { recursive: true }))

const write = (name: string, text: string) => writeFile(path.join(folder, 'catalogue', name), text)

describe('seeding the catalogue', () => {
  it('publishes every exercise once, however often it runs', async () => {
    const { dataSource, clock } = app()
    const documents = await readCatalogue()
    expect(documents.length).toBeGreaterThanOrEqual(48)
    expect(await seedCatalogue(dataSource, clock.now())).toBe(documents.length)
    expect(await seedCatalogue(dataSource, clock.now())).toBe(0)
    const [row]: [{ current: number; all: number }] = await dataSource.query(
      'select count(*) filter (where is_current)::int as current, count(*)::int as all from exercise_versions',
    )
    expect(row).toEqual({ current: documents.length, all: documents.length })
  }, 120_000)

  it('activates the newest rule set only where none is active', async () => {
    const { dataSource, clock } = app()
    const [newest] = (await readRuleSets()).toReversed()
    const active = () => dataSource.query('select version from rule_sets where is_active')
    expect(await active()).toEqual([{ version: newest!.version }])
    await dataSource.query('update rule_sets set is_active = false')
    await dataSource.query(
      'insert into rule_sets (version, data, is_active, created_at) select 900, data, true, now() from rule_sets limit 1',
    )
    await seedCatalogue(dataSource, clock.now())
    expect(await active()).toEqual([{ version: 900 }])
  }, 120_000)

  it('names the file and the field of an exercise that is not valid', async () => {
    await write('broken.yaml', '- slug: Not A Slug\n  name: Broken\n')
    await expect(readCatalogue(folder)).rejects.toThrow(/broken\.yaml is not valid[^]*slug/)
    await rm(path.join(folder, 'catalogue', 'broken.yaml'))
  })

  it('refuses one slug given twice', async () => {
    const [first] = await readCatalogue()
    const text = JSON.stringify([first])
    await write('one.yaml', text)
    await write('two.yaml', text)
    await expect(readCatalogue(folder)).rejects.toThrow(`${first!.slug} twice`)
  })
})
