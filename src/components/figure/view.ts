import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { SolvedFrame, Vector } from '#shared/mechanics/solution'
import { dot, type Point } from './geometry'

/** Where the onlooker stands. All frames of one exercise share one view, so that they can be compared. */
export interface View {
  /** Degrees from the athlete's right side (0) toward the front (90). */
  turn: number
  /** Degrees above level. */
  above: number
  /** World directions of the page's right, the page's up, and out of the page. */
  right: Vector
  up: Vector
  out: Vector
}

/** Units of the drawing: hundredths of stature. */
export const UNIT = 100

export function viewFrom(turn: number, above: number): View {
  const t = (turn * Math.PI) / 180
  const e = (above * Math.PI) / 180
  return {
    turn,
    above,
    right: [Math.cos(t), Math.sin(t), 0],
    up: [-Math.sin(t) * Math.sin(e), Math.cos(t) * Math.sin(e), Math.cos(e)],
    out: [Math.sin(t) * Math.cos(e), -Math.cos(t) * Math.cos(e), Math.sin(e)],
  }
}

export const project = (view: View, place: Vector): Point => ({
  x: UNIT * dot(place, view.right),
  y: -UNIT * dot(place, view.up),
})
export const depthOf = (view: View, place: Vector): number => dot(place, view.out)

/**
 * Sagittal work is seen from the athlete's right with the far limbs just showing; frontal work is turned until both arms
 * show; transverse work is seen from higher up, where the arms' plane opens, unless the athlete lies down, when that
 * plane stands upright and a turn toward the head or feet opens it.
 */
export function chooseView(mechanics: ExerciseMechanics, frames: readonly SolvedFrame[]): View {
  const leans = frames.map((frame) => Math.abs(frame.angles.trunkLean))
  const lean = leans.reduce((sum, value) => sum + value, 0) / Math.max(1, leans.length)
  const lying = lean > 50 && lean < 130
  switch (mechanics.armPlane) {
    case 'sagittal':
      return viewFrom(16, 7)
    case 'frontal':
      return lying ? viewFrom(34, 22) : viewFrom(56, 7)
    case 'transverse':
      return lying ? viewFrom(34, 16) : viewFrom(52, 24)
  }
}
