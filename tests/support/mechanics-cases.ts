import type { ExerciseMechanics } from '#shared/mechanics/definition'
import {
  squat,
  calfRaise,
  oneLegSquat,
  hipThrust,
  proneLegCurl,
  kneeExtension,
  backExtension,
  plank,
  legPress,
  wallSit,
  splitSquat,
} from './mechanics-cases-lower'
import {
  hang,
  standing,
  curl,
  dip,
  benchPress,
  pushUp,
  kneePushUp,
  handstand,
  oneArmRow,
  pulldown,
  wideCableRow,
  pullover,
} from './mechanics-cases-upper'

export { held } from './mechanics-case-base'
export * from './mechanics-cases-lower'
export * from './mechanics-cases-upper'

/** All of them by name. */
export const MECHANICS_CASES: Readonly<Record<string, ExerciseMechanics>> = {
  pullUp: hang(),
  chinUp: hang({ armPlane: 'sagittal', grip: 'underhand' }),
  curl: curl(),
  hammerCurl: curl('neutral'),
  bentWrist: standing({ shoulder: 20, elbow: 80, wrist: 25 }, { grip: 'underhand' }),
  lateralRaise: standing(
    { shoulder: 80, elbow: 10 },
    { armPlane: 'frontal', grip: 'neutral', loads: [{ at: 'hands', direction: 'down', share: 'each' }] },
  ),
  palmDownRaise: standing({ shoulder: 70, elbow: 8, elbowSide: 'across' }, { armPlane: 'frontal', grip: 'neutral' }),
  uprightRow: standing({ hand: [0.02, -0.1], from: 'world', elbowSide: 'reversed' }, { armPlane: 'frontal' }),
  overheadPress: standing({ hand: [0.05, 0.2, 0.02], from: 'world', wrist: 10 }, { armPlane: 'frontal' }),
  offPlanePress: standing({ hand: [-0.2, 0.06, 0.05] }, { armPlane: 'frontal' }),
  wideCableRow: wideCableRow(),
  dip: dip(),
  squat: squat(),
  oneLegSquat: oneLegSquat(),
  calfRaise: calfRaise(),
  benchPress: benchPress(),
  pushUp: pushUp(),
  widePushUp: pushUp(0.1),
  kneePushUp: kneePushUp(),
  handstand: handstand(),
  oneArmRow: oneArmRow(),
  pulldown: pulldown(),
  hipThrust: hipThrust(),
  proneLegCurl: proneLegCurl(),
  kneeExtension: kneeExtension(),
  backExtension: backExtension(),
  pullover: pullover(),
  plank: plank(),
  legPress: legPress(),
  wallSit: wallSit(),
  splitSquat: splitSquat(),
}
