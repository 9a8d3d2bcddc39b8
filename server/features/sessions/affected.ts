import { affectedBy, averageAdult, type Affected } from '#shared/rules/index'
import { toAthlete } from '../athletes/engine-athlete'
import type { CatalogueEdition } from '../exercises/catalogue-edition'
import type { DayRow, SlotJson } from './repository'

/**
 * What the standing sore joints mean for whatever is to be done in each slot, by slot id; the worst joint first.
 * An athlete without a body profile is taken for an average adult: a warning with an estimate is better than none.
 */
export function affectedSlots(
  { sore, profile, session }: Pick<DayRow, 'sore' | 'profile' | 'session'>,
  edition: CatalogueEdition,
  now: Date,
): Map<string, Affected[]> {
  if (sore.length === 0 || session === null) return new Map()
  const athlete = profile === null ? averageAdult('unspecified', edition.ruleSet) : toAthlete(profile, now)
  const affected = (slot: SlotJson): Affected[] => {
    const standing = slot.swap ?? { exercise: slot.exercise, dose: slot.planned }
    const candidate = edition.find(athlete.sex, standing.exercise.id)
    return candidate === null ? [] : affectedBy(candidate, standing.dose, athlete, sore, edition.ruleSet)
  }
  return new Map(session.slots.map((slot) => [slot.id, affected(slot)]))
}
