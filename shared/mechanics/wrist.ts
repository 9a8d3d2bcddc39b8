import { radians } from './vector'
import type { ArmPlane, Grip } from './vocabulary'

/** Which way a wrist works when the hand turns toward growing θ in the arm plane. */
export interface WristAxis {
  axis: 'wristFlexion' | 'wristDeviation'
  sign: 1 | -1
}

/**
 * What turning the hand in the arm plane toward growing θ means at the wrist, from where the palm faces.
 * Trade and anatomy, no source: overhand thumbs point at each other, underhand thumbs away from each other, neutral palms face
 * each other. For frontal arms this holds while the forearm hangs; see wristAxis.
 */
const WRIST_IN_PLANE: Readonly<Record<ArmPlane, Record<Exclude<Grip, 'none'>, WristAxis>>> = {
  sagittal: {
    overhand: { axis: 'wristFlexion', sign: -1 },
    underhand: { axis: 'wristFlexion', sign: 1 },
    neutral: { axis: 'wristDeviation', sign: 1 },
  },
  frontal: {
    overhand: { axis: 'wristDeviation', sign: -1 },
    underhand: { axis: 'wristDeviation', sign: 1 },
    neutral: { axis: 'wristFlexion', sign: -1 },
  },
  transverse: {
    overhand: { axis: 'wristDeviation', sign: 1 },
    underhand: { axis: 'wristDeviation', sign: -1 },
    neutral: { axis: 'wristFlexion', sign: 1 },
  },
}

/**
 * From this angle of the forearm on (degrees from p), a frontal arm counts as reaching up. A raise that ends a little above the
 * shoulder keeps the palm it began with; a bar or handle overhead is held beyond this (our rule, no source).
 */
const REACHING_UP = 110

/**
 * The wrist's axis for a grip. In the frontal plane growing θ leads outward below the shoulder and inward above it, while the thumbs
 * on a bar keep pointing the same way, so that the sign turns over.
 */
export function wristAxis(plane: ArmPlane, grip: Grip, forearm: number): WristAxis {
  const hanging = WRIST_IN_PLANE[plane][grip === 'none' ? 'neutral' : grip]
  const up = plane === 'frontal' && Math.cos(forearm) < Math.cos(radians(REACHING_UP))
  return up ? { axis: hanging.axis, sign: hanging.sign === 1 ? -1 : 1 } : hanging
}
