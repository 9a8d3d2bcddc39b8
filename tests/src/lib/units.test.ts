import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { LIMITS } from '#shared/contract/limits'
import { feetToMetres, kgToLb, lbToKg, massFrom, massIn, metresToFeet } from '@/lib/units'

describe('units', () => {
  it('uses the exact definitions: 1 lb = 0.45359237 kg, 1 in = 0.0254 m (international yard and pound agreement, 1959, M-h)', () => {
    expect(lbToKg(1)).toBe(0.45359237)
    expect(feetToMetres({ feet: 6, inches: 0 })).toBe(1.8288)
  })

  it('pounds and kilograms undo each other', () =>
    fc.assert(
      fc.property(fc.double({ min: 0, max: 600, noNaN: true }), (kg) => Math.abs(lbToKg(kgToLb(kg)) - kg) < 1e-9),
    ))

  it('never shows twelve inches, and stays within half an inch of the stature', () =>
    fc.assert(
      fc.property(fc.double({ ...LIMITS.stature, noNaN: true }), (metres) => {
        const shown = metresToFeet(metres)
        return shown.inches >= 0 && shown.inches < 12 && Math.abs(feetToMetres(shown) - metres) <= 0.0128
      }),
    ))

  it('shows a body mass that was typed as it was typed', () =>
    fc.assert(
      fc.property(
        fc.integer({ min: 600, max: 6000 }),
        (tenths) => massIn('imperial', massFrom('imperial', tenths / 10), 0.1) === tenths / 10,
      ),
    ))
})
