import type { Pose, Vector } from '#shared/mechanics/solution'
import type { Side } from '#shared/mechanics/vocabulary'
import { add, between, boxOf, dot, length, scale, subtract, tube, unit, wrap, type Station } from './geometry'
import type { Ink, Shape } from './scene'
import { depthOf, project, UNIT, type View } from './view'

/**
 * Half widths in fractions of stature, from measured girths of a lean adult rounded to what a small drawing can show;
 * only the bones' lengths come from mechanics. [place along the bone, half width].
 */
type Profile = ReadonlyArray<readonly [number, number]>
const UPPER_ARM: Profile = [
  [0, 0.034],
  [0.3, 0.032],
  [0.7, 0.026],
  [1, 0.0215],
]
const FOREARM: Profile = [
  [0, 0.022],
  [0.25, 0.0245],
  [0.65, 0.019],
  [1, 0.0145],
]
const THIGH: Profile = [
  [0, 0.052],
  [0.3, 0.05],
  [0.7, 0.039],
  [1, 0.032],
]
const SHANK: Profile = [
  [0, 0.031],
  [0.28, 0.034],
  [0.65, 0.024],
  [1, 0.017],
]
/** [place along pelvis → lumbar → neck base, half width across, half depth front to back]. */
const TRUNK: ReadonlyArray<readonly [number, number, number]> = [
  [-0.09, 0.062, 0.05],
  [0, 0.09, 0.066],
  [0.12, 0.088, 0.064],
  [0.32, 0.075, 0.054],
  [0.58, 0.084, 0.062],
  [0.8, 0.09, 0.066],
  [0.98, 0.074, 0.046],
]
const HEAD = { tall: 0.066, wide: 0.044, deep: 0.054 }

export const LEFTWARD: Vector = [0, 1, 0]

/** Trunk axes at the upper trunk: up along the spine, forward out of the chest. */
export function chestAxes(pose: Pose): { up: Vector; forward: Vector } {
  const up = unit(subtract(pose.neckBase, pose.lumbar))
  return { up, forward: [up[2], 0, -up[0]] }
}
export function pelvisAxes(pose: Pose): { up: Vector; forward: Vector } {
  const up = unit(subtract(pose.lumbar, pose.pelvis))
  return { up, forward: [up[2], 0, -up[0]] }
}

/** Half size on the page of an ellipse or ellipsoid with the given half axes, along one direction of the page. */
function halfWidth(view: View, across: { x: number; y: number }, axes: readonly Vector[]): number {
  const direction = add(scale(view.right, across.x), scale(view.up, -across.y))
  return UNIT * Math.hypot(...axes.map((axis) => dot(axis, direction)))
}

function limb(view: View, from: Vector, to: Vector, profile: Profile): Station[] {
  return profile.map(([share, r]) => ({ ...project(view, between(from, to, share)), r: r * UNIT }))
}

/** Along the spine, bent at the lumbar joint. */
function spineAt(pose: Pose, share: number): Vector {
  const lower = length(subtract(pose.lumbar, pose.pelvis))
  const upper = length(subtract(pose.neckBase, pose.lumbar))
  const split = lower / (lower + upper || 1)
  return share <= split
    ? between(pose.pelvis, pose.lumbar, split === 0 ? 0 : share / split)
    : between(pose.lumbar, pose.neckBase, (share - split) / (1 - split || 1))
}

function trunkStations(view: View, pose: Pose): Station[] {
  const places = TRUNK.map(([share]) => spineAt(pose, share))
  const onPage = places.map((place) => project(view, place))
  return TRUNK.map(([, wide, deep], index) => {
    const before = places[Math.max(0, index - 1)]!
    const after = places[Math.min(places.length - 1, index + 1)]!
    const up = unit(subtract(after, before))
    const forward: Vector = [up[2], 0, -up[0]]
    const a = onPage[Math.max(0, index - 1)]!
    const b = onPage[Math.min(places.length - 1, index + 1)]!
    const size = Math.hypot(b.x - a.x, b.y - a.y)
    const across = size < 1e-6 ? { x: 1, y: 0 } : { x: -(b.y - a.y) / size, y: (b.x - a.x) / size }
    return { ...onPage[index]!, r: halfWidth(view, across, [scale(LEFTWARD, wide), scale(forward, deep)]) }
  })
}

