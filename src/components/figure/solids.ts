import type { Vector } from '#shared/mechanics/solution'
import { add, boxOf, cross, hull, polygon, scale, tube, unit, type Point, type Station } from './geometry'
import type { Ink, Shape } from './scene'
import { depthOf, project, UNIT, type View } from './view'

const stationsOf = (points: readonly Point[], r = 0): Station[] => points.map((point) => ({ ...point, r }))

/** A block given by its middle and three half edges, as its outline on the page. */
export function block(
  view: View,
  ink: Ink,
  middle: Vector,
  edges: readonly [Vector, Vector, Vector],
  layer: number,
): Shape {
  const corners: Point[] = []
  for (const a of [-1, 1])
    for (const b of [-1, 1])
      for (const c of [-1, 1])
        corners.push(project(view, add(add(middle, scale(edges[0], a)), add(scale(edges[1], b), scale(edges[2], c)))))
  return { ink, path: polygon(hull(corners)), layer, box: boxOf(stationsOf(corners, 0.5)) }
}

/** Two directions square to `normal` and to each other. */
function acrossFrom(normal: Vector): [Vector, Vector] {
  const helper: Vector = Math.abs(normal[2]) < 0.9 ? [0, 0, 1] : [1, 0, 0]
  const first = unit(cross(normal, helper))
  return [first, unit(cross(normal, first))]
}

/** A round plate or wheel seen at its true slant. */
export function disc(
  view: View,
  ink: Ink,
  middle: Vector,
  normal: Vector,
  radius: number,
  thickness: number,
  layer: number,
): Shape {
  const [a, b] = acrossFrom(unit(normal))
  const points: Point[] = []
  for (const face of [-0.5, 0.5])
    for (let index = 0; index < 20; index += 1) {
      const angle = (2 * Math.PI * index) / 20
      const rim = add(scale(a, radius * Math.cos(angle)), scale(b, radius * Math.sin(angle)))
      points.push(project(view, add(add(middle, rim), scale(unit(normal), face * thickness))))
    }
  return { ink, path: polygon(hull(points)), layer, box: boxOf(stationsOf(points, 0.5)) }
}

/** A straight round bar. */
export function rod(view: View, ink: Ink, from: Vector, to: Vector, radius: number, layer: number): Shape {
  const stations = [from, to].map((place) => ({ ...project(view, place), r: radius * UNIT }))
  return { ink, path: tube(stations), layer, box: boxOf(stations) }
}

/** A thin drawn line: strap, band, line of force. */
export function line(view: View, ink: Ink, places: readonly Vector[], layer: number): Shape {
  const points = places.map((place) => project(view, place))
  const path = `M${points.map(({ x, y }) => `${Math.round(x * 10) / 10} ${Math.round(y * 10) / 10}`).join('L')}`
  return { ink, path, layer, box: boxOf(stationsOf(points, 0.6)) }
}

export const layerAt = (view: View, place: Vector): number => depthOf(view, place)
