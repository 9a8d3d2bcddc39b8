import type { RuleSet } from '../contract/rule-set'
import type { Dose, Slot } from '../contract/session'
import { capsFromSoreness, isRedFlagged } from './caps'
import { capTable, isOver, stressOf, tightestBySide } from './joint-stress'
import { planned, prepare } from './original'
import type { Athlete, Candidate, SoreJointInput } from './types'

/** What a sore joint means for a planned exercise: the contract's entry of `slot.affected`. */
export type Affected = Slot['affected'][number]

/** Whether one of a report's flags concerns all training, not only the joint it came with. */
export const stopsAll = ({ redFlags }: Pick<SoreJointInput, 'redFlags'>, ruleSet: RuleSet): boolean =>
  redFlags.some((flag) => ruleSet.caps.wholeBodyFlags.value.includes(flag))

/**
 * The sore joints that a planned dose puts over their cap, or that are red-flagged and loaded by it. Red flags first, then
 * the one furthest over its cap; equal ones in the order of the reports.
 */
export function affectedBy(
  candidate: Candidate,
  dose: Dose,
  athlete: Athlete,
  sore: readonly SoreJointInput[],
  ruleSet: RuleSet,
): Affected[] {
  const { strains, load } = planned(prepare(candidate, athlete, ruleSet), dose, ruleSet)
  return sore
    .flatMap((report): Affected[] => {
      const { joint, side, soreJointId } = report
      if (isRedFlagged(report, ruleSet)) {
        const stress = stressOf(joint, strains, load).stress
        if (stress < ruleSet.caps.loadedFrom.value && !stopsAll(report, ruleSet)) return []
        return [{ joint, side, stress, cap: 0, verdict: 'redFlag', soreJointId }]
      }
      const own = capTable(capsFromSoreness([report], ruleSet))
      const worst = tightestBySide(joint, strains, own, load)[0]
      if (!worst || !isOver(worst)) return []
      return [{ joint, side, stress: worst.stress, cap: worst.cap, verdict: 'overCap', soreJointId }]
    })
    .sort((one, other) => Number(isFlag(other)) - Number(isFlag(one)) || excess(other) - excess(one))
}

const isFlag = ({ verdict }: Affected): boolean => verdict === 'redFlag'
const excess = ({ stress, cap }: Affected): number => stress - (cap ?? 1)
