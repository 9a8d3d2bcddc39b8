import type { Provocation, RedFlag, SORE_JOINT_STATES } from '#shared/contract/sore-joint'
import { MIDLINE_JOINTS, type Joint, type Side } from '#shared/mechanics/vocabulary'
import { PHYSIO, type DemoAthlete } from './people'
import { demoId, randomFrom, type Random } from './random'
import { dayAt, PAST_DAYS } from './sessions'

const MINUTE = 60 * 1000

export interface DemoSoreJoint {
  id: string
  athlete: DemoAthlete
  joint: Joint
  side: Side | null
  rating: number
  provocations: Provocation[]
  redFlags: RedFlag[]
  note: string
  day: string
  offset: number
  state: (typeof SORE_JOINT_STATES)[number]
  reportedAt: Date
  closedAt: Date | null
  clearedBy: string | null
  clearedAt: Date | null
  clearanceNote: string | null
}

/** One trouble from its first report to its last. Days are counted from the demo's day. */
interface Episode {
  joint: Joint
  side: Side | null
  provocations: Provocation[]
  reports: Array<{ offset: number; rating: number; note?: string; redFlags?: RedFlag[]; cleared?: string }>
  /** Null while it still troubles. */
  closedOffset: number | null
}

/** What still troubles somebody on the demo's day, and one red flag that a physio cleared. */
const TOLD: Record<string, Episode[]> = {
  'Corin Blaise': [
    {
      joint: 'elbow',
      side: 'right',
      provocations: ['bending', 'gripping'],
      reports: [
        { offset: -5, rating: 3, note: 'Inside of the elbow, after the chin-ups.' },
        { offset: -2, rating: 4 },
      ],
      closedOffset: null,
    },
  ],
  'Nila Sandoe': [
    {
      joint: 'knee',
      side: 'left',
      provocations: ['bending'],
      reports: [
        { offset: -9, rating: 4, note: 'Below the kneecap on stairs.' },
        { offset: -3, rating: 3 },
      ],
      closedOffset: null,
    },
  ],
  'Mirte Oskar': [
    {
      joint: 'wrist',
      side: 'right',
      provocations: ['leaning', 'endRange'],
      reports: [{ offset: -4, rating: 2, note: 'Only in handstands.' }],
      closedOffset: null,
    },
  ],
  'Halvard Quist': [
    {
      joint: 'lowerBack',
      side: null,
      provocations: ['bending'],
      reports: [
        { offset: -8, rating: 4 },
        { offset: -1, rating: 6, redFlags: ['nightPain'], note: 'Woke up twice and could not lie comfortably.' },
      ],
      closedOffset: null,
    },
  ],
  'Saskia Morrow': [
    {
      joint: 'lowerBack',
      side: null,
      provocations: ['bending', 'straightening'],
      reports: [{ offset: -2, rating: 5, note: 'Since the last set of deadlifts.' }],
      closedOffset: null,
    },
  ],
  'Rufus Penhale': [
    {
      joint: 'shoulder',
      side: 'left',
      provocations: ['leaning', 'endRange'],
      reports: [
        {
          offset: -41,
          rating: 8,
          redFlags: ['severePain'],
          note: 'Sharp at the bottom of a dip.',
          cleared: 'Full strength and range, no laxity. Dips stay out for two weeks, everything else by feel.',
        },
        { offset: -34, rating: 4 },
        { offset: -27, rating: 2 },
      ],
      closedOffset: -20,
    },
  ],
}

const USUAL: Record<'bars' | 'barbell', Array<Pick<Episode, 'joint' | 'provocations'>>> = {
  bars: [
    { joint: 'elbow', provocations: ['bending', 'gripping'] },
    { joint: 'elbow', provocations: ['straightening'] },
    { joint: 'shoulder', provocations: ['endRange'] },
    { joint: 'wrist', provocations: ['leaning'] },
  ],
  barbell: [
    { joint: 'lowerBack', provocations: ['bending'] },
    { joint: 'knee', provocations: ['bending'] },
    { joint: 'shoulder', provocations: ['unknown'] },
    { joint: 'elbow', provocations: ['straightening'] },
  ],
}

/** A trouble that came and went: it starts at 3 to 5 and falls by about one a report. */
function passingEpisode(athlete: DemoAthlete, random: Random, from: number, to: number): Episode {
  const kind = athlete.programme.startsWith('bars') ? 'bars' : 'barbell'
  const { joint, provocations } = random.pick(USUAL[kind])
  const side = MIDLINE_JOINTS.includes(joint) ? null : random.pick(['left', 'right'] as const)
  const reports: Episode['reports'] = []
  let offset = random.between(from, to)
  let rating = random.between(3, 5)
  while (rating > 0 && reports.length < 4 && offset < -12) {
    reports.push({ offset, rating })
    offset += random.between(3, 6)
    rating -= random.share() < 0.8 ? 1 : 0
  }
  return { joint, side, provocations, reports, closedOffset: Math.min(offset, -11) }
}

function toRows(athlete: DemoAthlete, episode: Episode, now: Date, random: Random): DemoSoreJoint[] {
  const midnight = Date.parse(`${dayAt(now, 0)}T00:00:00.000Z`)
  const at = (offset: number) => new Date(midnight + (offset * 24 * 60 + random.between(7 * 60, 20 * 60)) * MINUTE)
  const times = episode.reports.map(({ offset }) => at(offset))
  const end = episode.closedOffset === null ? null : at(episode.closedOffset)
  return episode.reports.map(({ offset, rating, note = '', redFlags = [], cleared }, index) => {
    const reportedAt = times[index] ?? now
    const closedAt = times[index + 1] ?? end
    const day = dayAt(now, offset)
    return {
      id: demoId('sore joint', athlete.name, day, episode.joint),
      athlete,
      joint: episode.joint,
      side: episode.side,
      rating,
      provocations: episode.provocations,
      redFlags,
      note,
      day,
      offset,
      state: closedAt !== null ? 'closed' : redFlags.length > 0 && cleared === undefined ? 'redFlag' : 'open',
      reportedAt,
      closedAt,
      clearedBy: cleared === undefined ? null : PHYSIO.id,
      clearedAt: cleared === undefined ? null : new Date(reportedAt.getTime() + 3 * 24 * 60 * MINUTE),
      clearanceNote: cleared ?? null,
    }
  })
}

/** Every report of an athlete: two troubles that passed, and whatever is told of them above. */
export function soreJointsOf(athlete: DemoAthlete, now: Date): DemoSoreJoint[] {
  const random = randomFrom('soreness', athlete.name, dayAt(now, 0))
  const halfway = -Math.round(PAST_DAYS / 2)
  const passed = [
    passingEpisode(athlete, random, -PAST_DAYS + 2, halfway - 20),
    passingEpisode(athlete, random, halfway + 6, -20),
  ]
  const told = TOLD[athlete.name] ?? []
  const apart = passed.filter(({ joint, side }) => !told.some((other) => other.joint === joint && other.side === side))
  return [...apart, ...told].flatMap((episode) => toRows(athlete, episode, now, random))
}
