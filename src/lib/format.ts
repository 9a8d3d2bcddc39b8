import { format, formatDistanceStrict, parseISO } from 'date-fns'
import type { Dose } from '#shared/contract/session'
import type { ExerciseDocument, JointStress } from '#shared/contract/exercise'
import { massIn, massUnit, type Units } from './units'
import { capitalise, jointWords } from './words'

/** Keeps a number and its unit on one line. */
const NBSP = '\u00a0'

export const formatPercent = (share: number): string => `${Math.round(share * 100)}${NBSP}%`

/** A load in the person’s unit; assistance is told without its sign. */
export const formatLoad = (kg: number, units: Units): string =>
  `${massIn(units, Math.abs(kg))}${NBSP}${massUnit(units)}`

/**
 * What is on the bar or the belt: “+ 5 kg” when it is added to the body, “20 kg of assistance” when it takes weight off,
 * “2 × 18 kg” for a pair. Null for body weight alone.
 */
export function formatDoseLoad(dose: Dose, units: Units, kind?: ExerciseDocument['load']['kind']): string | null {
  if (dose.load === null || (dose.load === 0 && kind !== 'external')) return null
  const load = formatLoad(dose.load, units)
  if (dose.load < 0) return `${load} of assistance`
  if (dose.pieces > 1) return `${dose.pieces}${NBSP}×${NBSP}${load}`
  return kind === 'added' ? `+${NBSP}${load}` : load
}

/** “4 × 6 at RIR 2”, “5 × 8 s”: repetitions in reserve mean nothing for a timed hold. */
export function formatSets(dose: Dose): string {
  const sets = `${dose.sets}${NBSP}×${NBSP}${dose.repetitions}`
  return dose.unit === 'seconds' ? `${sets}${NBSP}s` : `${sets} at RIR${NBSP}${dose.rir}`
}

/** The whole dose on one line: “4 × 6 at RIR 2, + 5 kg”. */
export function formatDose(dose: Dose, units: Units, kind?: ExerciseDocument['load']['kind']): string {
  const load = formatDoseLoad(dose, units, kind)
  return load === null ? formatSets(dose) : `${formatSets(dose)}, ${load}`
}

/** “Right elbow would reach 71 %, cap 50 %.” */
export function formatOverCap({ joint, side, stress, cap }: JointStress): string {
  const name = capitalise(jointWords(joint, side))
  if (cap === null) return `${name} would reach ${formatPercent(stress)}.`
  // Two equal numbers would not say why this is too much.
  if (stress > cap && formatPercent(stress) === formatPercent(cap))
    return `${name} would just pass its cap of ${formatPercent(cap)}.`
  return `${name} would reach ${formatPercent(stress)}, cap ${formatPercent(cap)}.`
}

/** “Tuesday 1 December” */
export const formatDay = (day: string): string => format(parseISO(day), 'EEEE d MMMM')
/** “1 Dec 2026” */
export const formatShortDay = (day: string): string => format(parseISO(day), 'd MMM yyyy')
/** “1 Dec 2026, 14:05” */
export const formatInstant = (instant: string): string => format(parseISO(instant), 'd MMM yyyy, HH:mm')
/** “3 days ago” */
export const formatAgo = (instant: string, now: Date = new Date()): string =>
  formatDistanceStrict(parseISO(instant), now, { addSuffix: true })
/** The calendar day where the person is, YYYY-MM-DD. */
export const localDay = (now: Date = new Date()): string => format(now, 'yyyy-MM-dd')
