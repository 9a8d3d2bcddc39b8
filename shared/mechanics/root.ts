/** Steps between samples when looking for the sign change nearest 0. */
const STEP = 3
/** A value this small is a root: far below what any body or any drawing could show. */
const NOTHING = 1e-13

/** Where a root was found, or the sample that came nearest to one. */
export type RootSearch = { root: number } | { best: number; miss: number }

/**
 * Root nearest 0 of a smooth function within a range around 0, by stepping outward on both sides and then closing in.
 * @param atZero the function's value at 0, known already
 */
export function findRoot(f: (x: number) => number, [low, high]: readonly [number, number], atZero: number): RootSearch {
  if (Math.abs(atZero) < NOTHING) return { root: 0 }
  let best = { best: 0, miss: Math.abs(atZero) }
  const walk = (end: number, sign: 1 | -1) => {
    let [x, value] = [0, atZero]
    return (): number | undefined => {
      if (x === end) return undefined
      const next = sign * Math.min(sign * end, sign * x + STEP)
      const there = f(next)
      if (value * there <= 0) return closeIn(f, [x, value], [next, there])
      if (Math.abs(there) < best.miss) best = { best: next, miss: Math.abs(there) }
      x = next
      value = there
      return undefined
    }
  }
  const steps = [walk(high, 1), walk(low, -1)]
  for (let reached = 0; reached < Math.max(high, -low); reached += STEP) {
    const roots = steps.map((step) => step()).filter((root) => root !== undefined)
    if (roots.length > 0) return { root: roots.reduce((a, c) => (Math.abs(c) < Math.abs(a) ? c : a)) }
  }
  return best
}

type Sample = readonly [x: number, value: number]

/** Illinois false position between two samples of different sign: as sure as bisection, a few steps where f is nearly straight. */
function closeIn(f: (x: number) => number, from: Sample, to: Sample): number {
  let [a, fa] = from
  let [b, fb] = to
  let kept = 0
  for (let i = 0; i < 100 && Math.abs(b - a) > 1e-13; i++) {
    const middle = fa === fb ? (a + b) / 2 : (a * fb - b * fa) / (fb - fa)
    const value = f(middle)
    if (Math.abs(value) < NOTHING) return middle
    if (value * fb > 0) {
      b = middle
      fb = value
      if (kept === -1) fa /= 2
      kept = -1
    } else {
      a = middle
      fa = value
      if (kept === 1) fb /= 2
      kept = 1
    }
  }
  return Math.abs(fa) < Math.abs(fb) ? a : b
}
