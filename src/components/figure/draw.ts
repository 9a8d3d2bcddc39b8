import type { ExerciseMechanics } from '#shared/mechanics/definition'
import type { Pose, SolvedFrame, Vector } from '#shared/mechanics/solution'
import type { Support } from '#shared/mechanics/vocabulary'
import { bodyShapes } from './body'
import { bearingHandShapes } from './equipment/hands'
import { loadShapes } from './equipment/loads'
import { bearingHands, bearsOn, handsLieFlat } from './equipment/places'
import { bearings, padShapes, standOn, upperBackContact, upperBackOn, wall } from './equipment/supports'
import { boxOf, round, subtract, union, type Box } from './geometry'
import { MOST_RADIUS } from './marks'
import type { Shape } from './scene'
import { block } from './solids'
import { chooseView, project, type View } from './view'

export interface DrawnFrame {
  name: string
  pose: Pose
  shapes: Shape[]
}
export interface Drawing {
  view: View
  /** x, y, width, height; the same for every frame, so that frames can be laid side by side. */
  viewBox: readonly [number, number, number, number]
  frames: DrawnFrame[]
}

/** Room around everything for strokes, discs and rings. */
const MARGIN = 4
/** Room around a joint for the largest disc, with the margin. */
const MARK_ROOM = MOST_RADIUS - MARGIN
/** What bears higher than this above the floor stands on something; less for the ball of a foot whose heel drops. */
const RAISED = 0.06
const STEP = 0.025
/** A back lower than this lies on the floor itself. */
const LOW = 0.12
/** How far above the athlete's highest point a cable is followed. */
const CABLE_ROOM = 0.2

const lowestOf = (pose: Pose): number => Math.min(...Object.values(pose).map((place) => place[2]))

const STANDING: readonly Support[] = ['feet', 'offFoot', 'knees', 'forearms']

/** Whether a heel sinks below the ball of the foot, which needs a step. */
const dropsHeel = (frames: readonly SolvedFrame[]): boolean =>
  frames.some(({ pose, reactions }) =>
    reactions.some(({ support, at }) => support === 'feet' && pose['right.heel'][2] < at[2] - 0.015),
  )

/** Where the body touches what it stands on, over all frames; soles on a machine's plate are not on the floor. */
function standingPlaces(mechanics: ExerciseMechanics, frames: readonly SolvedFrame[]): Vector[] {
  const onPlate = mechanics.loads.some(({ at, direction }) => at === 'feet' && typeof direction === 'object')
  const onStep = dropsHeel(frames)
  return frames.flatMap(({ pose, reactions }) => {
    const solved = reactions.filter(({ support }) => STANDING.includes(support))
    const feet = solved.map(({ support, role, at }): Vector => {
      // Reactions are given at the bone; the skin of a knee or forearm reaches a little lower.
      const skin = at[2] - (SKIN_BELOW[support] ?? 0)
      if (onStep || (support !== 'feet' && support !== 'offFoot')) return [at[0], at[1], skin]
      // Up on the ball of the foot the toes reach lower still: they are what stands on the floor.
      const side = role === 'idle' || at[1] > 0 ? 'left' : 'right'
      return [at[0], at[1], Math.min(skin, pose[`${side}.toe`][2])]
    })
    const standing = onPlate ? [] : feet.length > 0 ? feet : bearings(mechanics, pose)
    const idleHand = bearsOn(mechanics, 'offHand') ? [subtract(pose['left.grip'], [0, 0, 0.02])] : []
    return [
      ...standing,
      ...idleHand,
      ...(handsLieFlat(mechanics) ? bearingHands(mechanics).map((side) => pose[`${side}.grip`]) : []),
    ]
  })
}
const SKIN_BELOW: Partial<Record<Support, number>> = { knees: 0.02, forearms: 0.016 }

/** Height of the floor, or null when nothing stands on one (a free hang). */
function floorOf(
  mechanics: ExerciseMechanics,
  frames: readonly SolvedFrame[],
  places: readonly Vector[],
): number | null {
  const bottom = Math.min(...frames.map(({ pose }) => lowestOf(pose)))
  if (places.length > 0) {
    const least = Math.min(...places.map((place) => place[2]))
    // A heel that drops below the ball of the foot needs a step under the ball, not a hole in the floor.
    return bearsOn(mechanics, 'knees', 'forearms') ? least : Math.min(least, bottom)
  }
  if (bearsOn(mechanics, 'handsHanging') && !bearsOn(mechanics, 'seat')) return null
  return bottom - 0.05
}

