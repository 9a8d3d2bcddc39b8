import { LRUCache } from 'lru-cache'
import type { DataSource } from 'typeorm'
import type { Exercise, ExerciseDocument } from '#shared/contract/exercise'
import { ruleSet as ruleSetSchema, type RuleSet } from '#shared/contract/rule-set'
import type { Sex } from '#shared/mechanics/sex'
import { musclesOf, type Candidate } from '#shared/rules/index'
import { AppError } from '../../errors'
import type { Solutions } from './entity'

/** Which catalogue and which rules an answer is made from; selected together with an answer's other inputs. */
export interface Edition {
  revision: number
  ruleSetVersion: number | null
}

/** SQL columns of the edition that stands now, for a query that has nothing else to join. */
export const EDITION_SQL = `
  (select cs.revision from catalogue_state cs where cs.id = 1) as revision,
  (select rs.version from rule_sets rs where rs.is_active) as "ruleSetVersion"`

interface VersionRow {
  id: string
  versionId: string
  coordination: number
  document: ExerciseDocument
  solutions: Solutions
}

/** Rows that are read from the database at once, so that memory does not peak while a long catalogue is loaded. */
const BATCH = 200

/** All published exercises and the active rules at one moment. */
export class CatalogueEdition {
  constructor(
    readonly revision: number,
    readonly ruleSet: RuleSet,
    private readonly entries: ReadonlyMap<string, VersionRow>,
  ) {}

  /** Which muscles an exercise drives follows from its version and the rules alone. */
  private readonly muscles = new LRUCache<string, Exercise['muscles']>({ max: 2000 })
  private readonly bySex = new Map<Sex, ReadonlyMap<string, Candidate>>()

  private candidateMap(sex: Sex): ReadonlyMap<string, Candidate> {
    const known = this.bySex.get(sex)
    if (known !== undefined) return known
    const made = new Map(
      [...this.entries].map(([id, { versionId, coordination, document, solutions }]) => [
        id,
        { id, versionId, coordination, document, solution: solutions[sex] },
      ]),
    )
    this.bySex.set(sex, made)
    return made
  }

  candidates(sex: Sex): Candidate[] {
    return [...this.candidateMap(sex).values()]
  }

  find(sex: Sex, exerciseId: string): Candidate | null {
    return this.candidateMap(sex).get(exerciseId) ?? null
  }

  /** The muscles an average adult drives with it. */
  musclesOf(exerciseId: string): Exercise['muscles'] {
    const known = this.muscles.get(exerciseId)
    if (known !== undefined) return known
    const candidate = this.find('unspecified', exerciseId)
    if (candidate === null) return []
    const { document, solution } = candidate
    const muscles = musclesOf({ mechanics: document.mechanics, solution }, this.ruleSet)
    this.muscles.set(exerciseId, muscles)
    return muscles
  }

  /** For the next edition: versions that are still current need not be read again. */
  get rows(): ReadonlyMap<string, VersionRow> {
    return this.entries
  }
}

/**
 * The published exercises, kept in memory: ranking reads all of them for every answer. Each request learns from its
 * own query which edition stands; when that is newer than the one in memory, what changed is read first.
 */
export class Catalogue {
  private current: CatalogueEdition | null = null
  private loading: Promise<CatalogueEdition> | null = null

  constructor(private readonly dataSource: DataSource) {}

  /** The edition a query named. */
  async edition(wanted: Edition): Promise<CatalogueEdition> {
    const isCurrent = (known: CatalogueEdition | null): known is CatalogueEdition =>
      known !== null && known.revision >= wanted.revision && known.ruleSet.version === wanted.ruleSetVersion
    if (isCurrent(this.current)) return this.current
    const loaded = await this.reload()
    // A load that was already under way may have begun before the publication that was seen.
    return isCurrent(loaded) ? loaded : this.reload()
  }

  /** The edition that stands now. */
  async latest(): Promise<CatalogueEdition> {
    const [row]: [Edition] = await this.dataSource.query(`select ${EDITION_SQL}`)
    return this.edition(row)
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
      const known = this.current?.rows ?? new Map<string, VersionRow>()
      const listed: Array<{ id: string; versionId: string }> = await manager.query(
        `select v.exercise_id as id, v.id as "versionId" from exercise_versions v where v.is_current order by v.name, v.exercise_id`,
      )
      const fresh = new Map<string, VersionRow>()
      const missing = listed.filter(({ id, versionId }) => known.get(id)?.versionId !== versionId)
      for (let at = 0; at < missing.length; at += BATCH) {
        const rows: VersionRow[] = await manager.query(
          `select v.exercise_id as id, v.id as "versionId", v.coordination, v.document, v.solutions
             from exercise_versions v where v.id = any($1::uuid[])`,
          [missing.slice(at, at + BATCH).map(({ versionId }) => versionId)],
        )
        for (const row of rows) fresh.set(row.id, row)
      }
      const entries = new Map<string, VersionRow>()
      for (const { id } of listed) {
        const row = fresh.get(id) ?? known.get(id)
        if (row !== undefined) entries.set(id, row)
      }
      return new CatalogueEdition(state.revision, ruleSetSchema.parse(state.rules), entries)
    })
    this.current = edition
    return edition
  }
}
