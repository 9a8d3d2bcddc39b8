import type { Flag } from '#shared/contract/flag'
import type { Intent } from '#shared/contract/session'
import type { Provocation, RedFlag, SoreJoint } from '#shared/contract/sore-joint'
import type { Role } from '#shared/contract/me'
import type { Guidance, Joint, Side } from '#shared/mechanics/vocabulary'
import type { TargetGroup } from '#shared/rules/muscle-names'

/** What the vocabularies are called on screen. Lower case, for the middle of a sentence. */
export const JOINT_WORDS: Record<Joint, string> = {
  neck: 'neck',
  shoulder: 'shoulder',
  elbow: 'elbow',
  wrist: 'wrist',
  lowerBack: 'lower back',
  hip: 'hip',
  knee: 'knee',
  ankle: 'ankle',
}

export const PROVOCATION_WORDS: Record<Provocation, string> = {
  bending: 'bending it under load',
  straightening: 'straightening it under load',
  gripping: 'gripping',
  leaning: 'weight on it',
  endRange: 'the end of its range',
  twisting: 'twisting',
  unknown: 'I don’t know',
}

export const RED_FLAG_WORDS: Record<RedFlag, string> = {
  injury: 'a recent injury with a changed shape or a pop',
  nerve: 'numbness, weakness or a change in bladder or bowel control',
  swollenOrFever: 'a hot, swollen joint or a fever',
  nightPain: 'night pain that does not ease',
  severePain: 'pain of 8 or more',
  chestOrBreath: 'chest pain or breathlessness',
}

export const STATE_WORDS: Record<SoreJoint['state'], string> = { open: 'sore', redFlag: 'red flag', closed: 'closed' }

export const INTENT_WORDS: Record<Intent, string> = {
  strength: 'strength',
  size: 'size',
  skill: 'skill, while fresh',
  endurance: 'endurance',
}

export const TARGET_WORDS: Record<TargetGroup, string> = {
  lats: 'lats',
  upperBack: 'upper back',
  chest: 'chest',
  frontShoulder: 'front of the shoulder',
  sideShoulder: 'side of the shoulder',
  biceps: 'biceps',
  triceps: 'triceps',
  forearms: 'forearms',
  quadriceps: 'quadriceps',
  glutes: 'glutes',
  hamstrings: 'hamstrings',
  calves: 'calves',
  abdomen: 'abdomen',
  lowerBack: 'lower back muscles',
}

export const GUIDANCE_WORDS: Record<Guidance, string> = {
  fixedPath: 'machine on rails',
  leverMachine: 'lever machine',
  cable: 'cable',
  freeWeight: 'free weight',
  ownBody: 'own body',
  ownBodyOnStraps: 'rings or straps',
}

export const FLAG_REASON_WORDS: Record<Flag['reason'], string> = {
  hurts: 'it hurts',
  wrongMuscle: 'it trains the wrong muscle',
  loadOff: 'the load is off',
  notPossibleHere: 'it is not possible here',
  other: 'something else',
}

export const ROLE_WORDS: Record<Role, string> = { athlete: 'athlete', coach: 'coach', physio: 'physio', admin: 'admin' }

/** “right elbow”, “lower back”. */
export const jointWords = (joint: Joint, side: Side | null): string =>
  side === null ? JOINT_WORDS[joint] : `${side} ${JOINT_WORDS[joint]}`

export const capitalise = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)

/** “a, b and c”. */
export function listWords(words: readonly string[]): string {
  if (words.length < 2) return words[0] ?? ''
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`
}

/** “bodyProfile” → “body profile”, for names that have no words of their own. */
export const unhump = (name: string): string =>
  name.replace(/([a-z])([A-Z])/g, (_, end: string, start: string) => `${end} ${start.toLowerCase()}`)
