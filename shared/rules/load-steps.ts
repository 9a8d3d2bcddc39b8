import type { LoadSteps } from '../contract/place'

/** Differences below this many steps are rounding of the numbers, not of the plates. */
const SLACK = 1e-9

/**
 * The heaviest setting (kg) not above `load`; null when even the first setting is above it.
 * Assistance comes in and goes out as a negative load and is rounded to more assistance, which is less load;
 * null when even the most assistance is too little.
 */
export function roundToSteps(load: number, steps: LoadSteps, kind: 'load' | 'assistance'): number | null {
  const { first, step, last } = steps
  const settings = Math.floor((last - first) / step + SLACK)
  if (kind === 'load') {
    const index = Math.floor((load - first) / step + SLACK)
    return index < 0 ? null : tidy(first + Math.min(index, settings) * step)
  }
  const index = Math.max(0, Math.ceil((-load - first) / step - SLACK))
  return index > settings ? null : -tidy(first + index * step)
}

/** Removes the dust of binary fractions, so that 0.1 + 0.2 plates read 0.3. */
const tidy = (load: number): number => Math.round(load * 1e6) / 1e6
