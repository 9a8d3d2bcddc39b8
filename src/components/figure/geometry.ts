import type { Vector } from '#shared/mechanics/solution'

/** A place on the page, in hundredths of stature: x to the right, y down. */
export interface Point {
  x: number
  y: number
}
export interface Station extends Point {
  /** Half width of a limb here. */
  r: number
}
export interface Box {
  left: number
  top: number
  right: number
  bottom: number
}

export const add = (a: Vector, b: Vector): Vector => [a[0] + b[0], a[1] + b[1], a[2] + b[2]]
export const subtract = (a: Vector, b: Vector): Vector => [a[0] - b[0], a[1] - b[1], a[2] - b[2]]
export const scale = (a: Vector, by: number): Vector => [a[0] * by, a[1] * by, a[2] * by]
export const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
export const cross = (a: Vector, b: Vector): Vector => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
]
export const length = (a: Vector): number => Math.hypot(a[0], a[1], a[2])
export const between = (a: Vector, b: Vector, share: number): Vector => add(a, scale(subtract(b, a), share))
/** Unit vector along `a`, or `otherwise` when `a` has no length. */
export const unit = (a: Vector, otherwise: Vector = [0, 0, 1]): Vector => {
  const size = length(a)
  return size < 1e-9 ? otherwise : scale(a, 1 / size)
}

/** One decimal of a hundredth of stature is finer than a pixel in every size the figure is shown at. */
export const round = (value: number): number => {
  const rounded = Math.round(value * 10) / 10
  return rounded === 0 ? 0 : rounded
}
const at = (point: Point): string => `${round(point.x)} ${round(point.y)}`

export const polygon = (points: readonly Point[]): string => `M${points.map(at).join('L')}Z`
export const polyline = (points: readonly Point[]): string => `M${points.map(at).join('L')}`

/** Convex hull, counter-clockwise (monotone chain). */
export function hull(points: readonly Point[]): Point[] {
  const sorted = [...points].sort((a, b) => a.x - b.x || a.y - b.y)
  const turn = (o: Point, a: Point, b: Point): number => (a.x - o.x) * (b.y - o.y) - (a.y - o.y) * (b.x - o.x)
  const half = (list: readonly Point[]): Point[] => {
    const chain: Point[] = []
    for (const point of list) {
      while (chain.length >= 2 && turn(chain[chain.length - 2]!, chain[chain.length - 1]!, point) <= 1e-9) chain.pop()
      chain.push(point)
    }
    return chain.slice(0, -1)
  }
  return [...half(sorted), ...half(sorted.reverse())]
}

/** Points of a circle, enough for a hull that looks round. */
export const circlePoints = ({ x, y, r }: Station, count = 14): Point[] =>
  Array.from({ length: count }, (_, index) => {
    const angle = (2 * Math.PI * index) / count
    return { x: x + r * Math.cos(angle), y: y + r * Math.sin(angle) }
  })

/** The outline that wraps all circles: a mitt, a foot, a pad. */
export const wrap = (stations: readonly Station[]): string =>
  polygon(hull(stations.flatMap((station) => circlePoints(station))))

/** Cubic pieces of a smooth curve through the points (Catmull-Rom), after a pen already at the first one. */
function curveThrough(points: readonly Point[]): string {
  let path = ''
  for (let index = 0; index < points.length - 1; index += 1) {
    const previous = points[Math.max(0, index - 1)]!
    const start = points[index]!
    const end = points[index + 1]!
    const next = points[Math.min(points.length - 1, index + 2)]!
    const control1 = { x: start.x + (end.x - previous.x) / 6, y: start.y + (end.y - previous.y) / 6 }
    const control2 = { x: end.x - (next.x - start.x) / 6, y: end.y - (next.y - start.y) / 6 }
    path += `C${at(control1)} ${at(control2)} ${at(end)}`
  }
  return path
}

/** A rounded limb through its stations: smooth sides, a round cap at either end. */
export function tube(stations: readonly Station[]): string {
  const first = stations[0]!
  const last = stations[stations.length - 1]!
  const across = stations.map((station, index) => {
    const before = stations[Math.max(0, index - 1)]!
    const after = stations[Math.min(stations.length - 1, index + 1)]!
    const size = Math.hypot(after.x - before.x, after.y - before.y)
    // A limb seen end-on has no direction on the page; any will do for the round blob it becomes.
    const along = size < 1e-6 ? { x: 0, y: 1 } : { x: (after.x - before.x) / size, y: (after.y - before.y) / size }
    return { x: -along.y * station.r, y: along.x * station.r }
  })
  const left = stations.map((station, index) => ({ x: station.x + across[index]!.x, y: station.y + across[index]!.y }))
  const right = stations.map((station, index) => ({ x: station.x - across[index]!.x, y: station.y - across[index]!.y }))
  const cap = (station: Station, to: Point): string => `A${round(station.r)} ${round(station.r)} 0 0 0 ${at(to)}`
  return `M${at(left[0]!)}${curveThrough(left)}${cap(last, right[right.length - 1]!)}${curveThrough(right.reverse())}${cap(first, left[0]!)}Z`
}

export const boxOf = (stations: readonly Station[]): Box => ({
  left: Math.min(...stations.map(({ x, r }) => x - r)),
  top: Math.min(...stations.map(({ y, r }) => y - r)),
  right: Math.max(...stations.map(({ x, r }) => x + r)),
  bottom: Math.max(...stations.map(({ y, r }) => y + r)),
})
export const union = (boxes: readonly Box[]): Box => ({
  left: Math.min(...boxes.map((box) => box.left)),
  top: Math.min(...boxes.map((box) => box.top)),
  right: Math.max(...boxes.map((box) => box.right)),
  bottom: Math.max(...boxes.map((box) => box.bottom)),
})
