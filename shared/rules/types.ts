import type { Equipment, LoadSteps } from '../contract/place'
import type { ExerciseDocument } from '../contract/exercise'
import type { Dose, Intent } from '../contract/session'
import type { Provocation, RedFlag } from '../contract/sore-joint'
import type { LeftOutRow, SwapRow, Ranking } from '../contract/swap'
import type { Action, Joint, Side } from '../mechanics/vocabulary'
import type { ExerciseMechanics } from '../mechanics/definition'
import type { ExerciseSolution } from '../mechanics/solution'
import type { Sex } from '../mechanics/sex'
import type { Muscle, TargetGroup } from './muscle-names'

/** Who the numbers are for. Mass in kg, stature in m. */
export interface Athlete {
  sex: Sex
  bodyMass: number
  stature: number
  /** Own strength against the norm, per action; 1 where nothing is known. */
  factors: Partial<Record<Action, number>>
  /** Highest skill grade they can be given. */
  skill: ExerciseDocument['skill']
  minor: boolean
}

/** A published exercise version as ranking reads it: the document and its coefficients for one sex. */
export interface Candidate {
  id: string
  versionId: string
  document: ExerciseDocument
  solution: ExerciseSolution
  coordination: number
}

/** A standing sore-joint report, as the rules read it. */
export interface SoreJointInput {
  soreJointId: string
  joint: Joint
  side: Side | null
  rating: number
  provocations: readonly Provocation[]
  /** Non-empty while a red flag stands. */
  redFlags: readonly RedFlag[]
}

/**
 * One way a joint is loaded: a signed action, or a load that is no action: the pull of gripping at the elbow,
 * weight leaned on the joint, or work at the end of its range.
 */
export type StressChannel = Action | 'gripPull' | 'leaning' | 'endRange'

/** The largest stress allowed at one channel of a joint (share of strength), and whose word it is. */
export interface Cap {
  joint: Joint
  channel: StressChannel
  side: Side | null
  limit: number
  source: { kind: 'soreJoint'; soreJointId: string; joint: Joint }
}

/** What mechanics says of an exercise, without its name and equipment: enough for a preview. */
export interface Movement {
  mechanics: ExerciseMechanics
  solution: ExerciseSolution
  coordination: number
}

export interface Place {
  id: string
  equipment: ReadonlyMap<Equipment, LoadSteps | null>
}

export interface RankRequest {
  athlete: Athlete
  original: Candidate
  planned: Dose
  intent: Intent
  target: TargetGroup
  candidates: readonly Candidate[]
  sore: readonly SoreJointInput[]
  /** Null ranks as if every piece of equipment were at hand, with 0.5 kg steps. */
  place: Place | null
}

/** The engine's part of the contract's Ranking. */
export type RankResult = Pick<Ranking, 'originalRow' | 'estimated' | 'minor' | 'redFlags'> & {
  sore: Array<Ranking['sore'][number]>
  items: SwapRow[]
  leftOut: LeftOutRow[]
}

export type MuscleDrive = Record<Muscle, number>
