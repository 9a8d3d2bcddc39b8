import type { Effort } from './efforts'
import type { Action } from '../mechanics/vocabulary'

/** The loads (kg) that respect a set of bounds: an interval, empty when least > most. */
export interface LoadRange {
  least: number
  most: number
}

export const EVERY_LOAD: Readonly<LoadRange> = { least: Number.NEGATIVE_INFINITY, most: Number.POSITIVE_INFINITY }

/**
 * Cuts a range by one bound, constant + slope·L ≤ limit. Interval arithmetic: a bound that L cannot change leaves all or nothing.
 * @returns whether the bound set a new upper end
 */
export function cutRange(range: LoadRange, constant: number, slope: number, limit: number): boolean {
  if (slope === 0) {
    if (constant <= limit) return false
    range.least = Number.POSITIVE_INFINITY
    range.most = Number.NEGATIVE_INFINITY
    return true
  }
  const edge = (limit - constant) / slope
  if (slope > 0) {
    if (edge >= range.most) return false
    range.most = edge
    return true
  }
  if (edge > range.least) range.least = edge
  return false
}

/** The loads at which every action stays at or below a share of its strength, and the action that sets the upper end. */
export function strengthRange(efforts: readonly Effort[], share: number): LoadRange & { mostBy: Action | null } {
  const range = { ...EVERY_LOAD, mostBy: null as Action | null }
  for (const { alpha, beta, positive, negative, strengthPositive, strengthNegative } of efforts) {
    if (positive !== null && cutRange(range, alpha, beta, share * strengthPositive)) range.mostBy = positive
    if (negative !== null && cutRange(range, -alpha, -beta, share * strengthNegative)) range.mostBy = negative
  }
  return range
}
