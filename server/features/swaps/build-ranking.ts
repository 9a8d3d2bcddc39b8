import { createHash } from 'node:crypto'
import type { Guidance } from '#shared/mechanics/vocabulary'
import { LIMITS } from '#shared/contract/limits'
import type { LeftOutRow, Ranking } from '#shared/contract/swap'
import { rank, type Athlete, type Candidate, type Place } from '#shared/rules/index'
import { AppError, notFound } from '../../errors'
import { toAthlete } from '../athletes/engine-athlete'
import type { CatalogueEdition } from '../exercises/catalogue-edition'
import { presentExerciseName } from '../exercises/present'
import type { RankingInputs } from './ranking-inputs'

/** What the reader wants left away from the table. */
export interface RankingFilters {
  guidance?: Guidance
  /** 0–100 */
  maxCoordination?: number
}

/** Changes when the same inputs would no longer give the same bytes for another reason than rules or catalogue. */
const FORMAT = 2

/**
 * Stands for every input of a ranking: whoever sends it back has seen exactly the table that would be made now.
 * Age counts only as being a minor, so that a table does not go stale at midnight.
 */
export function fingerprintOf(inputs: RankingInputs, filters: RankingFilters, now: Date): string {
  const { athlete, profile, sore, place, wanted, revision, ruleSetVersion } = inputs
  const { guidance = null, maxCoordination = null } = filters
  const everything = [
    FORMAT,
    ruleSetVersion,
    revision,
    athlete.id,
    athlete.name,
    toAthlete(profile, now),
    sore,
    place,
    wanted,
    guidance,
    maxCoordination,
  ]
  return createHash('sha256').update(JSON.stringify(everything)).digest('base64url')
}

const toPlace = (place: RankingInputs['place']): Place | null =>
  place === null ? null : { id: place.id, equipment: new Map(place.equipment.map(({ kind, steps }) => [kind, steps])) }

const passes = (candidate: Candidate, { guidance, maxCoordination }: RankingFilters) =>
  (guidance === undefined || candidate.document.mechanics.guidance === guidance) &&
  (maxCoordination === undefined || candidate.coordination <= maxCoordination)

/** The table itself; the same inputs give the same answer, bit for bit. */
export function buildRanking(
  inputs: RankingInputs,
  filters: RankingFilters,
  edition: CatalogueEdition,
  now: Date,
): Ranking {
  const athlete: Athlete = toAthlete(inputs.profile, now)
  const { exerciseId, intent, target } = inputs.wanted
  const original = edition.find(athlete.sex, exerciseId)
  if (original === null) throw notFound('That exercise')
  // A hold is counted in seconds, whatever the one who asks about it called its count.
  const planned = { ...inputs.wanted.planned, unit: original.document.unit }
  const result = rank(
    {
      athlete,
      original,
      planned,
      intent,
      target,
      candidates: edition.candidates(athlete.sex).filter((candidate) => passes(candidate, filters)),
      sore: inputs.sore,
      place: toPlace(inputs.place),
    },
    edition.ruleSet,
  )
  return {
    fingerprint: fingerprintOf(inputs, filters, now),
    ruleSetVersion: edition.ruleSet.version,
    athlete: inputs.athlete,
    original: presentExerciseName(original.id, original.document),
    planned,
    intent,
    target,
    placeId: inputs.place?.id ?? null,
    ...result,
    items: result.items.slice(0, LIMITS.rankingRows.items),
    leftOut: mostTelling(result.leftOut),
  }
}

/**
 * What is left out of a long catalogue, cut to what somebody may want to read: that an exercise does not train the target
 * goes without saying, so those go first. The order by name stays.
 */
export function mostTelling(leftOut: readonly LeftOutRow[], most: number = LIMITS.rankingRows.leftOut): LeftOutRow[] {
  if (leftOut.length <= most) return [...leftOut]
  const telling = leftOut.filter(({ why }) => why !== 'targetNotTrained').slice(0, most)
  const others = leftOut.filter(({ why }) => why === 'targetNotTrained').slice(0, most - telling.length)
  const kept = new Set([...telling, ...others])
  return leftOut.filter((row) => kept.has(row))
}

/** Swaps may be taken from this table unless a red flag has emptied it. */
export function refuseRedFlag(ranking: Ranking): void {
  if (ranking.redFlags.length === 0 || ranking.items.length > 0) return
  throw new AppError('red_flag', 'There are no swaps while a red flag stands. See a clinician first.')
}
