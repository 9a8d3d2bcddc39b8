import { SOLVABLE } from './contacts'
import type { ExerciseMechanics } from './definition'
import { MechanicsError } from './errors'

function finite(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value)
  if (typeof value !== 'object' || value === null) return true
  for (const key in value) if (!finite((value as Record<string, unknown>)[key])) return false
  return true
}

/**
 * Refuses the first number that is not finite, anywhere inside a value.
 * @param field dotted path of the value
 * @throws MechanicsError bad_number with the number's own path, or with `field` when `message` is given
 */
export function checkNumbers(value: unknown, field: string, message?: string): void {
  if (finite(value)) return
  if (message !== undefined) throw new MechanicsError('bad_number', field, message)
  if (typeof value === 'number') throw new MechanicsError('bad_number', field, 'Give a finite number.')
  // Only now is it worth knowing where.
  for (const [key, inner] of Object.entries(value as object))
    checkNumbers(inner, field === '' ? key : `${field}.${key}`)
}

const refuse = (field: string, message: string): never => {
  throw new MechanicsError('unsupported_combination', field, message)
}

/**
 * Refuses what no posture could mend, before anything is placed.
 * @throws MechanicsError bad_number, wrong_frame_count, wrong_curve_length, unsupported_combination
 */
export function checkDefinition(mechanics: ExerciseMechanics): void {
  checkNumbers(mechanics, '')
  const { frames, moments, supports, balance } = mechanics
  if (frames.length < 2 || frames.length > 4) {
    throw new MechanicsError('wrong_frame_count', 'frames', 'Give two to four postures.')
  }
  moments?.forEach(({ curve }, index) => {
    if (curve && curve.length !== frames.length) {
      const message = `Give one factor per posture: ${frames.length}.`
      throw new MechanicsError('wrong_curve_length', `moments.${index}.curve`, message)
    }
  })
  checkSupports(supports)
  if (mechanics.sides === 'both') checkBothSides(mechanics)
  if (balance?.range) {
    const [low, high] = balance.range
    if (!(low <= 0 && high >= 0 && low >= -180 && high <= 180)) {
      const message = 'The range is a change from the authored angle: from −180 to 0, and from 0 to 180.'
      throw new MechanicsError('bad_number', 'balance.range', message)
    }
  }
}

function checkSupports(supports: ExerciseMechanics['supports']): void {
  if (supports.length === 0) refuse('supports', 'Say where the body bears.')
  if (new Set(supports).size < supports.length) refuse('supports', 'Name each support once.')
  if (supports.length > 2 && supports.every((support) => SOLVABLE.includes(support))) {
    refuse('supports', 'Statics can share weight between two supports at most.')
  }
}

/** The idle limbs belong to one-sided exercises: beside two working sides they would be drawn, and counted nowhere. */
function checkBothSides({ supports, frames, loads }: ExerciseMechanics): void {
  const message = 'An idle hand or foot belongs to a one-sided exercise: set the sides to one at a time.'
  const support = supports.findIndex((each) => each === 'offHand' || each === 'offFoot')
  if (support >= 0) refuse(`supports.${support}`, message)
  frames.forEach((frame, index) => {
    if (frame.offArm) refuse(`frames.${index}.offArm`, message)
    if (frame.offLeg) refuse(`frames.${index}.offLeg`, message)
  })
  loads.forEach((load, index) => {
    if (load.at === 'offHand') refuse(`loads.${index}.at`, message)
  })
}
