import { SKILL_GRADES } from '../contract/exercise'
import type { RuleSet } from '../contract/rule-set'
import { boundTables, carryOverBound, scoreBound, spreadOf } from './bound'
import { contextOf, type RankContext } from './context'
import { MaxHeap } from './max-heap'
import { TARGET_GROUP_NAMES } from './muscle-names'
import type { PackedCatalogue } from './pack'
import { bestFirst, considersOriginal, rank, repeatsOriginal, resultOf, stopped, type Unranked } from './rank'
import { rate } from './rate'
import { calmOf } from './score'
import type { Candidate, RankRequest, RankResult } from './types'

/** Bins for sorting by the first bound, over scores 0–100. */
const BINS = 1024

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
  const { order, edges } = sortByFirstBound(context, packed, spreadOf(tables, packed))
  const rows: Unranked[] = []
  // Scores enter negated: the heap's top is then the worst of the best `count`.
  const scores = new MaxHeap()
  const worstWanted = () => (scores.size < count ? Number.NEGATIVE_INFINITY : -scores.topKey)
  const rateExactly = (at: number) => {
    const rated = rate(candidateAt(packed.index[at]!), context)
    if (!('row' in rated) || repeatsOriginal(rated.row, context)) return
    rows.push(rated.row)
    scores.push(-rated.row.score, at)
    if (scores.size > count) scores.pop()
  }
  // Waiting under the second bound, and narrowed by carry-over under the third.
  const waiting = new MaxHeap()
  const narrowed = new MaxHeap()
  const settleDownTo = (edge: number) => {
    for (;;) {
      const least = Math.max(edge, worstWanted())
      if (narrowed.size > 0 && narrowed.topKey >= waiting.topKey && narrowed.topKey >= least) {
        rateExactly(narrowed.pop())
      } else if (waiting.size > 0 && waiting.topKey >= least) {
        const bound = waiting.topKey
        const at = waiting.pop()
        const again = scoreBound(packed, at, tables, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY)
        // Where rounding could tip the load the bound stands, and there are no demands to compare.
        narrowed.push(again === Number.POSITIVE_INFINITY ? bound : again * carryOverBound(tables), at)
      } else return
    }
  }
  for (let bin = 0; bin + 1 < edges.length; bin++) {
    const most = upperEdge(bin)
    // Nothing from here on can beat what stands above this bin.
    settleDownTo(most)
    const worst = worstWanted()
    if (most < worst) break
    for (let i = edges[bin]!; i < edges[bin + 1]!; i++) {
      const at = order[i]!
      const bound = scoreBound(packed, at, tables, most, worst)
      if (bound >= worst && bound >= 0) waiting.push(bound, at)
    }
  }
  settleDownTo(Number.NEGATIVE_INFINITY)
  return rows.sort(bestFirst)
}

/** Largest first bound in a bin; bins run from the best down. */
const upperEdge = (bin: number): number => (100 * (BINS - bin)) / BINS + 1e-3

/** Indices in descending bins of the first bound, what cannot be offered left away; a counting sort. */
export function sortByFirstBound(
  context: RankContext,
  packed: PackedCatalogue,
  spread: number,
): { order: Uint32Array; edges: Uint32Array } {
  const { request, ruleSet, originalDrive } = context
  const group = TARGET_GROUP_NAMES.indexOf(request.target)
  const potentials = packed.potential[group]!
  const reaches = packed.reach[group]!
  const { leastTargetDrive } = ruleSet.score
  const highest = SKILL_GRADES.indexOf(request.athlete.skill)
  const standard = Math.max(originalDrive, leastTargetDrive.value)
  const { coordination, skill } = packed
  const calmest = calmOf(0, request.intent, ruleSet)
  const slope = (calmOf(100, request.intent, ruleSet) - calmest) / 100
  const least = leastTargetDrive.value - 1e-9
  const skipped = considersOriginal(context) ? -1 : (packed.positions.get(request.original.id) ?? -1)
  const binOf = new Int16Array(packed.count)
  const edges = new Uint32Array(BINS + 1)
  for (let index = 0; index < packed.count; index++) {
    const potential = Math.min(potentials[index]!, reaches[index]! * spread)
    if (skill[index]! > highest || potential < least || index === skipped) {
      binOf[index] = -1
      continue
    }
    // calmOf is a straight line.
    const first = (calmest + slope * coordination[index]!) * Math.min(1, potential / standard)
    const bin = Math.min(BINS - 1, Math.max(0, Math.floor((1 - first) * BINS)))
    binOf[index] = bin
    edges[bin + 1]!++
  }
  for (let bin = 0; bin < BINS; bin++) edges[bin + 1]! += edges[bin]!
  const next = edges.slice()
  const order = new Uint32Array(edges[BINS]!)
  for (let index = 0; index < packed.count; index++) {
    const bin = binOf[index]!
    if (bin >= 0) order[next[bin]!++] = index
  }
  return { order, edges }
}
