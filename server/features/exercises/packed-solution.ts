import {
  AXES,
  POINTS,
  SIDE_POINTS,
  type Axis,
  type ExerciseSolution,
  type LoadLine,
  type PointName,
  type Pose,
  type PoseAngles,
  type Reaction,
  type Role,
  type SolvedFrame,
  type Term,
  type Vector,
} from '#shared/mechanics/solution'
import { SIDES, SUPPORTS } from '#shared/mechanics/vocabulary'

/*
 * A solution as bytes: about a sixth of what the same objects take in memory, and nothing for the garbage collector to
 * walk. Reading it back gives exactly what was written.
 */

const AXIS_NAMES = Object.keys(AXES) as Axis[]
const ROLES: readonly Role[] = ['working', 'idle', 'middle']
const LINE_KINDS: ReadonlyArray<LoadLine['kind']> = ['gravity', 'cable', 'pad', 'assist']
const POINT_NAMES: readonly PointName[] = [
  ...POINTS,
  ...SIDES.flatMap((side) => SIDE_POINTS.map((point): PointName => `${side}.${point}`)),
]
const ANGLE_NAMES = [
  'trunkLean',
  'lumbar',
  'neck',
  'shoulder',
  'elbow',
  'wrist',
  'hip',
  'knee',
  'ankle',
] as const satisfies readonly (keyof PoseAngles)[]

/** Writes into one buffer that is used again and grows as it must. */
class Writer {
  private bytes = Buffer.alloc(16 * 1024)
  private at = 0

  /** Forgets what was written. */
  begin(): void {
    this.at = 0
  }

  private room(size: number): number {
    const start = this.at
    this.at += size
    if (this.at > this.bytes.length) this.bytes = Buffer.concat([this.bytes], this.at * 2)
    return start
  }

  byte(value: number): void {
    const start = this.room(1)
    this.bytes.writeUInt8(value, start)
  }

  number(value: number): void {
    const start = this.room(8)
    this.bytes.writeDoubleLE(value, start)
  }

  vector([x, y, z]: Vector): void {
    for (const value of [x, y, z]) this.number(value)
  }

  text(value: string): void {
    const length = Buffer.byteLength(value)
    this.byte(length)
    const start = this.room(length)
    this.bytes.write(value, start)
  }

  list<T>(items: readonly T[], write: (item: T) => void): void {
    this.byte(items.length)
    items.forEach(write)
  }

  /** A name of a closed vocabulary as its place in it. */
  name<T extends string>(value: T, vocabulary: readonly T[]): void {
    const place = vocabulary.indexOf(value)
    if (place < 0) throw new Error(`${value} cannot be packed`)
    this.byte(place)
  }

  written(): Buffer {
    return this.bytes.subarray(0, this.at)
  }
}

class Reader {
  private at = 0
  constructor(private readonly bytes: Buffer) {}

  byte(): number {
    return this.bytes.readUInt8(this.at++)
  }

  number(): number {
    this.at += 8
    return this.bytes.readDoubleLE(this.at - 8)
  }

  vector(): Vector {
    return [this.number(), this.number(), this.number()]
  }

  text(): string {
    const length = this.byte()
    this.at += length
    return this.bytes.toString('utf8', this.at - length, this.at)
  }

  list<T>(read: () => T): T[] {
    return Array.from({ length: this.byte() }, read)
  }

  name<T extends string>(vocabulary: readonly T[]): T {
    const value = vocabulary[this.byte()]
    if (value === undefined) throw new Error('packed solution is damaged')
    return value
  }
}

function writeFrame(out: Writer, frame: SolvedFrame): void {
  out.text(frame.name)
  for (const point of POINT_NAMES) out.vector(frame.pose[point])
  for (const angle of ANGLE_NAMES) out.number(frame.angles[angle])
  out.list(frame.terms, ({ axis, role, a, b }) => {
    out.name(axis, AXIS_NAMES)
    out.name(role, ROLES)
    out.number(a)
    out.number(b)
  })
  out.list(frame.reactions, ({ support, role, at, a, b }) => {
    out.name(support, SUPPORTS)
    out.name(role, ROLES)
    out.vector(at)
    out.number(a)
    out.number(b)
  })
  out.list(frame.loadLines, ({ at, direction, kind, toward }) => {
    out.name(kind, LINE_KINDS)
    out.vector(at)
    out.vector(direction)
    out.list(toward === undefined ? [] : [toward], (end) => out.vector(end))
  })
}

function readFrame(from: Reader): SolvedFrame {
  const name = from.text()
  const pose = Object.fromEntries(POINT_NAMES.map((point) => [point, from.vector()])) as Pose
  const angles = Object.fromEntries(ANGLE_NAMES.map((angle) => [angle, from.number()])) as unknown as PoseAngles
  const terms = from.list((): Term => {
    return { axis: from.name(AXIS_NAMES), role: from.name(ROLES), a: from.number(), b: from.number() }
  })
  const reactions = from.list((): Reaction => {
    const support = from.name(SUPPORTS)
    return { support, role: from.name(ROLES), at: from.vector(), a: from.number(), b: from.number() }
  })
  const loadLines = from.list((): LoadLine => {
    const kind = from.name(LINE_KINDS)
    const line = { at: from.vector(), direction: from.vector(), kind }
    const [toward] = from.list(() => from.vector())
    return toward === undefined ? line : { ...line, toward }
  })
  return { name, pose, angles, terms, reactions, loadLines }
}

const out = new Writer()

/** The solution as bytes. They are written over by the next call: copy what is to be kept. */
export function packSolution({ frames }: ExerciseSolution): Buffer {
  out.begin()
  out.list(frames, (frame) => writeFrame(out, frame))
  return out.written()
}

export function unpackSolution(packed: Buffer): ExerciseSolution {
  const from = new Reader(packed)
  return { frames: from.list(() => readFrame(from)) }
}
