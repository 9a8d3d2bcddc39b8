import type { ExerciseDocument } from '#shared/contract/exercise'
import { EQUIPMENT } from '#shared/contract/place'
import {
  AXES,
  GRIPS,
  GUIDANCES,
  type Axis,
  type ExerciseSolution,
  type Pose,
  type Role,
  type SolvedFrame,
  type Term,
  type Vector,
} from '#shared/mechanics/index'
import type { Candidate } from '#shared/rules/index'

/** A small fixed generator of numbers in [0, 1) (mulberry32), so that a catalogue is the same on every run. */
export function generator(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let t = Math.imul(state ^ (state >>> 15), 1 | state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }
}

const POINTS = [
  'pelvis',
  'lumbar',
  'neckBase',
  'headCentre',
  'headTop',
  ...['left', 'right'].flatMap((side) =>
    ['shoulder', 'elbow', 'wrist', 'grip', 'fingers', 'hip', 'knee', 'ankle', 'heel', 'toe'].map(
      (at) => `${side}.${at}`,
    ),
  ),
] as Array<keyof Pose>
const AXIS_NAMES = Object.keys(AXES) as Axis[]
const FORCES: readonly Axis[] = ['grip', 'scapulaSagittal', 'scapulaVertical', 'handAxial', 'lumbarAxial']
const MIDDLE: readonly Axis[] = ['neck', 'trunkFlexion', 'trunkLateral', 'trunkRotation', 'lumbarAxial']

const pick = <T>(random: () => number, from: readonly T[]): T => from[Math.floor(random() * from.length)]!

/** Twelve different axes (or whatever is asked), with the frames' coefficients drifting from one to the next. */
function frames(random: () => number, actions: number, bodyOnly: boolean): SolvedFrame[] {
  const left = [...AXIS_NAMES]
  const axes = Array.from({ length: actions }, () => left.splice(Math.floor(random() * left.length), 1)[0]!)
  const oneSided = random() < 0.2
  const base = axes.map((axis): Term => {
    const size = FORCES.includes(axis) ? 0.5 : axis.startsWith('wrist') ? 0.004 : 0.05
    const role: Role = MIDDLE.includes(axis) ? 'middle' : oneSided && random() < 0.3 ? 'idle' : 'working'
    const sign = axis === 'grip' || random() < 0.5 ? 1 : -1
    const a = random() < 0.3 ? 0 : sign * size * random() * 0.6
    const b = bodyOnly || random() < 0.1 ? 0 : (random() < 0.9 ? sign : -sign) * size * (0.2 + random()) * 2
    return { axis, role, a, b }
  })
  const angles = () => Math.round(random() * 150 - 20)
  const still = { shoulder: angles(), elbow: angles(), wrist: -angles() / 2, hip: angles(), knee: angles(), ankle: 0 }
  return [0, 1, 2].map((index): SolvedFrame => {
    const moves = (angle: number) => (random() < 0.5 ? angle : angle + 40 * index * random())
    return {
      name: `frame ${index}`,
      pose: Object.fromEntries(POINTS.map((point) => [point, [random(), random(), random()] as Vector])) as Pose,
      angles: {
        trunkLean: 0,
        lumbar: random() < 0.7 ? 0 : 40 * random(),
        neck: 0,
        shoulder: moves(still.shoulder),
        elbow: moves(still.elbow),
        wrist: still.wrist,
        hip: moves(still.hip),
        knee: moves(still.knee),
        ankle: moves(still.ankle),
      },
      terms: base.map(({ axis, role, a, b }) => ({
        axis,
        role,
        a: a * (0.5 + random()),
        b: b * (0.5 + random()),
      })),
      reactions:
        random() < 0.1 ? [{ support: 'forearms', role: 'working', at: [0, 0, 0], a: 0.3 * random(), b: 0 }] : [],
      loadLines: [],
    }
  })
}

const KINDS = ['external', 'external', 'external', 'added', 'assistance', 'none'] as const

/**
 * A made-up exercise of three frames, the same for the same number. It is no movement anybody could do, but it has the shape
 * and size of coefficients that true ones have: one in five has one working side, a tenth of the terms ignores the load.
 */
export function syntheticCandidate(index: number, actions = 12, seed = 1): Candidate {
  const random = generator(index * 2654435761 + seed)
  const kind = pick(random, KINDS)
  const from = pick(random, EQUIPMENT)
  const document: ExerciseDocument = {
    slug: `made-up-${index}`,
    name: `Made-up ${Math.floor(random() * 1000)}`,
    family: 'trunk',
    kind: 'machine',
    unit: random() < 0.1 ? 'seconds' : 'repetitions',
    skill: pick(random, ['beginner', 'beginner', 'intermediate', 'advanced'] as const),
    speed: 'controlled',
    equipment: kind === 'none' ? [] : [from],
    load:
      kind === 'none' ? { kind } : { kind, from, least: kind === 'external' ? pick(random, [2, 5, 20]) : 0, most: 120 },
    mechanics: {
      guidance: pick(random, GUIDANCES),
      sides: 'both',
      grip: pick(random, GRIPS),
      gripWidth: 'shoulder',
      armPlane: 'sagittal',
      supports: ['feet'],
      frames: [],
      loads: [],
      referenceLoad: 0,
      gripFree: random() < 0.2,
    },
    setup: 'None.',
  }
  const solution: ExerciseSolution = { frames: frames(random, actions, kind === 'none') }
  const id = `0000000a-0000-4000-8000-${String(index).padStart(12, '0')}`
  return { id, versionId: id, document, solution, coordination: 100 * random() }
}
