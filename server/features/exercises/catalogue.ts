import type { DataSource, EntityManager } from 'typeorm'
import { ruleSet as ruleSetSchema } from '#shared/contract/rule-set'
import type { Sex } from '#shared/mechanics/sex'
import type { ExerciseSolution } from '#shared/mechanics/solution'
import { AppError } from '../../errors'
import type { Block, BlockStore } from './block-store'
import { CatalogueBlocks, CatalogueEdition, type KeptVersion } from './catalogue-edition'
import { packSolution } from './packed-solution'

/** Which catalogue and which rules an answer is made from; selected together with an answer's other inputs. */
export interface Edition {
  revision: number
  ruleSetVersion: number | null
}

/** SQL columns of the edition that stands now. */
export const EDITION_SQL = `
  (select cs.revision from catalogue_state cs where cs.id = 1) as revision,
  (select rs.version from rule_sets rs where rs.is_active) as "ruleSetVersion"`

/** Rows that are read from the database at once, so that memory does not peak while a long catalogue is loaded. */
const BATCH = 50

const inBatches = <T>(items: readonly T[]): T[][] =>
  Array.from({ length: Math.ceil(items.length / BATCH) }, (_, index) => items.slice(index * BATCH, (index + 1) * BATCH))

const jsonBytes = (value: unknown) => Buffer.from(JSON.stringify(value))

/**
 * The block of a JSON part of each version, by version id. Parts are told apart by their hash, so that one that many
 * versions share is read from the database once.
 */
async function keepBlocks<T extends object>(
  manager: EntityManager,
  store: BlockStore<T>,
  part: string,
  versions: ReadonlyArray<{ versionId: string }>,
  toBytes: (value: unknown) => Buffer,
): Promise<Map<string, Block>> {
  const hashSql = `encode(sha256(convert_to((${part})::text, 'UTF8')), 'base64')`
  const where = 'from exercise_versions v where v.id = any($1::uuid[])'
  const hashed: Array<{ versionId: string; hash: string }> = await manager.query(
    `select v.id as "versionId", ${hashSql} as hash ${where}`,
    [versions.map(({ versionId }) => versionId)],
  )
  const blocks = new Map<string, Block>()
  const unknown = new Map<string, string>()
  for (const { hash, versionId } of hashed) {
    const block = store.find(hash)
    if (block === undefined) unknown.set(hash, versionId)
    else blocks.set(hash, block)
  }
  if (unknown.size > 0) {
    const read: Array<{ hash: string; value: unknown }> = await manager.query(
      `select ${hashSql} as hash, ${part} as value ${where}`,
      [[...unknown.values()]],
    )
    for (const { hash, value } of read) blocks.set(hash, store.keep(hash, toBytes(value)))
  }
  return new Map(
    hashed.flatMap(({ versionId, hash }) => {
      const block = blocks.get(hash)
      return block === undefined ? [] : [[versionId, block] as const]
    }),
  )
}

/**
 * The published exercises, kept in memory: ranking reads all of them for every answer. Each request learns from its
 * own query which edition stands; when that is newer than the one in memory, what changed is read first. Coefficients
 * are read per sex when the first athlete of that sex needs them.
 */
export class Catalogue {
  private current: CatalogueEdition | null = null
  private loading: Promise<CatalogueEdition> | null = null
  private readonly blocks = new CatalogueBlocks()
  private readonly solved = new Map<Sex, ReadonlyMap<string, Block>>()
  private readonly packing = new Map<string, Promise<void>>()

  constructor(private readonly dataSource: DataSource) {}

  /** The edition a query named, with coefficients for these sexes. */
  async edition(wanted: Edition, sexes: readonly Sex[]): Promise<CatalogueEdition> {
    const isCurrent = (known: CatalogueEdition | null): known is CatalogueEdition =>
      known !== null && known.revision >= wanted.revision && known.ruleSet.version === wanted.ruleSetVersion
    let edition = this.current
    if (!isCurrent(edition)) edition = await this.reload()
    // A load that was already under way may have begun before the publication that was seen.
    if (!isCurrent(edition)) edition = await this.reload()
    for (const sex of sexes) await this.complete(edition, sex)
    return edition
  }

