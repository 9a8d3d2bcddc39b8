import type { Preview } from '../contract/exercise'
import type { RuleSet } from '../contract/rule-set'
import { JOINTS, type Action } from '../mechanics/vocabulary'
import { askedAt, demandOf, effortsOf } from './efforts'
import { asJointStress, capTable, tightestBySide } from './joint-stress'
import { strengthRange } from './load-range'
import { muscleDrives } from './muscles'
import { compressionAt, strainsOf } from './stress'
import type { Athlete, Cap, Movement } from './types'

/**
 * Moments, demands and stresses per frame at a load (kg), with the 1RM, the limiter and the muscles driven.
 * Joint stresses of a frame are those of that frame alone; motion factors are the repetition's.
 */
export function previewOf(
  movement: Movement,
  athlete: Athlete,
  load: number,
  caps: readonly Cap[],
  ruleSet: RuleSet,
): Preview {
  const efforts = effortsOf(movement, athlete, ruleSet)
  const strains = strainsOf(movement, athlete, ruleSet)
  const asked = askedAt(efforts, load)
  const table = capTable(caps)
  const range = strengthRange(efforts, 1)
  const grows = Number.isFinite(range.most)
  const possible = range.least <= range.most
  const limiter = grows && possible && range.mostBy ? range.mostBy : asked.limiter?.action
  return {
    frames: movement.solution.frames.map((frame, index) => {
      const strongest = new Map<Action, Preview['frames'][number]['actions'][number]>()
      for (const effort of efforts) {
        if (effort.frame !== index) continue
        const answer = demandOf(effort, load)
        if (!answer || answer.demand <= (strongest.get(answer.action)?.demand ?? 0)) continue
        const moment = Math.abs(effort.alpha + effort.beta * load)
        const strength = answer.action === effort.positive ? effort.strengthPositive : effort.strengthNegative
        strongest.set(answer.action, { action: answer.action, moment, strength, demand: answer.demand })
      }
      const own = strains.filter((strain) => strain.frame === index)
      return {
        name: frame.name,
        actions: [...strongest.values()].sort((one, other) => other.demand - one.demand),
        joints: JOINTS.flatMap((joint) => tightestBySide(joint, own, table, load)).map(asJointStress),
        compression: compressionAt(movement, index, athlete, load, ruleSet),
        reactions: frame.reactions.map(({ support, a, b }) => ({ support, share: a + (b * load) / athlete.bodyMass })),
      }
    }),
    oneRepMax: grows && possible ? range.most : null,
    limiter: limiter ?? null,
    muscles: muscleDrives(asked.work, movement.mechanics.grip, ruleSet).filter(
      ({ drive }) => drive >= ruleSet.muscles.leastListed.value,
    ),
    coordination: movement.coordination,
    estimated: Object.keys(athlete.factors).length === 0,
  }
}
