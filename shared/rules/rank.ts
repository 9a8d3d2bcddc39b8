import type { RuleSet } from '../contract/rule-set'
import type { LeftOutRow, SwapRow } from '../contract/swap'
import { capOfRating, otherCapOf } from './caps'
import { contextOf, type RankContext } from './context'
import { asJointStress } from './joint-stress'
import { rate, redFlagReason, shownJoints } from './rate'
import type { Candidate, RankRequest, RankResult } from './types'

/** A row before the others are known. */
export type Unranked = Omit<SwapRow, 'rank'>
const byText = (one: string, other: string): number => (one < other ? -1 : one > other ? 1 : 0)
const byName = (one: { name: string; id: string }, other: { name: string; id: string }): number =>
  byText(one.name, other.name) || byText(one.id, other.id)

/** Best score first; equal scores by name, then id, by code unit, whatever the reader's language. */
export const bestFirst = (one: Unranked, other: Unranked): number =>
  other.score - one.score || byName(one.exercise, other.exercise)

/** The original as planned, with the stresses and caps it meets; null when it is beyond current strength. */
function originalRow(context: RankContext): RankResult['originalRow'] {
  const { original, request } = context
  const { candidate, limiter, load } = original
  const { document } = candidate
  if (limiter === null || limiter.demand > 1) return null
  return {
    exercise: {
      id: candidate.id,
      slug: document.slug,
      name: document.name,
      versionId: candidate.versionId,
      guidance: document.mechanics.guidance,
      supports: [...document.mechanics.supports],
    },
    targetDrive: context.originalDrive,
    limiter: limiter.action,
    joints: shownJoints(original.strains, context, load).map(asJointStress),
    coordination: candidate.coordination,
    dose: { ...request.planned },
  }
}

/**
 * Whether the original may stand among its own swaps: only when it loads a sore joint, with the dose that fits under the caps,
 * so that it can be compared with what would spare the joint. A dose that comes out as planned is no swap and is dropped.
 */
export function considersOriginal(context: RankContext): boolean {
  const { original, ruleSet } = context
  return shownJoints(original.strains, context, original.load).some(
    ({ cap, stress }) => cap !== null && stress >= ruleSet.caps.loadedFrom.value,
  )
}

/** The candidates a ranking looks at. */
function consideredIn(context: RankContext): readonly Candidate[] {
  const { candidates, original } = context.request
  return considersOriginal(context) ? candidates : candidates.filter(({ id }) => id !== original.id)
}

/** Whether a row only repeats the original as planned. */
export const repeatsOriginal = (
  { exercise, dose }: Unranked,
  { request: { original, planned } }: RankContext,
): boolean => exercise.id === original.id && dose.load === planned.load && dose.repetitions === planned.repetitions

/** Puts rows and left-outs in their order and adds what the page needs to know about the athlete. */
export function resultOf(context: RankContext, rows: Unranked[], leftOut: LeftOutRow[]): RankResult {
  const { request, ruleSet, sore, flagged } = context
  return {
    originalRow: originalRow(context),
    estimated: Object.keys(request.athlete.factors).length === 0,
    minor: request.athlete.minor,
    sore: sore.map((report) => ({
      soreJointId: report.soreJointId,
      joint: report.joint,
      side: report.side,
      rating: report.rating,
      provocations: [...report.provocations],
      cap: capOfRating(report, ruleSet),
      otherCap: otherCapOf(report, ruleSet),
    })),
    redFlags: flagged.map(({ soreJointId, joint, side, redFlags }) => ({
      soreJointId,
      joint,
      side,
      flags: redFlags.length > 0 ? [...redFlags] : ['severePain'],
      urgent: redFlags.some((flag) => ruleSet.caps.urgentFlags.value.includes(flag)),
    })),
    items: [...rows].sort(bestFirst).map(({ exercise, ...row }, index) => ({ exercise, rank: index + 1, ...row })),
    leftOut: [...leftOut].sort((one, other) => byName(one.exercise, other.exercise)),
  }
}

/** Nothing is offered: the original or the target works across a red-flagged joint. */
export function stopped(context: RankContext): RankResult | null {
  const { stop } = context
  if (stop === null) return null
  const reason = redFlagReason(stop)
  return resultOf(
    context,
    [],
    consideredIn(context).map(({ id, document: { slug, name } }) => ({
      exercise: { id, slug, name },
      why: 'redFlag',
      reason,
    })),
  )
}

/**
 * Ranks swaps for the original: rows best first with dose, stresses, score, factors and reason, and everything left out by
 * name with its reason. Pure: the same request and rule set give the same answer bit for bit, whatever the order of the
 * candidates.
 */
export function rank(request: RankRequest, ruleSet: RuleSet): RankResult {
  const context = contextOf(request, ruleSet)
  const nothing = stopped(context)
  if (nothing !== null) return nothing
  const rows: Unranked[] = []
  const leftOut: LeftOutRow[] = []
  for (const candidate of consideredIn(context)) {
    const rated = rate(candidate, context)
    if ('row' in rated) {
      if (!repeatsOriginal(rated.row, context)) rows.push(rated.row)
    } else leftOut.push(rated.leftOut)
  }
  return resultOf(context, rows, leftOut)
}
