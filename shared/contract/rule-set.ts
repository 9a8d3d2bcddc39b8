import { z } from 'zod'
import { ACTIONS, GRIPS, GUIDANCES, JOINTS, SUPPORTS } from '../mechanics/vocabulary'
import { MUSCLES } from '../rules/muscle-names'
import { SKILL_GRADES } from './exercise'
import { PROVOCATIONS, RED_FLAGS } from './sore-joint'

/**
 * How sure a value is: read in its source; from memory with high, middle or low certainty; derived from other values;
 * our own estimate; common practice of the trade without a source.
 */
export const CERTAINTIES = [
  'read',
  'memoryHigh',
  'memoryMiddle',
  'memoryLow',
  'derived',
  'estimate',
  'practice',
] as const

const provenance = {
  source: z.string().min(3),
  certainty: z.enum(CERTAINTIES),
  /** Where sources disagree: the other values, and why this one was taken. */
  note: z.string().optional(),
}
const cited = <T extends z.ZodType>(value: T) => z.strictObject({ value, ...provenance })

const positive = z.number().positive().max(10_000)
const share = z.number().min(0).max(1)
const bySex = <T extends z.ZodType>(value: T) => z.strictObject({ male: value, female: value })
const every = <K extends string, V extends z.ZodType>(keys: readonly K[], value: V) =>
  z.strictObject(Object.fromEntries(keys.map((key) => [key, value])) as Record<K, V>)

/** Loads of a joint that are no signed action. */
export const OTHER_CHANNELS = ['gripPull', 'leaning', 'endRange'] as const
const channel = z.enum([...ACTIONS, ...OTHER_CHANNELS])

/** Angles of a solved posture that a rule may look at. */
const poseAngle = z.enum(['lumbar', 'neck', 'shoulder', 'elbow', 'wrist', 'hip', 'knee', 'ankle'])

/** [angle in degrees, factor], by rising angle; straight lines between, level outside. */
const curve = z.array(z.tuple([z.number(), z.number().positive()])).min(2)

/**
 * A rule set: every constant of the rules as data, with its source and certainty beside it. Published under a version
 * number; a ranking names the version it was made with.
 */
