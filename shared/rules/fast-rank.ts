import { SKILL_GRADES } from '../contract/exercise'
import type { RuleSet } from '../contract/rule-set'
import { boundTables, carryOverBound, scoreBound, spreadOf } from './bound'
import { contextOf, type RankContext } from './context'
import { MaxHeap } from './max-heap'
import { TARGET_GROUP_NAMES } from './muscle-names'
import { targetPack, type PackedCatalogue, type TargetPack } from './pack'
import { bestFirst, considersOriginal, rank, repeatsOriginal, resultOf, stopped, type Unranked } from './rank'
import { rate } from './rate'
import { calmOf } from './score'
import type { Candidate, RankRequest, RankResult } from './types'

/** Bins for sorting by the first bound, over scores 0–100. */
const BINS = 1024
/** How many exercises the second bound looks at before anything is rated. */
const FIRST_BATCH = 512

/** A ranking of which only the best rows are wanted, out of a packed catalogue. */
export interface TopRequest {
  /** The request; its own candidates are not looked at. */
  request: Omit<RankRequest, 'candidates'>
  packed: PackedCatalogue
  /** The candidate packed at an index, for the few that are looked at closely. */
  candidateAt: (index: number) => Candidate
  /** How many rows are wanted. */
  count: number
}

/**
 * The first `count` rows of `rank`, bit for bit, without rating the whole catalogue; what is left out is not listed.
 * A first bound (calm and the most the target could be driven) sorts the catalogue, a second one from the packed coefficients
 * (load, demands, caps, the rest of the body) and the carry-over narrow it, and only what could still enter the wanted rows is
 * rated exactly. A standing red flag takes the plain way.
 */
export function rankTop({ request, packed, candidateAt, count }: TopRequest, ruleSet: RuleSet): RankResult {
  const full: RankRequest = { ...request, candidates: [] }
  const context = contextOf(full, ruleSet)
  const nothing = stopped(context)
  if (nothing !== null) return nothing
  if (context.flagged.length > 0) {
    const candidates = Array.from({ length: packed.count }, (_, index) => candidateAt(index))
    const result = rank({ ...request, candidates }, ruleSet)
    return { ...result, items: result.items.slice(0, count), leftOut: [] }
  }
  const rows = bestRows(context, packed, candidateAt, count)
  const result = resultOf(context, rows, [])
  return { ...result, items: result.items.slice(0, count) }
}

function bestRows(
  context: RankContext,
  packed: PackedCatalogue,
  candidateAt: (index: number) => Candidate,
  count: number,
): Unranked[] {
  const tables = boundTables(context)
  const blocks = targetPack(packed)(context.ruleSet)(TARGET_GROUP_NAMES.indexOf(context.request.target))
  const original = considersOriginal(context) ? undefined : packed.positions.get(context.request.original.id)
  const { binOf, sizes } = binByFirstBound(context, blocks, spreadOf(tables, packed), original)
  const rows: Unranked[] = []
  // Scores enter negated: the heap's top is then the worst of the best `count`.
  const scores = new MaxHeap()
  const worstWanted = () => (scores.size < count ? Number.NEGATIVE_INFINITY : -scores.topKey)
  const rateExactly = (at: number) => {
    const rated = rate(candidateAt(blocks.index[at]!), context)
    if (!('row' in rated) || repeatsOriginal(rated.row, context)) return
    rows.push(rated.row)
    scores.push(-rated.row.score, at)
    if (scores.size > count) scores.pop()
  }
  const waiting = new MaxHeap()
  const settleDownTo = (edge: number) => {
    while (waiting.size > 0 && waiting.topKey >= edge && waiting.topKey >= worstWanted()) rateExactly(waiting.pop())
  }
  // Batches of growing size from the best bins down; within one in the order of memory.
  let batch = FIRST_BATCH
  for (let from = 0; from < BINS; batch *= 2) {
    const most = upperEdge(from)
    // Nothing from here on can beat what waits above.
    settleDownTo(most)
    const worst = worstWanted()
    if (most < worst) break
    let to = from
    for (let size = 0; to < BINS && size < batch; to++) size += sizes[to]!
    for (let at = 0; at < binOf.length; at++) {
      const bin = binOf[at]!
      if (bin < from || bin >= to) continue
      const bound = scoreBound(blocks, at, tables, Number.POSITIVE_INFINITY, worst)
      if (bound < 0 || bound < worst) continue
      // Where rounding could tip the load the bin's edge stands, and there are no demands to compare.
      const narrowed = bound === Number.POSITIVE_INFINITY ? upperEdge(bin) : bound * carryOverBound(tables)
      if (narrowed >= worst) waiting.push(narrowed, at)
    }
    from = to
  }
  settleDownTo(Number.NEGATIVE_INFINITY)
  return rows.sort(bestFirst)
}

/** Largest first bound in a bin; bins run from the best down. */
const upperEdge = (bin: number): number => (100 * (BINS - bin)) / BINS + 1e-3

/** The bin of every exercise by its first bound, −1 for what cannot be offered, and how many each bin holds. */
function binByFirstBound(
  { request, ruleSet, originalDrive }: RankContext,
  { count, index, coordination, skill, potential, reach }: TargetPack,
  spread: number,
  original: number | undefined,
): { binOf: Int16Array; sizes: Uint32Array } {
  const highest = SKILL_GRADES.indexOf(request.athlete.skill)
  const least = ruleSet.score.leastTargetDrive.value - 1e-9
  const standard = Math.max(originalDrive, ruleSet.score.leastTargetDrive.value)
  // calmOf is a straight line.
  const calmest = calmOf(0, request.intent, ruleSet)
  const slope = (calmOf(100, request.intent, ruleSet) - calmest) / 100
  const binOf = new Int16Array(count).fill(-1)
  const sizes = new Uint32Array(BINS)
  for (let at = 0; at < count; at++) {
    const drive = Math.min(potential[at]!, reach[at]! * spread)
    if (drive < least || skill[at]! > highest || index[at] === original) continue
    const first = (calmest + slope * coordination[at]!) * Math.min(1, drive / standard)
    const bin = Math.min(BINS - 1, Math.max(0, Math.floor((1 - first) * BINS)))
    binOf[at] = bin
    sizes[bin]!++
  }
  return { binOf, sizes }
}
