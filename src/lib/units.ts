import type { Me } from '#shared/contract/me'

export type Units = Me['units']

/** International avoirdupois pound and inch, exact by definition (1959). */
const KG_PER_LB = 0.45359237
const M_PER_INCH = 0.0254
const INCHES_PER_FOOT = 12

export const kgToLb = (kg: number): number => kg / KG_PER_LB
export const lbToKg = (lb: number): number => lb * KG_PER_LB
export const massUnit = (units: Units): 'kg' | 'lb' => (units === 'metric' ? 'kg' : 'lb')

const roundTo = (value: number, step: number) => Math.round(value / step) * step

/** A load or a body mass in the person’s unit, to the tenth; pounds of a load to the half. */
export const massIn = (units: Units, kg: number, step = units === 'metric' ? 0.01 : 0.5): number =>
  Number(roundTo(units === 'metric' ? kg : kgToLb(kg), step).toFixed(2))

/** From the person’s unit to kg, to the gram that scales and plates can tell. */
export const massFrom = (units: Units, value: number): number =>
  Number((units === 'metric' ? value : lbToKg(value)).toFixed(3))

export interface FeetAndInches {
  feet: number
  inches: number
}

/** Stature in whole inches, carried over so that 11.6 in never shows as 12. */
export function metresToFeet(metres: number): FeetAndInches {
  const total = Math.round(metres / M_PER_INCH)
  return { feet: Math.floor(total / INCHES_PER_FOOT), inches: total % INCHES_PER_FOOT }
}

export const feetToMetres = ({ feet, inches }: FeetAndInches): number =>
  Number(((feet * INCHES_PER_FOOT + inches) * M_PER_INCH).toFixed(4))
export const metresToCentimetres = (metres: number): number => Number((metres * 100).toFixed(1))
export const centimetresToMetres = (centimetres: number): number => Number((centimetres / 100).toFixed(3))