export const ruleSet = z.strictObject({
  version: z.number().int().positive(),
  title: z.string(),
  body: z.strictObject({
    /** Body mass (kg) of the people the strength norms are taken for. */
    mass: cited(bySex(positive)),
    /** Stature (m) of the average adult. */
    stature: cited(bySex(positive)),
  }),
  strength: z.strictObject({
    /** N·m per side (whole trunk and neck), N for grip and the scapular actions. */
    norms: every(
      ACTIONS,
      z.strictObject({
        value: bySex(positive),
        /** Measured while moving; isometric when left out. */
        moving: z.literal(true).optional(),
        ...provenance,
      }),
    ),
    /** Share of isometric strength left to a joint that moves, in full from an excursion (degrees) on. */
    moving: cited(z.strictObject({ share, fullAt: positive })),
    /** Arm (m) over the wrist of the finger muscles, which stiffen a wrist that holds or presses something. */
    grippingWristArm: cited(share),
    /** How a moment and a force grow with body mass: strength × (mass ÷ norm mass)^exponent. */
    momentExponent: cited(positive),
    forceExponent: cited(positive),
    /** How strength changes with the angle of a joint. */
    angleCurves: z.array(z.strictObject({ action: z.enum(ACTIONS), angle: poseAngle, points: curve, ...provenance })),
    /** Bounds of an athlete's own strength against the norm. */
    ownFactor: cited(z.strictObject({ least: positive, most: positive })),
  }),
  muscles: z.strictObject({
    /** Per action, the muscles that serve it: share of the action, the prime mover 1. */
    roles: every(ACTIONS, cited(z.partialRecord(z.enum(MUSCLES), share))),
    /** How the grip turns roles in elbow flexion: factor on the role. */
    gripRoles: cited(every(GRIPS, z.partialRecord(z.enum(MUSCLES), z.number().min(0).max(5)))),
    /** Share of its demand by which a limb joint held still trains its muscles, and the excursion that trains in full. */
    held: cited(z.strictObject({ share, fullAt: positive })),
    /** Muscles driven less than this share of the limiter are not listed. */
    leastListed: cited(share),
  }),
  stress: z.strictObject({
    /** Factor of a demand held still, and the excursion (degrees) at which it counts in full. */
    motion: cited(z.strictObject({ still: share, fullAt: positive })),
    /** Weight of the grip's demand at the wrist and at the elbow, and what is left of it in straps. */
    grip: cited(z.strictObject({ wrist: share, elbow: share, inStraps: share })),
    /** Push through one hand or forearm that counts as 1, as a share of body weight (norm mass, grown like a force). */
    leaning: cited(z.strictObject({ reference: positive, joints: z.array(z.enum(JOINTS)) })),
    /** Angle at which the end range begins and where it counts in full; `below` ranges begin downward. */
    endRange: z.array(z.strictObject({ angle: poseAngle, from: z.number(), full: z.number(), ...provenance })),
    /** Arm (m) of the back muscles at L5/S1, for compression. */
    backMuscleArm: cited(positive),
    /** Compression (N) shown beside the figure as a reference. */
    compressionReference: cited(positive),
    /** Compression (N) that counts as 1 when the lower back is sore from bearing weight. */
    compressionFull: cited(positive),
  }),
  caps: z.strictObject({
    /** Cap by rating 0–10. */
    byRating: cited(z.array(share).length(11)),
    /** Ratings from this one on are a red flag. */
    redFlagFrom: cited(z.number().int().min(1).max(10)),
    /** Share of the reduction that the joint's other channels get. */
    otherShare: cited(share),
    /** Per joint, what each provocation binds; an empty list means nothing here answers to it, and all are bound. */
    provocations: cited(every(JOINTS, every(PROVOCATIONS, z.array(channel)))),
    urgentFlags: cited(z.array(z.enum(RED_FLAGS))),
    /** Flags that concern the whole athlete, not only the joint they were given with. */
    wholeBodyFlags: cited(z.array(z.enum(RED_FLAGS))),
    /** Stress from which a joint counts as loaded, for red flags. */
    loadedFrom: cited(share),
  }),
  dose: z.strictObject({
    /** 1RM = w(1 + r ÷ this). */
    epley: cited(positive),
    /** Most repetitions a swap is given to make up for a lighter load, and the least intensity that still builds size. */
    mostRepetitions: cited(z.number().int().positive()),
    leastIntensity: cited(share),
    /** Seconds of holding that tire like one repetition. */
    secondsPerRepetition: cited(positive),
    mostSeconds: cited(positive),
    /** Load step (kg) where a place does not say. */
    fallbackStep: cited(positive),
  }),
  score: z.strictObject({
    /** Target drive below which the target is not trained, and what must at least be kept of the original. */
    leastTargetDrive: cited(share),
    leastKept: cited(share),
    /** What a factor loses at most (calm, carry-over, spare) or per unit of demand elsewhere (lean). */
    spare: cited(share),
    calm: cited(share),
    lean: cited(positive),
    carryOver: cited(share),
    /** Role from which an action counts as serving the target. */
    servesFrom: cited(share),
  }),
  coordination: z.strictObject({
    path: cited(every(GUIDANCES, share)),
    /** How demanding the steadiest of the supports is. */
    base: cited(every(SUPPORTS, share)),
    /** Added when one hand or foot alone bears, and when the trunk is upside down. */
    oneContact: cited(share),
    inverted: cited(share),
    /** Excursion (degrees) from which a joint counts as moving, and how many moving joints count as all. */
    joints: cited(z.strictObject({ movingFrom: positive, most: positive })),
    /** Height of load or pelvis above the ground, × stature, that counts in full. */
    massAboveFull: cited(positive),
    skill: cited(every(SKILL_GRADES, share)),
    /** Points at most of each ingredient; together 100. */
    points: cited(
      z.strictObject({
        path: positive,
        base: positive,
        joints: positive,
        oneSide: positive,
        massAbove: positive,
        speed: positive,
        skill: positive,
      }),
    ),
  }),
})
export type RuleSet = z.infer<typeof ruleSet>
