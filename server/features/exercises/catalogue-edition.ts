import { LRUCache } from 'lru-cache'
import type { Exercise, ExerciseDocument } from '#shared/contract/exercise'
import type { RuleSet } from '#shared/contract/rule-set'
import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Sex } from '#shared/mechanics/sex'
import type { ExerciseSolution } from '#shared/mechanics/solution'
import { musclesOf, type Candidate } from '#shared/rules/index'
import { BlockStore, type Block } from './block-store'
import { unpackSolution } from './packed-solution'

/** A document without its geometry. */
export type DocumentHead = Omit<ExerciseDocument, 'mechanics'>

const parse = <T>(bytes: Buffer): T => JSON.parse(bytes.toString('utf8')) as T

/** The bytes of a catalogue and what was last read from them; carried on from one edition to the next. */
export class CatalogueBlocks {
  readonly heads = new BlockStore<DocumentHead>(parse)
  readonly mechanics = new BlockStore<ExerciseMechanics>(parse)
  readonly solutions = new BlockStore<ExerciseSolution>(unpackSolution)
}

/** A published version as it is kept. */
export interface KeptVersion {
  id: string
  versionId: string
  coordination: number
  head: Block
  mechanics: Block
}

/** Reads a version's bytes when somebody looks at it. */
class KeptCandidate implements Candidate {
  constructor(
    private readonly kept: KeptVersion,
    private readonly solved: Block,
    private readonly blocks: CatalogueBlocks,
    private readonly documents: LRUCache<string, ExerciseDocument>,
  ) {}

  get id(): string {
    return this.kept.id
  }

  get versionId(): string {
    return this.kept.versionId
  }

  get coordination(): number {
    return this.kept.coordination
  }

  get document(): ExerciseDocument {
    const known = this.documents.get(this.versionId)
    if (known !== undefined) return known
    const head = this.blocks.heads.open(this.kept.head)
    const document = { ...head, mechanics: this.blocks.mechanics.open(this.kept.mechanics) }
    this.documents.set(this.versionId, document)
    return document
  }

  get solution(): ExerciseSolution {
    return this.blocks.solutions.open(this.solved)
  }
}

/** Documents and muscles that stay at hand: all of an ordinary catalogue. */
const AT_HAND = 400

/** All published exercises and the active rules at one moment, with the coefficients of the sexes asked for so far. */
export class CatalogueEdition {
  private readonly documents = new LRUCache<string, ExerciseDocument>({ max: AT_HAND })
  private readonly bySex = new Map<Sex, ReadonlyMap<string, Candidate>>()
  /** Which muscles an exercise drives follows from its version and the rules alone. */
  private readonly muscles = new LRUCache<string, Exercise['muscles']>({ max: AT_HAND })

  constructor(
    readonly revision: number,
    readonly ruleSet: RuleSet,
    readonly versions: ReadonlyMap<string, KeptVersion>,
    private readonly blocks: CatalogueBlocks,
  ) {}

  has(sex: Sex): boolean {
    return this.bySex.has(sex)
  }

  /** Adds the coefficients for a sex, by version. */
  add(sex: Sex, solutions: ReadonlyMap<string, Block>): void {
    const candidates = new Map<string, Candidate>()
    for (const [id, kept] of this.versions) {
      const solved = solutions.get(kept.versionId)
      if (solved !== undefined) candidates.set(id, new KeptCandidate(kept, solved, this.blocks, this.documents))
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
