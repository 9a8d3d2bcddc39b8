import { MechanicsError } from './errors'
import { safeAcos } from './vector'

interface TwoLinks {
  first: number
  second: number
}

/**
 * How two links span a distance: `fold` between their directions, `atFirst` between the first link and the line to the end (radians).
 * @throws MechanicsError unreachable_endpoint when they cannot span it
 */
export function foldAngle(
  { first, second }: TwoLinks,
  distance: number,
  field: string,
): { fold: number; atFirst: number } {
  if (distance > first + second || distance < Math.abs(first - second)) {
    throw new MechanicsError(
      'unreachable_endpoint',
      field,
      `This place is ${distance.toFixed(3)} of stature away; the limb spans ${Math.abs(first - second).toFixed(3)} to ${(first + second).toFixed(3)}. Move it into reach.`,
    )
  }
  return {
    fold: Math.PI - safeAcos((first * first + second * second - distance * distance) / (2 * first * second)),
    atFirst: safeAcos((first * first + distance * distance - second * second) / (2 * first * distance)),
  }
}

/** The same angle in degrees within (−180, 180]. */
export const turn = (angle: number): number => angle - 360 * Math.ceil((angle - 180) / 360)
