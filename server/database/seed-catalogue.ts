import { readdir, readFile } from 'node:fs/promises'
import path from 'node:path'
import type { DataSource } from 'typeorm'
import { parse } from 'yaml'
import { z } from 'zod'
import { exerciseDocument, type ExerciseDocument } from '#shared/contract/exercise'
import { ruleSet as ruleSetSchema, type RuleSet } from '#shared/contract/rule-set'
import { MechanicsError } from '#shared/mechanics/index'
import { publish } from '../features/exercises/publish'

/** Where the seeds lie when the server is started from the project's folder, as every script does. */
const SEEDS = 'seeds'

async function readYaml(folder: string): Promise<Array<{ file: string; content: unknown }>> {
  const names = (await readdir(folder)).filter((name) => name.endsWith('.yaml')).toSorted()
  return Promise.all(
    names.map(async (name) => {
      const file = path.join(folder, name)
      return { file, content: parse(await readFile(file, 'utf8')) as unknown }
    }),
  )
}

function parseSeed<T extends z.ZodType>(schema: T, { file, content }: { file: string; content: unknown }): z.output<T> {
  const parsed = schema.safeParse(content)
  if (parsed.success) return parsed.data
  throw new Error(`${file} is not valid:\n${z.prettifyError(parsed.error)}`)
}

/** Every rule set under seeds/rules, by version. */
export async function readRuleSets(seeds = SEEDS): Promise<RuleSet[]> {
  const files = await readYaml(path.join(seeds, 'rules'))
  return files.map((file) => parseSeed(ruleSetSchema, file)).toSorted((a, b) => a.version - b.version)
}

/** Every exercise under seeds/catalogue. Throws for one slug given twice. */
export async function readCatalogue(seeds = SEEDS): Promise<ExerciseDocument[]> {
  const files = await readYaml(path.join(seeds, 'catalogue'))
  const documents = files.flatMap((file) => parseSeed(z.array(exerciseDocument), file))
  const seen = new Set<string>()
  for (const { slug } of documents) {
    if (seen.has(slug)) throw new Error(`The catalogue has ${slug} twice.`)
    seen.add(slug)
  }
  return documents
}

/** Stores the rule sets; the newest becomes active only where none was, so that an admin's choice stands. */
export async function seedRuleSets(dataSource: DataSource, ruleSets: RuleSet[], now: Date): Promise<RuleSet> {
  const newest = ruleSets.at(-1)
  if (newest === undefined) throw new Error('There is no rule set under seeds/rules.')
  return dataSource.transaction(async (manager) => {
    for (const ruleSet of ruleSets) {
      await manager.query(
        `insert into rule_sets (version, data, is_active, created_at) values ($1, $2, false, $3)
         on conflict (version) do update set data = excluded.data`,
        [ruleSet.version, JSON.stringify(ruleSet), now],
      )
    }
    await manager.query(
      `update rule_sets set is_active = true
        where version = $1 and not exists (select 1 from rule_sets where is_active)`,
      [newest.version],
    )
    const [active]: [{ data: unknown }] = await manager.query('select data from rule_sets where is_active')
    return ruleSetSchema.parse(active.data)
  })
}

/**
 * Brings the database's rules and exercises to what the seeds say. What is unchanged is left alone, so it can run at
 * every start. Resolves to how many exercises were published anew.
 */
export async function seedCatalogue(dataSource: DataSource, now: Date, seeds = SEEDS): Promise<number> {
  const ruleSet = await seedRuleSets(dataSource, await readRuleSets(seeds), now)
  const documents = await readCatalogue(seeds)
  return dataSource.transaction(async (manager) => {
    // One seeding at a time, also when two servers start together.
    await manager.query('select 1 from catalogue_state where id = 1 for update')
    let published = 0
    for (const document of documents) {
      try {
        if (await publish(manager, document, ruleSet, now)) published += 1
      } catch (error) {
        if (!(error instanceof MechanicsError)) throw error
        throw new Error(`${document.slug} cannot be solved: ${error.field}: ${error.message}`, { cause: error })
      }
    }
    return published
  })
}