/** Skull, jaw and a small nose, which tells which way the athlete faces. */
function headPieces(view: View, pose: Pose): { head: Station[]; nose: Station[] } {
  const up = unit(subtract(pose.headTop, pose.headCentre), unit(subtract(pose.headCentre, pose.neckBase)))
  const forward: Vector = [up[2], 0, -up[0]]
  const place = (along: number, ahead: number): Vector =>
    add(pose.headTop, add(scale(up, -along), scale(forward, ahead)))
  const wide =
    UNIT * Math.hypot(HEAD.deep * dot(forward, view.right), HEAD.wide * view.right[1], HEAD.tall * dot(up, view.right))
  const skull = Math.min(HEAD.deep * UNIT, Math.max(HEAD.wide * UNIT, wide))
  return {
    head: [
      { ...project(view, place(HEAD.deep, -0.004)), r: skull },
      { ...project(view, place(HEAD.deep + 0.036, 0.012)), r: skull * 0.68 },
    ],
    nose: [
      { ...project(view, place(HEAD.deep + 0.006, 0.04)), r: 1.3 },
      { ...project(view, place(HEAD.deep + 0.018, 0.056)), r: 0.8 },
    ],
  }
}

/** Hands close round whatever they grip, and lie open on a floor. */
function handStations(view: View, pose: Pose, side: Side, open: boolean): Station[] {
  const wrist = { ...project(view, pose[`${side}.wrist`]), r: 1.5 }
  const palm = { ...project(view, pose[`${side}.grip`]), r: open ? 1.6 : 2.3 }
  return open ? [wrist, palm, { ...project(view, pose[`${side}.fingers`]), r: 0.9 }] : [wrist, palm]
}

function footStations(view: View, pose: Pose, side: Side): Station[] {
  const ankle = pose[`${side}.ankle`]
  const heel = pose[`${side}.heel`]
  const toe = pose[`${side}.toe`]
  const lift = (place: Vector, by: number): Vector =>
    add(place, scale(unit(subtract(ankle, between(heel, toe, 0.25))), by))
  return [
    { ...project(view, ankle), r: 1.9 },
    { ...project(view, lift(heel, 0.013)), r: 1.3 },
    { ...project(view, lift(between(heel, toe, 0.72), 0.012)), r: 1.2 },
    { ...project(view, lift(toe, 0.007)), r: 0.7 },
  ]
}

/** Sagittal views keep whole limbs before or behind the trunk; turned views sort each piece by its own depth. */
export const limbBias = (view: View, side: Side): number => (view.turn < 25 ? (side === 'right' ? 1 : -1) : 0)

export function bodyShapes(view: View, pose: Pose, openHands: boolean): Shape[] {
  const shapes: Shape[] = []
  const put = (ink: Ink, path: string, stations: readonly Station[], layer: number): void => {
    shapes.push({ ink, path, layer, box: boxOf(stations) })
  }
  const middle = depthOf(view, between(pose.pelvis, pose.neckBase, 0.5))
  const trunk = trunkStations(view, pose)
  put('body', tube(trunk), trunk, middle)
  const { head, nose } = headPieces(view, pose)
  const neck = limb(view, pose.neckBase, pose.headCentre, [
    [-0.1, 0.032],
    [0.4, 0.026],
    [1, 0.026],
  ])
  const headDepth = depthOf(view, pose.headCentre)
  put('body', tube(neck), neck, Math.min(middle, headDepth) - 0.001)
  put('body', wrap(nose), nose, headDepth + (view.turn < 45 ? -0.0005 : 0.0005))
  put('body', wrap(head), head, headDepth)
  for (const side of ['left', 'right'] as const) {
    const ink: Ink = side === 'left' ? 'bodyFar' : 'body'
    const bias = limbBias(view, side)
    const p = (name: 'shoulder' | 'elbow' | 'wrist' | 'grip' | 'hip' | 'knee' | 'ankle' | 'toe'): Vector =>
      pose[`${side}.${name}`]
    const mean = (a: Vector, b: Vector): number => depthOf(view, between(a, b, 0.5)) + bias
    const pieces: Array<[Station[], string | null, number]> = [
      [limb(view, p('hip'), p('knee'), THIGH), null, mean(p('hip'), p('knee'))],
      [limb(view, p('knee'), p('ankle'), SHANK), null, mean(p('knee'), p('ankle'))],
      [footStations(view, pose, side), 'wrap', mean(p('ankle'), p('toe')) + 0.002],
      [limb(view, p('shoulder'), p('elbow'), UPPER_ARM), null, mean(p('shoulder'), p('elbow')) + 0.02],
      [limb(view, p('elbow'), p('wrist'), FOREARM), null, mean(p('elbow'), p('wrist')) + 0.021],
      [handStations(view, pose, side, openHands), 'wrap', mean(p('wrist'), p('grip')) + 0.022],
    ]
    for (const [stations, how, layer] of pieces)
      put(ink, how === 'wrap' ? wrap(stations) : tube(stations), stations, layer)
  }
  return shapes
}
