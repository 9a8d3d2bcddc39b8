import type { Vector } from './solution'

/** Small 3D vector algebra; every function returns a new vector. */
export const ZERO: Vector = [0, 0, 0]
export const add = (a: Vector, b: Vector): Vector => [a[0] + b[0], a[1] + b[1], a[2] + b[2]]
export const subtract = (a: Vector, b: Vector): Vector => [a[0] - b[0], a[1] - b[1], a[2] - b[2]]
export const scale = (a: Vector, factor: number): Vector => [a[0] * factor, a[1] * factor, a[2] * factor]
export const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
export const cross = (a: Vector, b: Vector): Vector => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
]
export const length = (a: Vector): number => Math.hypot(a[0], a[1], a[2])
/** Unit vector along `a`; the zero vector stays zero. */
export const unit = (a: Vector): Vector => {
  const size = length(a)
  return size === 0 ? ZERO : [a[0] / size, a[1] / size, a[2] / size]
}
export const mean = (vectors: readonly Vector[]): Vector => scale(vectors.reduce(add, ZERO), 1 / vectors.length)
/** Point a share `t` of the way from `a` to `b`. */
export const between = (a: Vector, b: Vector, t: number): Vector => add(a, scale(subtract(b, a), t))

export const radians = (degrees: number): number => (degrees * Math.PI) / 180
export const degrees = (angle: number): number => (angle * 180) / Math.PI
/** Arc cosine that forgives rounding just outside [−1, 1]. */
export const safeAcos = (value: number): number => Math.acos(Math.min(1, Math.max(-1, value)))
/** The direction at angle θ in the plane spanned by the unit vectors p (θ = 0) and q (θ = 90°). */
export const inPlane = (p: Vector, q: Vector, angle: number): Vector =>
  add(scale(p, Math.cos(angle)), scale(q, Math.sin(angle)))
