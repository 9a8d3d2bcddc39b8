import type { JointStress } from '#shared/contract/exercise'
import type { Ranking } from '#shared/contract/swap'
import { capitalise, JOINT_WORDS } from '@/lib/words'

/** One joint the table shows for every exercise. */
export interface JointColumn {
  key: string
  joint: JointStress['joint']
  side: JointStress['side']
  /** “Elbow, right” */
  title: string
  sore: boolean
}

export const jointKey = ({ joint, side }: Pick<JointStress, 'joint' | 'side'>): string => `${joint}.${side ?? 'both'}`

const titleOf = ({ joint, side }: Pick<JointStress, 'joint' | 'side'>): string =>
  side === null ? capitalise(JOINT_WORDS[joint]) : `${capitalise(JOINT_WORDS[joint])}, ${side}`

/** Sore joints first, in the order the ranking names them, then the others as its rows have them. */
export function jointColumns({
  items,
  originalRow,
  sore,
}: Pick<Ranking, 'items' | 'originalRow' | 'sore'>): JointColumn[] {
  const columns = new Map<string, JointColumn>()
  for (const { joints } of [...(originalRow === null ? [] : [originalRow]), ...items])
    for (const { joint, side } of joints) {
      const isSore = sore.some(
        (one) => one.joint === joint && (one.side === side || side === null || one.side === null),
      )
      columns.set(jointKey({ joint, side }), {
        key: jointKey({ joint, side }),
        joint,
        side,
        title: titleOf({ joint, side }),
        sore: isSore,
      })
    }
  return [...columns.values()].sort((a, b) => Number(b.sore) - Number(a.sore))
}

export const stressAt = (joints: readonly JointStress[], { key }: JointColumn): JointStress | undefined =>
  joints.find((stress) => jointKey(stress) === key)
