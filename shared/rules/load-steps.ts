import type { LoadSteps } from '../contract/place'

/**
 * The heaviest load (kg) not above `load` that the steps can be set to; null when even the first is above it.
 * Assistance comes in and out as a negative load, and is rounded to more assistance.
 */
export function roundToSteps(_load: number, _steps: LoadSteps, _kind: 'load' | 'assistance'): number | null {
  throw new Error('to be written')
}
