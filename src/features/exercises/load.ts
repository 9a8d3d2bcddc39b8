import type { Exercise } from '#shared/contract/exercise'

/** Loads the page offers, kg. */
export interface LoadBounds {
  least: number
  most: number
  step: number
  start: number
}

const STEP = 2.5
/** Where no upper bound is given, three times what the posture was balanced at, or this. */
const MOST = 100
/** The body the reference load is a share of when it only serves as a starting point. */
const BODY = 70

const toStep = (kg: number): number => Math.round(kg / STEP) * STEP

/** The range of loads to try an exercise at; null when it is done with body weight alone. */
export function loadBounds({ load, mechanics }: Pick<Exercise, 'load' | 'mechanics'>): LoadBounds | null {
  if (load.kind === 'none') return null
  const reference = toStep(mechanics.referenceLoad * BODY)
  if (load.kind === 'assistance') {
    const most = load.most ?? 0
    const least = load.least ?? -60
    return {
      least: Math.min(least, most),
      most: Math.max(least, most),
      step: STEP,
      start: clamp(reference, Math.min(least, most), Math.max(least, most)),
    }
  }
  const least = load.least ?? 0
  const most = load.most ?? Math.max(MOST, toStep(reference * 3))
  return { least, most, step: STEP, start: load.kind === 'added' ? least : clamp(reference, least, most) }
}

const clamp = (value: number, least: number, most: number): number => Math.min(most, Math.max(least, value))
