import type { DataSource, EntityManager } from 'typeorm'
import { ruleSet as ruleSetSchema } from '#shared/contract/rule-set'
import type { Sex } from '#shared/mechanics/sex'
import type { ExerciseSolution } from '#shared/mechanics/solution'
import { AppError } from '../../errors'
import type { Block } from './block-store'
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
const BATCH = 100

const inBatches = <T>(items: readonly T[]): T[][] =>
  Array.from({ length: Math.ceil(items.length / BATCH) }, (_, index) => items.slice(index * BATCH, (index + 1) * BATCH))

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
    const listed: Array<{ id: string; versionId: string }> = await manager.query(
      `select v.exercise_id as id, v.id as "versionId"
         from exercise_versions v where v.is_current order by v.name, v.exercise_id`,
    )
    const versions = new Map<string, KeptVersion>()
    for (const batch of inBatches(listed)) {
      const known = batch.flatMap(({ id, versionId }) => {
        const version = this.current?.versions.get(id)
        return version?.versionId === versionId ? [version] : []
      })
      const missing = batch.filter(({ id }) => !known.some((version) => version.id === id))
      const rows: Array<Record<'id' | 'versionId' | 'head' | 'mechanics', string> & { coordination: number }> =
        missing.length === 0
          ? []
          : await manager.query(
              `select v.exercise_id as id, v.id as "versionId", v.coordination,
                      (v.document - 'mechanics')::text as head, (v.document -> 'mechanics')::text as mechanics
                 from exercise_versions v where v.id = any($1::uuid[])`,
              [missing.map(({ versionId }) => versionId)],
            )
      const read = rows.map(({ head, mechanics, ...row }) => ({
        ...row,
        head: this.blocks.heads.keep(Buffer.from(head)),
        mechanics: this.blocks.mechanics.keep(Buffer.from(mechanics)),
      }))
      const byId = new Map([...known, ...read].map((version) => [version.id, version]))
      for (const { id } of batch) {
        const version = byId.get(id)
        if (version !== undefined) versions.set(id, version)
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
      const missing = batch.filter(({ versionId }) => !known?.has(versionId)).map(({ versionId }) => versionId)
      const rows: Array<{ versionId: string; solution: ExerciseSolution }> =
        missing.length === 0
          ? []
          : await this.dataSource.query(
              `select v.id as "versionId", v.solutions -> $2::text as solution
                 from exercise_versions v where v.id = any($1::uuid[])`,
              [missing, sex],
            )
      for (const { versionId, solution } of rows) {
        solved.set(versionId, this.blocks.solutions.keep(packSolution(solution)))
      }
      for (const { versionId } of batch) {
        const kept = known?.get(versionId)
        if (kept !== undefined) solved.set(versionId, kept)
      }
    }
    this.solved.set(sex, solved)
    this.blocks.solutions.retain(new Set([...this.solved.values()].flatMap((blocks) => [...blocks.values()])))
    edition.add(sex, solved)
  }
}
