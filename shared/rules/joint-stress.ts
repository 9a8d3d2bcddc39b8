import type { JointStress } from '../contract/exercise'
import type { Joint, Side } from '../mechanics/vocabulary'
import { loadRange, type LoadRange } from './load-range'
import type { Strain } from './stress'
import type { Cap, StressChannel } from './types'

/** A joint's tightest channel at a load: the one that uses most of its cap, or without caps the most stressed one. */
export interface Tightest {
  joint: Joint
  side: Side | null
  stress: number
  cap: number | null
  channel: StressChannel | null
  source: Cap['source'] | null
}

const strainAt = (strain: Strain, load: number): number => Math.max(0, strain.constant + strain.slope * load)

/** Compression of a lower back that is not sore is shown in kN, not as stress. */
const countsUncapped = ({ joint, channel }: Strain): boolean => !(joint === 'lowerBack' && channel === 'leaning')

/** The sides of a joint that carry caps, left before right; midline joints have the one side null. */
function cappedSides(joint: Joint, caps: readonly Cap[]): Array<Side | null> {
  const sides = new Set(caps.filter((cap) => cap.joint === joint).map((cap) => cap.side))
  return ([null, 'left', 'right'] as const).filter((side) => sides.has(side))
}

/** The strictest cap on a channel of one side; both sides do the same work, turn about in one-sided exercises. */
function strictest(caps: readonly Cap[], joint: Joint, channel: StressChannel, side: Side | null): Cap | null {
  let found: Cap | null = null
  for (const cap of caps) {
    if (cap.joint !== joint || cap.channel !== channel || cap.side !== side) continue
    if (found === null || cap.limit < found.limit) found = cap
  }
  return found
}

function tightestOf(
  joint: Joint,
  side: Side | null,
  capped: boolean,
  strains: readonly Strain[],
  caps: readonly Cap[],
  load: number,
): Tightest {
  let most: Tightest = { joint, side, stress: 0, cap: null, channel: null, source: null }
  let used = -1
  for (const strain of strains) {
    if (strain.joint !== joint || (!capped && !countsUncapped(strain))) continue
    const stress = strainAt(strain, load)
    const cap = capped ? strictest(caps, joint, strain.channel, side) : null
    const limit = cap?.limit ?? 1
    const use = limit > 0 ? stress / limit : stress > 0 ? Number.POSITIVE_INFINITY : 0
    const tied = use === used && cap !== null && most.cap !== null && cap.limit < most.cap
    if (use > used || tied) {
      used = use
      most = { joint, side, stress, cap: cap?.limit ?? null, channel: strain.channel, source: cap?.source ?? null }
    }
  }
  if (capped && most.cap === null) {
    const own = caps.filter((cap) => cap.joint === joint && cap.side === side)
    const first = own.reduce<Cap | null>((least, cap) => (least && least.limit <= cap.limit ? least : cap), null)
    most = { ...most, cap: first?.limit ?? null, source: first?.source ?? null }
  }
  return most
}

/** The tightest channel of each side of a joint that is capped, or of the joint as a whole when none is. */
export function tightestBySide(
  joint: Joint,
  strains: readonly Strain[],
  caps: readonly Cap[],
  load: number,
): Tightest[] {
  const sides = cappedSides(joint, caps)
  if (sides.length === 0) return [tightestOf(joint, null, false, strains, caps, load)]
  return sides.map((side) => tightestOf(joint, side, true, strains, caps, load))
}

export const asJointStress = ({ joint, side, stress, cap }: Tightest): JointStress => ({ joint, side, stress, cap })

/** Whether a stress is over its cap, but for the last digits of a number that was solved for the cap. */
export const isOver = ({ stress, cap }: Pick<Tightest, 'stress' | 'cap'>): boolean =>
  cap !== null && stress > cap + 1e-9

/** The loads that keep every channel under the strictest of its caps. */
export function capRange(
  strains: readonly Strain[],
  caps: readonly Cap[],
): LoadRange<{ constant: number; slope: number; limit: number; strain: Strain }> {
  return loadRange(
    strains.flatMap((strain) => {
      const limit = caps.reduce(
        (least, cap) =>
          cap.joint === strain.joint && cap.channel === strain.channel && cap.limit < least ? cap.limit : least,
        Number.POSITIVE_INFINITY,
      )
      return Number.isFinite(limit) ? [{ constant: strain.constant, slope: strain.slope, limit, strain }] : []
    }),
  )
}
