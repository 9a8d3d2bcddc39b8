type Point = readonly [number, number]

/** Half of a standing body from the side of the neck round to the crotch; x from the midline, y down. */
const HALF: readonly Point[] = [
  [8, 50],
  [9, 64],
  [20, 73],
  [38, 79],
  [50, 88],
  [55, 106],
  [61, 136],
  [68, 160],
  [75, 184],
  [80, 210],
  [86, 226],
  [86, 246],
  [80, 251],
  [74, 240],
  [70, 216],
  [61, 188],
  [54, 164],
  [47, 140],
  [40, 116],
  [35, 146],
  [32, 172],
  [37, 200],
  [42, 226],
  [43, 258],
  [39, 296],
  [41, 322],
  [38, 352],
  [36, 372],
  [41, 386],
  [47, 395],
  [40, 399],
  [30, 398],
  [25, 386],
  [24, 366],
  [21, 334],
  [20, 306],
  [14, 270],
  [3, 238],
]

/** A closed curve through all points (Catmull–Rom as cubic Béziers), a little tighter than the classic 1/6. */
function smooth(points: readonly Point[]): string {
  const at = (index: number) => points[(index + points.length) % points.length]!
  const tension = 1 / 7
  const curves = points.map((_, index) => {
    const [before, from, to, after] = [at(index - 1), at(index), at(index + 1), at(index + 2)]
    const first = [from[0] + (to[0] - before[0]) * tension, from[1] + (to[1] - before[1]) * tension]
    const second = [to[0] - (after[0] - from[0]) * tension, to[1] - (after[1] - from[1]) * tension]
    return `C${[...first, ...second, ...to].map((value) => value.toFixed(1)).join(' ')}`
  })
  return `M${at(0).join(' ')}${curves.join('')}Z`
}

/** The whole outline without the head, midline at x = 0, soles at y ≈ 394. */
export const BODY_PATH = smooth([...HALF, ...HALF.toReversed().map(([x, y]): Point => [-x, y])])
