import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { roundToSteps } from '#shared/rules/index'

const steps = fc
  .record({
    first: fc.constantFrom(0, 1, 2.5, 5, 20),
    step: fc.constantFrom(0.5, 1, 1.25, 2.5, 5, 7.5, 0.1),
    count: fc.integer({ min: 0, max: 60 }),
  })
  .map(({ first, step, count }) => ({ first, step, last: first + step * count }))
const load = fc.double({ min: -50, max: 400, noNaN: true })

describe('rounding to what a place has', () => {
  it('takes the heaviest setting that is not above the load', () => {
    const stack = { first: 5, step: 2.5, last: 60 }
    expect(roundToSteps(17.4, stack, 'load')).toBe(15)
    expect(roundToSteps(17.5, stack, 'load')).toBe(17.5)
    expect(roundToSteps(999, stack, 'load')).toBe(60)
    expect(roundToSteps(4.9, stack, 'load')).toBeNull()
  })

  it('takes more assistance, never less, and says when there is not enough', () => {
    const bands = { first: 5, step: 5, last: 40 }
    expect(roundToSteps(-11, bands, 'assistance')).toBe(-15)
    expect(roundToSteps(-15, bands, 'assistance')).toBe(-15)
    expect(roundToSteps(3, bands, 'assistance')).toBe(-5)
    expect(roundToSteps(-41, bands, 'assistance')).toBeNull()
  })

  it('never goes above the load, and not more than a step below it', () => {
    fc.assert(
      fc.property(load, steps, fc.constantFrom('load' as const, 'assistance' as const), (wanted, grid, kind) => {
        const set = roundToSteps(wanted, grid, kind)
        if (set === null) return
        expect(set).toBeLessThanOrEqual(wanted + 1e-6)
        const limit = kind === 'load' ? grid.last : -grid.first
        if (wanted <= limit) expect(set).toBeGreaterThan(wanted - grid.step - 1e-6)
      }),
    )
  })

  it('is monotone: less load wanted is never more load set', () => {
    fc.assert(
      fc.property(load, load, steps, fc.constantFrom('load' as const, 'assistance' as const), (a, b, grid, kind) => {
        const less = roundToSteps(Math.min(a, b), grid, kind)
        const more = roundToSteps(Math.max(a, b), grid, kind)
        if (less !== null && more !== null) expect(less).toBeLessThanOrEqual(more)
      }),
    )
  })
})