  /** The edition that stands now, with coefficients for these sexes. */
  async latest(sexes: readonly Sex[]): Promise<CatalogueEdition> {
    const [row]: [Edition] = await this.dataSource.query(`select ${EDITION_SQL}`)
    return this.edition(row, sexes)
  }

  private reload(): Promise<CatalogueEdition> {
    this.loading ??= this.load().finally(() => (this.loading = null))
    return this.loading
  }

  private async load(): Promise<CatalogueEdition> {
    const edition = await this.dataSource.transaction('REPEATABLE READ', async (manager) => {
      const [state]: [Edition & { rules: unknown }] = await manager.query(
        `select ${EDITION_SQL}, (select rs.data from rule_sets rs where rs.is_active) as rules`,
      )
      if (state.ruleSetVersion === null) throw new AppError('unavailable', 'No rule set is active yet. Try again soon.')
      const versions = await this.loadVersions(manager)
      return new CatalogueEdition(state.revision, ruleSetSchema.parse(state.rules), versions, this.blocks)
    })
    this.current = edition
    const versions = [...edition.versions.values()]
    this.blocks.heads.retain(new Set(versions.map(({ head }) => head)))
    this.blocks.mechanics.retain(new Set(versions.map(({ mechanics }) => mechanics)))
    return edition
  }

  /** The current versions by exercise; those that are known already are not read again. */
  private async loadVersions(manager: EntityManager): Promise<Map<string, KeptVersion>> {
    const { heads, mechanics } = this.blocks
    const listed: Array<{ id: string; versionId: string }> = await manager.query(
      `select v.exercise_id as id, v.id as "versionId"
         from exercise_versions v where v.is_current order by v.name, v.exercise_id`,
    )
    const versions = new Map<string, KeptVersion>()
    for (const batch of inBatches(listed)) {
      const missing = batch.filter(({ id, versionId }) => this.current?.versions.get(id)?.versionId !== versionId)
      const headOf = await keepBlocks(manager, heads, `v.document - 'mechanics'`, missing, jsonBytes)
      const mechanicsOf = await keepBlocks(manager, mechanics, `v.document -> 'mechanics'`, missing, jsonBytes)
      const rows: Array<{ versionId: string; coordination: number }> = await manager.query(
        'select v.id as "versionId", v.coordination from exercise_versions v where v.id = any($1::uuid[])',
        [missing.map(({ versionId }) => versionId)],
      )
      const coordinationOf = new Map(rows.map(({ versionId, coordination }) => [versionId, coordination]))
      for (const { id, versionId } of batch) {
        const known = this.current?.versions.get(id)
        const head = headOf.get(versionId)
        const own = mechanicsOf.get(versionId)
        const coordination = coordinationOf.get(versionId)
        if (head !== undefined && own !== undefined && coordination !== undefined) {
          versions.set(id, { id, versionId, coordination, head, mechanics: own })
        } else if (known !== undefined) versions.set(id, known)
      }
    }
    return versions
  }

  /** Reads the coefficients an edition lacks for a sex, once however many ask. */
  private async complete(edition: CatalogueEdition, sex: Sex): Promise<void> {
    if (edition.has(sex)) return
    const key = `${edition.revision} ${edition.ruleSet.version} ${sex}`
    const work = this.packing.get(key) ?? this.pack(edition, sex).finally(() => this.packing.delete(key))
    this.packing.set(key, work)
    await work
  }

  private async pack(edition: CatalogueEdition, sex: Sex): Promise<void> {
    const known = this.solved.get(sex)
    const solved = new Map<string, Block>()
    for (const batch of inBatches([...edition.versions.values()])) {
      const missing = batch.filter(({ versionId }) => !known?.has(versionId))
      const toBytes = (solution: unknown) => packSolution(solution as ExerciseSolution)
      const { manager } = this.dataSource
      const found = await keepBlocks(manager, this.blocks.solutions, `v.solutions -> '${sex}'`, missing, toBytes)
      for (const { versionId } of batch) {
        const block = found.get(versionId) ?? known?.get(versionId)
        if (block !== undefined) solved.set(versionId, block)
      }
    }
    this.solved.set(sex, solved)
    this.blocks.solutions.retain(new Set([...this.solved.values()].flatMap((blocks) => [...blocks.values()])))
    edition.add(sex, solved)
  }
}
