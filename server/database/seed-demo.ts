import { SEXES } from '#shared/mechanics/sex'
import { randomFrom } from '../../seeds/demo/random'
import { ATHLETES, ILSE, OSWIN, type DemoAthlete } from '../../seeds/demo/people'
import { dayAt, sessionsOf, type DemoSession } from '../../seeds/demo/sessions'
import { soreJointsOf } from '../../seeds/demo/soreness'
import type { Dependencies } from '../dependencies'
import type { CatalogueEdition } from '../features/exercises/catalogue-edition'
import { demoStrength } from './demo/strength'
import {
  insertPeople,
  insertPlaces,
  insertSessions,
  insertSoreJoints,
  lastSessionDays,
  replaceUntouchedDay,
} from './demo/rows'
import { insertSwapsAndFlags } from './demo/swaps'

/** Their day is what the demo is told from, so it is as planned on whatever day the demo is started. */
const TOLD: readonly DemoAthlete[] = [ILSE, OSWIN]

const isSeeded = async ({ manager }: Dependencies['dataSource']): Promise<boolean> => {
  const rows: unknown[] = await manager.query('select 1 from users where id = $1', [ILSE.id])
  return rows.length > 0
}

export interface DemoSummary {
  /** False when the demo was there and only its calendar was carried on. */
  fresh: boolean
  sessions: number
  swaps: number
}

/**
 * Puts the demo's clubs, people and twelve weeks of training into the database, as seen from `now`. When they are
 * there already, it only carries the calendar on, so that there is always a session for today.
 */
export async function seedDemo(
  { dataSource, catalogue }: Pick<Dependencies, 'dataSource' | 'catalogue'>,
  now: Date,
): Promise<DemoSummary> {
  const edition = await catalogue.latest(SEXES)
  if (await isSeeded(dataSource)) return { fresh: false, swaps: 0, sessions: await carryOn(dataSource, edition, now) }
  const sessions = ATHLETES.flatMap((athlete) => sessionsOf(athlete, now, demoStrength(edition)))
  const soreJoints = ATHLETES.flatMap((athlete) => soreJointsOf(athlete, now))
  return dataSource.transaction(async (manager) => {
    await insertPlaces(manager)
    await insertPeople(manager, now)
    await insertSessions(manager, sessions, edition)
    await insertSoreJoints(manager, soreJoints)
    const random = randomFrom('swaps', dayAt(now, 0))
    const swaps = await insertSwapsAndFlags(manager, { sessions, soreJoints, edition, now, random })
    return { fresh: true, sessions: sessions.length, swaps }
  })
}

/** Adds the days that the calendar does not reach yet, and gives the told athletes their planned day today. */
async function carryOn(dataSource: Dependencies['dataSource'], edition: CatalogueEdition, now: Date): Promise<number> {
  const strength = demoStrength(edition)
  return dataSource.transaction(async (manager) => {
    const last = await lastSessionDays(manager)
    const added: DemoSession[] = []
    for (const athlete of ATHLETES) {
      const reached = last.get(athlete.id) ?? ''
      const planned = sessionsOf(athlete, now, strength, 0)
      added.push(...planned.filter(({ day }) => day > reached))
      const today = planned.find(({ offset }) => offset === 0)
      if (TOLD.includes(athlete) && today !== undefined && today.day <= reached) {
        if (await replaceUntouchedDay(manager, today)) added.push(today)
      }
    }
    await insertSessions(manager, added, edition)
    return added.length
  })
}
