import { z } from 'zod'
import { ACTIONS, ARM_PLANES, GRIPS, GRIP_WIDTHS, GUIDANCES, SUPPORTS } from '../mechanics/vocabulary'
import type { ExerciseMechanics } from '../mechanics/definition'
import { id, list, pageQuery, side, slug } from './common'
import { endpoint } from './endpoint'
import { LIMITS } from './limits'
import { bodyProfile } from './me'
import { equipment } from './place'
import { joint } from './sore-joint'
import { MUSCLES } from '../rules/muscle-names'

const angle = z.number().min(-360).max(360)
const fraction = z.number().min(-3).max(3)
const pair = z.tuple([fraction, fraction])

const arm = z
  .strictObject({
    hand: z.union([pair, z.tuple([fraction, fraction, fraction])]).optional(),
    from: z.enum(['trunk', 'world']).optional(),
    elbowSide: z.enum(['flexed', 'reversed', 'across']).optional(),
    shoulder: angle.optional(),
    elbow: angle.optional(),
    wrist: z.number().min(-90).max(90).optional(),
    flat: z.enum(['forward', 'backward']).optional(),
  })
  .refine(
    (value) => (value.hand !== undefined) !== (value.shoulder !== undefined && value.elbow !== undefined),
    'Give either the hand’s place, or the shoulder and elbow angles.',
  )
const leg = z
  .strictObject({
    ankle: z.union([pair, angle]).optional(),
    from: z.enum(['trunk', 'world']).optional(),
    foot: angle.optional(),
    thigh: angle.optional(),
    shank: angle.optional(),
    hip: angle.optional(),
    knee: angle.optional(),
  })
  .refine(
    (value) =>
      [
        Array.isArray(value.ankle),
        value.thigh !== undefined && value.shank !== undefined,
        value.hip !== undefined && value.knee !== undefined,
      ].filter(Boolean).length === 1,
    'Give the ankle’s place, or the thigh and shank angles, or the hip and knee angles.',
  )
const frame = z.strictObject({
  name: z.string().min(1).max(40),
  trunk: z.strictObject({
    lean: z.number().min(-180).max(180),
    lumbar: z.number().min(-40).max(70).optional(),
    neck: z.number().min(-60).max(60).optional(),
  }),
  arms: arm,
  offArm: arm.optional(),
  legs: leg,
  offLeg: leg.optional(),
})
const loadPath = z.strictObject({
  at: z.enum(['hands', 'offHand', 'shoulders', 'hips', 'feet', 'head', 'upperArm', 'forearm', 'thigh', 'shank']),
  share: z.enum(['total', 'each']).optional(),
  direction: z.union([
    z.enum(['down', 'up']),
    z.strictObject({ angle }),
    z.strictObject({ toward: pair, of: z.enum(['hip', 'shoulder', 'ankle']), lateral: fraction.optional() }),
    z.strictObject({ square: z.enum(['flexing', 'extending']) }),
  ]),
  ratio: z.number().positive().max(10).optional(),
  along: z.number().min(0).max(1).optional(),
  offset: pair.optional(),
})
const directMoment = z.strictObject({
  action: z.enum(ACTIONS),
  arm: z.number().positive().max(1),
  ratio: z.number().positive().max(10).optional(),
  curve: z.array(z.number().positive().max(5)).min(2).max(4).optional(),
  share: z.enum(['total', 'each']).optional(),
})

/** The authored geometry; the exact meaning of each field is documented in shared/mechanics/definition.ts. */
export const exerciseMechanics = z.strictObject({
  guidance: z.enum(GUIDANCES),
  sides: z.enum(['both', 'oneAtATime']),
  grip: z.enum(GRIPS),
  gripWidth: z.enum(GRIP_WIDTHS),
  armPlane: z.enum(ARM_PLANES),
  supports: z.array(z.enum(SUPPORTS)).min(1, 'Say where the body bears.').max(4),
  rise: z.number().min(-1).max(1).optional(),
  firstPushes: z.enum(['upright', 'inward', 'squareToTrunk']).optional(),
  frames: z.array(frame).min(2, 'Give at least two postures.').max(4, 'Give at most four postures.'),
  balance: z
    .strictObject({
      solve: z.enum(['trunk', 'arms', 'legs']),
      range: z.tuple([angle, angle]).optional(),
      footPoint: z.number().min(0).max(1).optional(),
    })
    .optional(),
  loads: z.array(loadPath).max(4),
  moments: z.array(directMoment).max(3).optional(),
  referenceLoad: z.number().min(-1).max(4),
  gripFree: z.boolean().optional(),
  headRests: z.boolean().optional(),
}) as unknown as z.ZodType<ExerciseMechanics>

/** How the external load of an exercise is meant and bounded. */
export const exerciseLoad = z.strictObject({
  /** none: body weight only; added: from 0 up; assistance: negative, from −most to 0; external: from the lightest implement. */
  kind: z.enum(['none', 'added', 'assistance', 'external']),
  /** What sets the steps at a place: the load steps of this equipment. */
  from: equipment.optional(),
  /** Lightest possible, kg (an empty bar, one plate of a stack). */
  least: z.number().min(LIMITS.load.min).max(LIMITS.load.max).optional(),
  most: z.number().min(LIMITS.load.min).max(LIMITS.load.max).optional(),
})

export const SKILL_GRADES = ['beginner', 'intermediate', 'advanced'] as const

