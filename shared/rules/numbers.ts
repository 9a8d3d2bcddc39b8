/** The largest of 0 and the values, in the order given. */
export function largest(values: Iterable<number>): number {
  let most = 0
  for (const value of values) if (value > most) most = value
  return most
}

export const clamp = (value: number, least: number, most: number): number =>
  value < least ? least : value > most ? most : value

/** Straight lines between points of rising x, level outside. */
export function interpolate(points: readonly (readonly [number, number])[], x: number): number {
  const first = points[0]
  const last = points[points.length - 1]
  if (!first || !last) return 1
  if (x <= first[0]) return first[1]
  for (let i = 1; i < points.length; i++) {
    const [x0, y0] = points[i - 1]!
    const [x1, y1] = points[i]!
    if (x <= x1) return y0 + ((y1 - y0) * (x - x0)) / (x1 - x0)
  }
  return last[1]
}

/**
 * base^exponent, rounded to nine digits behind the point, so that engines whose power function differs in the last bit agree.
 */
export const power = (base: number, exponent: number): number => Math.round(Math.pow(base, exponent) * 1e9) / 1e9
