import { z } from 'zod'
import { id, list } from './common'
import { endpoint } from './endpoint'

/** Equipment an exercise needs or a place has. Bars and walls count as equipment; floor and body do not. */
export const EQUIPMENT = [
  'pullUpBar',
  'lowBar',
  'dipBars',
  'parallettes',
  'rings',
  'wall',
  'box',
  'flatBench',
  'inclineBench',
  'preacherBench',
  'backExtensionBench',
  'barbell',
  'squatRack',
  'dumbbells',
  'dipBelt',
  'bands',
  'cableHigh',
  'cableLow',
  'latPulldown',
  'cableRow',
  'assistedPullUpMachine',
  'pulloverMachine',
  'chestPressMachine',
  'shoulderPressMachine',
  'rowMachine',
  'flyMachine',
  'lateralRaiseMachine',
  'legPress',
  'hackSquatMachine',
  'kneeExtensionMachine',
  'legCurlMachine',
  'hipAbductionMachine',
  'hipAdductionMachine',
  'calfRaiseMachine',
  'abdominalMachine',
] as const
export const equipment = z.enum(EQUIPMENT)
export type Equipment = z.infer<typeof equipment>

/** The loads a piece of equipment can be set to: `first` kg, then in steps of `step` up to `last`. */
export const loadSteps = z.object({ first: z.number(), step: z.number().positive(), last: z.number() })
export type LoadSteps = z.infer<typeof loadSteps>

export const place = z.object({
  id,
  clubId: id,
  name: z.string(),
  equipment: z.array(z.object({ kind: equipment, steps: loadSteps.nullable() })),
})
export type Place = z.infer<typeof place>

export const listPlaces = endpoint({
  method: 'GET',
  path: '/api/places',
  summary: 'The places of the clubs the signed-in person belongs to, with their equipment.',
  access: 'signedIn',
  response: list(place),
})
