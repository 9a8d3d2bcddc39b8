import type { JointStress } from '../contract/exercise'
import { JOINTS, type Joint, type Side } from '../mechanics/vocabulary'
import { cutRange, EVERY_LOAD, type LoadRange } from './load-range'
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

/** The caps on one side of a joint by channel, the strictest of each. */
interface SideCaps {
  side: Side | null
  byChannel: ReadonlyMap<StressChannel, Cap>
  /** The strictest of all. */
  strictest: Cap
}

/** Caps by joint and side, left before right; joints without caps are absent. */
export type CapTable = ReadonlyMap<Joint, readonly SideCaps[]>

/** Sorts caps for looking up; of several on the same channel and side the strictest counts, the first of equals. */
export function capTable(caps: readonly Cap[]): CapTable {
  const table = new Map<Joint, SideCaps[]>()
  for (const joint of JOINTS) {
    for (const side of [null, 'left', 'right'] as const) {
      const own = caps.filter((cap) => cap.joint === joint && cap.side === side)
      const byChannel = new Map<StressChannel, Cap>()
      for (const cap of own)
        if (cap.limit < (byChannel.get(cap.channel)?.limit ?? Infinity)) byChannel.set(cap.channel, cap)
      const strictest = own.reduce<Cap | null>((least, cap) => (least && least.limit <= cap.limit ? least : cap), null)
      if (strictest) table.set(joint, [...(table.get(joint) ?? []), { side, byChannel, strictest }])
    }
  }
  return table
}

/** The stress of a joint as a whole at a load, caps aside. */
export function stressOf(joint: Joint, strains: readonly Strain[], load: number): Tightest {
  let most: Tightest = { joint, side: null, stress: 0, cap: null, channel: null, source: null }
  for (const strain of strains) {
    if (strain.joint !== joint || !countsUncapped(strain)) continue
    const stress = strainAt(strain, load)
    if (stress > most.stress) most = { ...most, stress, channel: strain.channel }
  }
  return most
}

function tightestOf(
  joint: Joint,
  { side, byChannel, strictest }: SideCaps,
  strains: readonly Strain[],
  load: number,
): Tightest {
  let most: Strain | null = null
  let used = -1
  let stress = 0
  let binding: Cap = strictest
  for (const strain of strains) {
    if (strain.joint !== joint) continue
    const cap = byChannel.get(strain.channel)
    if (cap === undefined) continue
    const here = strainAt(strain, load)
    const use = cap.limit > 0 ? here / cap.limit : here > 0 ? Number.POSITIVE_INFINITY : 0
    if (use > used || (use === used && cap.limit < binding.limit)) {
      used = use
      most = strain
      stress = here
      binding = cap
    }
  }
  return { joint, side, stress, cap: binding.limit, channel: most?.channel ?? null, source: binding.source }
}

/** The tightest channel of each side of a joint that is capped, or the joint's stress as a whole when none is. */
export function tightestBySide(joint: Joint, strains: readonly Strain[], caps: CapTable, load: number): Tightest[] {
  const sides = caps.get(joint)
  if (sides === undefined) return [stressOf(joint, strains, load)]
  return sides.map((side) => tightestOf(joint, side, strains, load))
}

export const asJointStress = ({ joint, side, stress, cap }: Tightest): JointStress => ({ joint, side, stress, cap })

/** Whether a stress is over its cap, but for the last digits of a number that was solved for the cap. */
export const isOver = ({ stress, cap }: Pick<Tightest, 'stress' | 'cap'>): boolean =>
  cap !== null && stress > cap + 1e-9

/** The loads that keep every channel under the strictest of its caps. Both sides do the same work, turn about if need be. */
export function capRange(strains: readonly Strain[], caps: CapTable): LoadRange {
  const range = { ...EVERY_LOAD }
  for (const { joint, channel, constant, slope } of strains) {
    const sides = caps.get(joint)
    if (sides === undefined) continue
    for (const { byChannel } of sides) {
      const cap = byChannel.get(channel)
      if (cap !== undefined) cutRange(range, constant, slope, cap.limit)
    }
  }
  return range
}