/** One catalogue entry as authored in seeds/catalogue. Muscles and demands are derived, never typed in. */
export const exerciseDocument = z.strictObject({
  slug,
  name: z.string().min(1).max(80),
  family: z.enum([
    'verticalPull',
    'horizontalPull',
    'straightArmPull',
    'verticalPush',
    'horizontalPush',
    'dip',
    'handstand',
    'lever',
    'elbowFlexion',
    'elbowExtension',
    'wristAndForearm',
    'shoulderIsolation',
    'squat',
    'lunge',
    'legPress',
    'hinge',
    'kneeIsolation',
    'hipIsolation',
    'ankleIsolation',
    'trunk',
  ]),
  /** core: carries over best to bodyweight goals; compound, machine and isolation order the session. */
  kind: z.enum(['core', 'compound', 'machine', 'isolation']),
  /** repetitions or a timed hold. */
  unit: z.enum(['repetitions', 'seconds']).default('repetitions'),
  skill: z.enum(SKILL_GRADES).default('beginner'),
  speed: z.enum(['controlled', 'fast']).default('controlled'),
  equipment: z.array(equipment).max(4),
  /** Other equipment that serves as well, each a full alternative to `equipment`. */
  orEquipment: z.array(z.array(equipment).max(4)).max(4).optional(),
  load: exerciseLoad,
  mechanics: exerciseMechanics,
  setup: z.string().min(1).max(300),
  cautions: z.array(z.string().max(200)).max(4).optional(),
  /** The easier form that takes weight off, named when body weight alone is too much. */
  assistedForm: slug.optional(),
})
export type ExerciseDocument = z.infer<typeof exerciseDocument>

export const muscle = z.enum(MUSCLES)

export const exercise = z.object({
  id,
  versionId: id,
  version: z.number().int(),
  slug,
  name: z.string(),
  family: z.string(),
  kind: z.string(),
  unit: z.enum(['repetitions', 'seconds']),
  skill: z.enum(SKILL_GRADES),
  equipment: z.array(equipment),
  load: exerciseLoad,
  setup: z.string(),
  cautions: z.array(z.string()),
  coordination: z.number(),
  /** Derived from mechanics for an average adult: the muscles driven hardest, strongest first. */
  muscles: z.array(z.object({ muscle, drive: z.number() })),
  mechanics: exerciseMechanics,
})
export type Exercise = z.infer<typeof exercise>

export const listExercises = endpoint({
  method: 'GET',
  path: '/api/exercises',
  summary: 'Published exercises by name; `ids` (comma separated) picks some, `search` filters by name.',
  access: 'signedIn',
  query: pageQuery.extend({
    search: z.string().trim().max(LIMITS.search.max).optional(),
    ids: z
      .string()
      .max(8000)
      .transform((text) => text.split(','))
      .pipe(z.array(id).min(1).max(LIMITS.pageSize.max))
      .optional(),
  }),
  response: list(exercise),
})

export const getExercise = endpoint({
  method: 'GET',
  path: '/api/exercises/:slug',
  summary: 'One published exercise.',
  access: 'signedIn',
  params: z.object({ slug }),
  response: exercise,
})

/** One joint's share of strength with the cap that binds it; the material of a load strip. */
export const jointStress = z.object({ joint, side: side.nullable(), stress: z.number(), cap: z.number().nullable() })
export type JointStress = z.infer<typeof jointStress>

export const preview = z.object({
  frames: z.array(
    z.object({
      name: z.string(),
      /** Net muscle moment (N·m, N for force actions), strength and share of strength, per action that works here. */
      actions: z.array(
        z.object({ action: z.enum(ACTIONS), moment: z.number(), strength: z.number(), demand: z.number() }),
      ),
      joints: z.array(jointStress),
      /** Compression at L5/S1 in kN. */
      compression: z.number(),
      /** Vertical support reactions as a share of body weight, external load included. */
      reactions: z.array(z.object({ support: z.enum(SUPPORTS), share: z.number() })),
    }),
  ),
  /** Load at which the first action reaches its strength, kg; null when it is beyond current strength. */
  oneRepMax: z.number().nullable(),
  limiter: z.enum(ACTIONS).nullable(),
  muscles: z.array(z.object({ muscle, drive: z.number() })),
  coordination: z.number(),
  /** True while the strength is the average adult's, not fitted to this athlete. */
  estimated: z.boolean(),
})
export type Preview = z.infer<typeof preview>

export const previewExercise = endpoint({
  method: 'POST',
  path: '/api/exercises/preview',
  summary: 'Moments, demands and stresses per frame, for a published exercise or for given mechanics, body and load.',
  access: 'signedIn',
  body: z
    .object({
      exerciseId: id.optional(),
      mechanics: exerciseMechanics.optional(),
      athleteId: id.optional(),
      body: bodyProfile.omit({ birthDate: true }).optional(),
      load: z.number().min(LIMITS.load.min).max(LIMITS.load.max),
    })
    .refine((value) => (value.exerciseId === undefined) !== (value.mechanics === undefined), {
      path: ['exerciseId'],
      message: 'Name an exercise or give mechanics, not both.',
    })
    .refine((value) => (value.athleteId === undefined) !== (value.body === undefined), {
      path: ['athleteId'],
      message: 'Name an athlete or give a body, not both.',
    }),
  response: preview,
})