/** Places on the floor over all frames, and boxes under what bears higher. */
function groundShapes(
  view: View,
  mechanics: ExerciseMechanics,
  frames: readonly SolvedFrame[],
  places: readonly Vector[],
  floor: number,
): Shape[] {
  const shapes: Shape[] = []
  const high = places.filter((place) => place[2] > floor + (dropsHeel(frames) ? STEP : RAISED))
  const groups = new Map<string, Vector[]>()
  for (const place of high) {
    const key = `${Math.round(place[2] * 8)} ${Math.round(place[0] * 3)}`
    groups.set(key, [...(groups.get(key) ?? []), place])
  }
  for (const group of groups.values()) {
    const mid = (axis: 0 | 1 | 2): number =>
      (Math.max(...group.map((p) => p[axis])) + Math.min(...group.map((p) => p[axis]))) / 2
    const half = (axis: 0 | 1): number =>
      (Math.max(...group.map((p) => p[axis])) - Math.min(...group.map((p) => p[axis]))) / 2
    shapes.push(
      standOn(
        view,
        [mid(0), mid(1), 0],
        Math.min(...group.map((p) => p[2])) - 0.008,
        floor,
        half(0) + 0.1,
        half(1) + 0.07,
      ),
    )
  }
  const against = upperBackOn(mechanics, frames[0]!.pose)
  const contacts = against === null ? [] : frames.map(({ pose }) => upperBackContact(pose))
  const lowest = Math.min(...contacts.map((place) => place[2]))
  if (against === 'wall' || (against === 'bench' && lowest > floor + LOW)) {
    const x = contacts.reduce((sum, place) => sum + place[0], 0) / contacts.length
    const away = frames[0]!.pose['right.ankle'][0] > x ? -1 : 1
    shapes.push(
      against === 'wall'
        ? wall(view, [x, 0, 0], floor)
        : standOn(view, [x + away * 0.07, 0, 0], lowest, floor, 0.1, 0.22),
    )
  }
  const padded = bearsOn(mechanics, 'seat', 'backPad', 'chestPad')
  const resting = padded || places.length === 0 ? frames.flatMap(({ pose }) => [pose.pelvis, pose.neckBase]) : []
  const xs = [...places, ...contacts, ...resting].map((place) => place[0])
  const [from, to] = [Math.min(...xs) - 0.16, Math.max(...xs) + 0.16]
  shapes.push(
    block(
      view,
      'ground',
      [(from + to) / 2, 0, floor - 0.004],
      [
        [(to - from) / 2, 0, 0],
        [0, 0.17, 0],
        [0, 0, 0.004],
      ],
      -20,
    ),
  )
  return shapes
}

/** Draws every posture of an exercise in one view, to one scale, with what stays still at one place. */
export function drawExercise(mechanics: ExerciseMechanics, frames: readonly SolvedFrame[]): Drawing {
  const view = chooseView(mechanics, frames)
  const places = standingPlaces(mechanics, frames)
  const floor = floorOf(mechanics, frames, places)
  const ground = floor === null ? [] : groundShapes(view, mechanics, frames, places, floor)
  const ceiling = Math.max(...frames.flatMap(({ pose }) => Object.values(pose).map((place) => place[2]))) + CABLE_ROOM
  const drawn = frames.map((frame): DrawnFrame => {
    const shapes = [
      ...ground,
      ...padShapes(view, mechanics, frame.pose, floor ?? lowestOf(frame.pose) - 0.04),
      ...bearingHandShapes(view, mechanics, frame.pose, floor),
      ...bodyShapes(view, frame.pose, handsLieFlat(mechanics)),
      ...loadShapes(view, mechanics, frame, ceiling),
    ].sort((a, b) => a.layer - b.layer)
    return { name: frame.name, pose: frame.pose, shapes }
  })
  const all = union(drawn.flatMap(({ shapes, pose }) => [...shapes.map(({ box }) => box), jointsBox(view, pose)]))
  const box: Box = {
    left: all.left - MARGIN,
    top: all.top - MARGIN,
    right: all.right + MARGIN,
    bottom: all.bottom + MARGIN,
  }
  return {
    view,
    frames: drawn,
    viewBox: [round(box.left), round(box.top), round(box.right - box.left), round(box.bottom - box.top)],
  }
}

const jointsBox = (view: View, pose: Pose): Box =>
  boxOf(Object.values(pose).map((place) => ({ ...project(view, place), r: MARK_ROOM })))
