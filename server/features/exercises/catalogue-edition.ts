import { LRUCache } from 'lru-cache'
import type { Exercise, ExerciseDocument } from '#shared/contract/exercise'
import type { RuleSet } from '#shared/contract/rule-set'
import type { Sex } from '#shared/mechanics/sex'
import type { ExerciseSolution } from '#shared/mechanics/solution'
import { musclesOf, type Candidate } from '#shared/rules/index'
import { unpackSolution, type PackedSolution } from './packed-solution'

/** A published version as it is kept: bytes, since a long catalogue of live objects would fill the memory. */
export interface KeptVersion {
  id: string
  versionId: string
  coordination: number
  /** The document's JSON. */
  document: Buffer
}

/** Versions whose objects stay alive once they were read: all of an ordinary catalogue. */
const ALIVE = 400

/** Reads a version's bytes when somebody looks at it, and remembers what was looked at last. */
class KeptCandidate implements Candidate {
  readonly id: string
  readonly versionId: string
  readonly coordination: number

  constructor(
    private readonly kept: KeptVersion,
    private readonly packed: PackedSolution,
    private readonly documents: LRUCache<string, ExerciseDocument>,
    private readonly solutions: LRUCache<string, ExerciseSolution>,
  ) {
    this.id = kept.id
    this.versionId = kept.versionId
    this.coordination = kept.coordination
  }

  get document(): ExerciseDocument {
    const known = this.documents.get(this.versionId)
    if (known !== undefined) return known
    const read = JSON.parse(this.kept.document.toString('utf8')) as ExerciseDocument
    this.documents.set(this.versionId, read)
    return read
  }

  get solution(): ExerciseSolution {
    const known = this.solutions.get(this.versionId)
    if (known !== undefined) return known
    const read = unpackSolution(this.packed)
    this.solutions.set(this.versionId, read)
    return read
  }
}

/** All published exercises and the active rules at one moment, with the coefficients of the sexes asked for so far. */
export class CatalogueEdition {
  private readonly documents = new LRUCache<string, ExerciseDocument>({ max: ALIVE })
  private readonly bySex = new Map<Sex, ReadonlyMap<string, Candidate>>()
  /** Which muscles an exercise drives follows from its version and the rules alone. */
  private readonly muscles = new LRUCache<string, Exercise['muscles']>({ max: ALIVE })

  constructor(
    readonly revision: number,
    readonly ruleSet: RuleSet,
    readonly versions: ReadonlyMap<string, KeptVersion>,
  ) {}

  has(sex: Sex): boolean {
    return this.bySex.has(sex)
  }

  /** Adds the coefficients for a sex, by version. */
  add(sex: Sex, packed: ReadonlyMap<string, PackedSolution>): void {
    const solutions = new LRUCache<string, ExerciseSolution>({ max: ALIVE })
    const candidates = new Map<string, Candidate>()
    for (const [id, kept] of this.versions) {
      const own = packed.get(kept.versionId)
      if (own !== undefined) candidates.set(id, new KeptCandidate(kept, own, this.documents, solutions))
    }
    this.bySex.set(sex, candidates)
  }

  /** Every published exercise by name, with coefficients for a sex that was asked for with the edition. */
  candidates(sex: Sex): Candidate[] {
    return [...this.candidateMap(sex).values()]
  }

  find(sex: Sex, exerciseId: string): Candidate | null {
    return this.candidateMap(sex).get(exerciseId) ?? null
  }

  /** The muscles an average adult drives with it; the edition must have been asked for with `unspecified`. */
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

  private candidateMap(sex: Sex): ReadonlyMap<string, Candidate> {
    const candidates = this.bySex.get(sex)
    if (candidates === undefined) throw new Error(`The edition was not asked for with ${sex} coefficients.`)
    return candidates
  }
}
