import type { Effort } from './efforts'
import type { Action } from '../mechanics/vocabulary'

/** value(L) = constant + slope·L must not pass `limit`. */
export interface Bound {
  constant: number
  slope: number
  limit: number
}

/** The loads (kg) that respect every bound: an interval, empty when least > most. */
export interface LoadRange<B extends Bound = Bound> {
  least: number
  most: number
  /** Which bound sets the upper end, or makes the range empty whatever the load. */
  mostBy: B | null
}

/** Interval arithmetic over affine bounds: each one cuts the line of loads once. */
export function loadRange<B extends Bound>(bounds: Iterable<B>): LoadRange<B> {
  let least = Number.NEGATIVE_INFINITY
  let most = Number.POSITIVE_INFINITY
  let mostBy: B | null = null
  for (const bound of bounds) {
    const { constant, slope, limit } = bound
    if (slope === 0) {
      if (constant > limit) return { least: Number.POSITIVE_INFINITY, most: Number.NEGATIVE_INFINITY, mostBy: bound }
      continue
    }
    const edge = (limit - constant) / slope
    if (slope > 0) {
      if (edge < most) {
        most = edge
        mostBy = bound
      }
    } else if (edge > least) least = edge
  }
  return { least, most, mostBy }
}

/** Bounds that keep every action at or below a share of its strength. */
export function* strengthBounds(
  efforts: readonly Effort[],
  share: number,
): Generator<Bound & { action: Action; frame: number }> {
  for (const { alpha, beta, positive, negative, strengthPositive, strengthNegative, frame } of efforts) {
    if (positive) {
      yield { constant: alpha, slope: beta, limit: share * strengthPositive, action: positive, frame }
    }
    if (negative) {
      yield { constant: -alpha, slope: -beta, limit: share * strengthNegative, action: negative, frame }
    }
  }
}
