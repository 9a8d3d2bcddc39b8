import { LRUCache } from 'lru-cache'
import type { Ranking } from '#shared/contract/swap'
import type { Catalogue } from '../exercises/catalogue'
import { buildRanking, fingerprintOf, type RankingFilters } from './build-ranking'
import type { RankingInputs } from './ranking-inputs'

/** Bytes of finished tables that are kept. */
const MEMORY = 16 * 1024 * 1024

/**
 * Rankings by the fingerprint of their inputs. A table follows from its inputs alone, so one that was made before is
 * sent again as it is; whoever reads it was checked by the query that gathered the inputs.
 */
export class RankingMemory {
  private readonly tables = new LRUCache<string, Buffer>({ maxSize: MEMORY, sizeCalculation: (json) => json.length })

  constructor(private readonly catalogue: Catalogue) {}

  /** The ranking as the bytes that go over the wire. */
  async json(inputs: RankingInputs, filters: RankingFilters, now: Date): Promise<Buffer> {
    const key = fingerprintOf(inputs, filters, now)
    const known = this.tables.get(key)
    if (known !== undefined) return known
    const edition = await this.catalogue.edition(inputs, [inputs.profile.sex])
    const made = Buffer.from(JSON.stringify(buildRanking(inputs, filters, edition, now)))
    this.tables.set(key, made)
    return made
  }

  async ranking(inputs: RankingInputs, filters: RankingFilters, now: Date): Promise<Ranking> {
    return JSON.parse((await this.json(inputs, filters, now)).toString('utf8')) as Ranking
  }
}
