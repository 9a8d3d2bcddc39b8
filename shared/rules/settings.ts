import type { ExerciseDocument } from '../contract/exercise'
import type { Equipment, LoadSteps } from '../contract/place'
import type { RuleSet } from '../contract/rule-set'
import { LIMITS } from '../contract/limits'
import { roundToSteps } from './load-steps'
import type { Place } from './types'

/** The loads an exercise can be set to at a place, kg as mechanics reads them (assistance is negative). */
export interface Settings {
  kind: ExerciseDocument['load']['kind']
  lightest: number
  heaviest: number
  /** Settings above body weight alone, or of assistance as positive amounts; null when there are none. */
  steps: LoadSteps | null
}

/** The heaviest setting not above a load; null below the lightest. */
export function roundLoad({ kind, steps }: Settings, load: number): number | null {
  if (kind === 'assistance') return steps && roundToSteps(load, steps, 'assistance')
  if (kind === 'external') return steps && roundToSteps(load, steps, 'load')
  if (load < 0) return null
  return kind === 'added' && steps ? (roundToSteps(load, steps, 'load') ?? 0) : 0
}

/** The set of equipment the place can serve an exercise with; null when it cannot. */
export function equipmentAt(document: ExerciseDocument, place: Place | null): readonly Equipment[] | null {
  if (place === null) return document.equipment
  const ways = [document.equipment, ...(document.orEquipment ?? [])]
  return ways.find((way) => way.every((item) => place.equipment.has(item))) ?? null
}

/** What the place lacks of the exercise's first set of equipment. */
export const lacking = (document: ExerciseDocument, place: Place): Equipment[] =>
  document.equipment.filter((item) => !place.equipment.has(item))

function stepsAt(document: ExerciseDocument, place: Place | null, equipment: readonly Equipment[]): LoadSteps | null {
  if (place === null) return null
  const from = document.load.from
  const own = from === undefined ? null : place.equipment.get(from)
  if (own) return own
  for (const item of equipment) {
    const steps = place.equipment.get(item)
    if (steps) return steps
  }
  return null
}

/**
 * How an exercise can be loaded with given equipment: its own bounds, cut to what the place's steps reach.
 * Null when the place's steps lie outside the exercise's bounds.
 */
export function settingsOf(
  document: ExerciseDocument,
  place: Place | null,
  equipment: readonly Equipment[],
  ruleSet: RuleSet,
): Settings | null {
  const { kind, from } = document.load
  const step = ruleSet.dose.fallbackStep.value
  const most = document.load.most ?? LIMITS.load.max
  if (kind === 'none') return { kind, lightest: 0, heaviest: 0, steps: null }
  const found = stepsAt(document, place, equipment)
  if (kind === 'added') {
    // What adds the load may be missing where the exercise itself is possible.
    const canAdd = place === null || from === undefined || place.equipment.has(from)
    const steps = canAdd ? cut(found ?? { first: step, step, last: most }, document.load.least ?? 0, most) : null
    return { kind, lightest: 0, heaviest: steps?.last ?? 0, steps }
  }
  if (kind === 'assistance') {
    const range = [document.load.least, document.load.most].filter((load) => load !== undefined).map(Math.abs)
    const least = range.length === 2 ? Math.min(...range) : 0
    const limit = range.length === 0 ? -LIMITS.load.min : Math.max(...range)
    const steps = cut(found ?? { first: Math.max(least, step), step, last: limit }, least, limit)
    if (!steps) return null
    return { kind, lightest: -steps.last, heaviest: -steps.first, steps }
  }
  const least = document.load.least ?? 0
  const steps = cut(found ?? { first: least > 0 ? least : step, step, last: most }, least, most)
  if (!steps) return null
  return { kind, lightest: steps.first, heaviest: steps.last, steps }
}

/** Steps cut to bounds, still on their own grid; null when none is left. */
function cut(steps: LoadSteps, least: number, most: number): LoadSteps | null {
  const { first, step, last } = steps
  const skip = Math.max(0, Math.ceil((least - first) / step - 1e-9))
  const start = first + skip * step
  const count = Math.floor((Math.min(last, most) - start) / step + 1e-9)
  return count < 0 ? null : { first: start, step, last: start + count * step }
}
