import type { FieldErrors } from 'react-hook-form'
import { LIMITS } from '#shared/contract/limits'
import { bodyProfile, type BodyProfile } from '#shared/contract/me'
import {
  centimetresToMetres,
  feetToMetres,
  massFrom,
  massIn,
  massUnit,
  metresToCentimetres,
  metresToFeet,
  type Units,
} from '@/lib/units'

/** The body profile as it is typed, in the person’s own units. */
export interface BodyFormValues {
  sex: BodyProfile['sex'] | ''
  mass: string
  centimetres: string
  feet: string
  inches: string
  birthDate: string
}

const MASS_STEP = 0.1

export function toValues(body: BodyProfile | null, units: Units): BodyFormValues {
  if (body === null) return { sex: '', mass: '', centimetres: '', feet: '', inches: '', birthDate: '' }
  const { feet, inches } = metresToFeet(body.stature)
  return {
    sex: body.sex,
    mass: String(massIn(units, body.bodyMass, MASS_STEP)),
    centimetres: String(metresToCentimetres(body.stature)),
    feet: String(feet),
    inches: String(inches),
    birthDate: body.birthDate,
  }
}

/** A decimal comma is as good as a point; nothing typed is not zero. */
const number = (text: string): number => (text.trim() === '' ? Number.NaN : Number(text.replace(',', '.')))

/** What is typed, in the contract’s units. A value shown again unchanged stays what it was, without rounding drift. */
export function toProfile(values: BodyFormValues, units: Units, before: BodyProfile | null): unknown {
  const shown = toValues(before, units)
  const sameStature =
    units === 'metric'
      ? values.centimetres === shown.centimetres
      : values.feet === shown.feet && values.inches === shown.inches
  const stature =
    units === 'metric'
      ? centimetresToMetres(number(values.centimetres))
      : feetToMetres({ feet: number(values.feet), inches: values.inches.trim() === '' ? 0 : number(values.inches) })
  return {
    sex: values.sex,
    bodyMass: before !== null && values.mass === shown.mass ? before.bodyMass : massFrom(units, number(values.mass)),
    stature: before !== null && sameStature ? before.stature : stature,
    birthDate: values.birthDate,
  }
}

const bodyMassLimits = (units: Units) => {
  const [least, most] = [LIMITS.bodyMass.min, LIMITS.bodyMass.max].map((kg) => Math.round(massIn(units, kg, MASS_STEP)))
  return `Enter a body mass from ${least} to ${most} ${massUnit(units)}.`
}
const statureLimits = (units: Units) => {
  if (units === 'metric')
    return `Enter a height from ${metresToCentimetres(LIMITS.stature.min)} to ${metresToCentimetres(LIMITS.stature.max)} cm.`
  const [least, most] = [LIMITS.stature.min, LIMITS.stature.max].map(metresToFeet)
  return `Enter a height from ${least!.feet} ft ${least!.inches} in to ${most!.feet} ft ${most!.inches} in.`
}

type Checked =
  | { values: BodyProfile; errors: Record<string, never> }
  | { values: Record<string, never>; errors: FieldErrors<BodyFormValues> }

/** The contract decides what is valid; the words are in the person’s units. */
export function checkBody(values: BodyFormValues, units: Units, before: BodyProfile | null, today: string): Checked {
  const parsed = bodyProfile.safeParse(toProfile(values, units, before))
  if (parsed.success && parsed.data.birthDate <= today) return { values: parsed.data, errors: {} }
  const wrong = new Set(parsed.success ? ['birthDate'] : parsed.error.issues.map(({ path }) => path[0]))
  const statureField = units === 'metric' ? 'centimetres' : 'feet'
  return {
    values: {},
    errors: {
      ...(wrong.has('sex') && { sex: { type: 'value', message: 'Choose one.' } }),
      ...(wrong.has('bodyMass') && { mass: { type: 'value', message: bodyMassLimits(units) } }),
      ...(wrong.has('stature') && { [statureField]: { type: 'value', message: statureLimits(units) } }),
      ...(wrong.has('birthDate') && { birthDate: { type: 'value', message: 'Enter your date of birth.' } }),
    },
  }
}
